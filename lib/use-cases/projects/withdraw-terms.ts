import 'server-only';
import { findTerms, lockTerms, setTermsStatus } from '@/db/queries/terms';
import { withdrawTerms } from '@/lib/contracts/terms';
import { recordAudit } from '../audit';
import { notifyParties } from '../notify';
import { notFound, Refusal, stale } from '../refusal';
import { workspaceUseCase } from '../world';

/** A party takes back a version of terms that is not agreed; the next one gets a new number. */
export const withdrawTermsUseCase = workspaceUseCase(withdrawTerms, async (world, { params, body }) => {
  const { tx, sees, actor } = world;
  await lockTerms(tx, params.terms);
  const record = await findTerms(tx, sees, params.terms);
  if (!record || record.projectId !== params.project) throw notFound('version of terms');
  if (record.status === 'agreed')
    throw new Refusal('wrong_state', 'An agreed version is not withdrawn: propose a new version instead.');
  if (record.status !== 'proposed') throw new Refusal('wrong_state', 'This version is not open any more.');
  if (body.version !== record.version) throw stale('version of terms', record.version);
  await setTermsStatus(tx, record.id, { status: 'withdrawn' });
  await notifyParties(
    world,
    record.content.parties.map(({ id }) => id),
    {
      kind: 'terms-withdrawn',
      title: `${actor.name} withdrew terms version ${record.number} of ${record.projectName}`,
      body: body.reason,
      href: `projects/${record.projectId}/terms/${record.id}`,
    },
    actor.memberId,
  );
  await recordAudit(world, {
    action: 'terms.withdraw',
    subject: { kind: 'terms', id: record.id },
    detail: { number: record.number },
    reason: body.reason,
  });
  return { status: 'withdrawn' as const };
});
