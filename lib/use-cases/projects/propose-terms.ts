import 'server-only';
import { findProject, lockProject } from '@/db/queries/projects';
import { insertTerms, insertTermsDecision, setTermsStatus } from '@/db/queries/terms';
import type { TermsId } from '@/lib/contracts/ids';
import { proposeTerms } from '@/lib/contracts/terms';
import { recordAudit } from '../audit';
import { invalid, notFound, Refusal } from '../refusal';
import { workspaceUseCase, type WorkspaceWorld } from '../world';
import { completeTerms } from './draft-terms';
import { sealTermsWhenUnanimous } from './seal-terms';
import { tellTermsProposal } from './tell-terms';
import { loadTermsStandings } from './terms-standing';

/** A party proposes a version of terms; its own party counts as agreeing. An open version that it replaces is withdrawn. */
export const proposeTermsUseCase = workspaceUseCase(proposeTerms, async (world, { params, body }) => {
  const { tx, sees, workspace, actor, now } = world;
  const project = await findProject(tx, sees, params.project);
  if (!project) throw notFound('project');
  await lockProject(tx, project.id);
  const { content } = await completeTerms(world, project.id, body.content);
  const { versions } = await loadTermsStandings(world, project.id);
  const open = versions.find(({ record }) => record.status === 'proposed')?.record ?? null;
  if (open && open.id !== body.replaces) {
    throw new Refusal(
      'stale',
      `Version ${open.number} is already being agreed on. Look at it first; a new proposal can then take its place.`,
      { currentVersion: open.number },
    );
  }
  checkDays(
    world,
    body.inForceFrom,
    versions.filter(({ record }) => record.status === 'agreed').map(({ record }) => record.inForceFrom),
  );
  if (open) await setTermsStatus(tx, open.id, { status: 'withdrawn' });

  const id = crypto.randomUUID() as TermsId;
  const number = Math.max(0, ...versions.map(({ record }) => record.number)) + 1;
  await insertTerms(tx, {
    workspaceId: workspace.id,
    id,
    projectId: project.id,
    number,
    status: 'proposed',
    content,
    inForceFrom: body.inForceFrom,
    note: body.note,
    proposedBy: actor.memberId,
    proposedAt: now,
  });
  if (actor.partyId && content.parties.some((party) => party.id === actor.partyId)) {
    await insertTermsDecision(tx, {
      workspaceId: workspace.id,
      termsId: id,
      partyId: actor.partyId,
      decision: 'agreed',
      comment: '',
      decidedBy: actor.memberId,
      decidedAt: now,
    });
  }
  await recordAudit(world, {
    action: 'terms.propose',
    subject: { kind: 'terms', id },
    detail: { projectId: project.id, number, inForceFrom: body.inForceFrom, replaces: open?.number ?? null },
  });
  const locked = await sealTermsWhenUnanimous(world, id);
  await tellTermsProposal(world, project.id, id);
  return { id, number, status: locked ? ('agreed' as const) : ('proposed' as const) };
});

/** Versions follow one another, and nobody changes what already holds by a day in the past. */
function checkDays({ today }: WorkspaceWorld, inForceFrom: string, agreedFrom: readonly string[]): void {
  const last = [...agreedFrom].sort().at(-1);
  if (last === undefined) return;
  if (inForceFrom <= last)
    throw invalid('inForceFrom', `The version before is in force from ${last}; a new one begins later.`);
  if (inForceFrom < today)
    throw invalid(
      'inForceFrom',
      'A new version begins today or later: what was born or sold before keeps the old one.',
    );
}
