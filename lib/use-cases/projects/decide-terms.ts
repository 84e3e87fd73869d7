import 'server-only';
import { findTerms, insertTermsDecision, listTermsDecisions, lockTerms } from '@/db/queries/terms';
import { decideTerms } from '@/lib/contracts/terms';
import { recordAudit } from '../audit';
import { notFound, Refusal } from '../refusal';
import { workspaceUseCase } from '../world';
import { countAgreed, standingsOf } from './agreement';
import { sealTermsWhenUnanimous } from './seal-terms';
import { tellTermsDecision } from './tell-terms';
import { loadTermsStandings } from './terms-standing';

/** A party agrees to the version of terms it saw or asks for a change. Once all have agreed, it is locked. */
export const decideTermsUseCase = workspaceUseCase(decideTerms, async (world, { params, body }) => {
  const { tx, sees, workspace, actor, now } = world;
  const seen = await findTerms(tx, sees, params.terms);
  if (!seen || seen.projectId !== params.project) throw notFound('version of terms');
  await lockTerms(tx, seen.id);
  const record = await findTerms(tx, sees, params.terms);
  if (!record) throw notFound('version of terms');
  const partyIds = record.content.parties.map(({ id }) => id);
  if (!actor.partyId || !partyIds.includes(actor.partyId))
    throw new Refusal('not_allowed', 'Only the parties of the project decide on its terms.');
  if (record.status === 'withdrawn') {
    const { versions } = await loadTermsStandings(world, params.project);
    const newest = versions[0]?.record;
    const replaced =
      newest && newest.number > record.number ? ` Look at version ${newest.number} and answer that.` : '';
    throw new Refusal(
      'stale',
      `Version ${record.number} is no longer proposed; your answer was not recorded.${replaced}`,
      { currentVersion: newest?.number },
    );
  }
  if (record.status !== 'proposed')
    throw new Refusal(
      'wrong_state',
      'This version is agreed by all and locked; its answers can’t change any more.',
    );

  await insertTermsDecision(tx, {
    workspaceId: workspace.id,
    termsId: record.id,
    partyId: actor.partyId,
    decision: body.decision,
    comment: body.comment,
    decidedBy: actor.memberId,
    decidedAt: now,
  });
  const locked = await sealTermsWhenUnanimous(world, record.id);
  await recordAudit(world, {
    action: 'terms.decide',
    subject: { kind: 'terms', id: record.id },
    detail: { number: record.number, decision: body.decision, locked },
    reason: body.comment,
  });
  const standings = standingsOf(partyIds, await listTermsDecisions(tx, [record.id]));
  await tellTermsDecision(world, record, standings, body, locked);
  return { status: locked ? ('agreed' as const) : ('proposed' as const), ...countAgreed(standings) };
});
