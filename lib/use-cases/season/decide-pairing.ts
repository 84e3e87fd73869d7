import 'server-only';
import {
  findPairing,
  insertPairingDecision,
  lastPairingHash,
  lockPairing,
  lockPairingVersion,
  setPairing,
} from '@/db/queries/pairings';
import { lockProject } from '@/db/queries/projects';
import { decidePairing } from '@/lib/contracts/pairing';
import { recordAudit } from '../audit';
import { chainHash } from '../hash';
import { countAgreed, isUnanimous } from '../projects/agreement';
import { notFound, Refusal } from '../refusal';
import { workspaceUseCase, type WorkspaceWorld } from '../world';
import { loadStandings, type PairingStanding } from './pairing-standing';
import { tellDecision } from './tell-parties';

/** A party agrees to the version it saw or asks for a change. Once every party has agreed, the version is locked. */
export const decidePairingUseCase = workspaceUseCase(decidePairing, async (world, { params, body }) => {
  const { tx, sees, workspace, actor, now } = world;
  if (!(await findPairing(tx, sees, params.pairing))) throw notFound('pairing');
  await lockPairing(tx, params.pairing);
  const standing = await loadCurrent(world, params.pairing);
  const { record, versions, partyIds } = standing;
  if (!actor.partyId || !partyIds.includes(actor.partyId)) {
    throw new Refusal('not_allowed', 'Only the parties of the project decide on its pairings.');
  }
  const current = versions[0];
  const seen = versions.find(({ version }) => version.row.id === body.versionId);
  if (!current || !seen) throw notFound('version of this pairing');
  if (seen !== current) {
    const { number } = current.version.row;
    throw new Refusal(
      'stale',
      `Version ${seen.version.row.number} was replaced by version ${number} in the meantime. Your answer was not recorded; look at version ${number} and answer that.`,
      { currentVersion: number },
    );
  }
  if (record.status !== 'proposed') {
    throw new Refusal(
      'wrong_state',
      record.status === 'agreed'
        ? 'This pairing is agreed by all and locked; its answers can’t change any more.'
        : 'This pairing is no longer open for answers.',
    );
  }

  await insertPairingDecision(tx, {
    workspaceId: workspace.id,
    pairingVersionId: seen.version.row.id,
    partyId: actor.partyId,
    decision: body.decision,
    comment: body.comment,
    decidedBy: actor.memberId,
    decidedAt: now,
  });
  const after = await loadCurrent(world, params.pairing);
  const locked = await sealWhenUnanimous(world, after);
  await recordAudit(world, {
    action: 'pairing.decide',
    subject: { kind: 'pairing', id: record.id },
    detail: { number: seen.version.row.number, decision: body.decision, locked },
    reason: body.comment,
  });
  const standings = after.versions[0]?.standings ?? [];
  await tellDecision(world, after, body, locked);
  return { status: locked ? ('agreed' as const) : record.status, ...countAgreed(standings) };
});

export async function loadCurrent(
  world: WorkspaceWorld,
  id: PairingStanding['record']['id'],
): Promise<PairingStanding> {
  const record = await findPairing(world.tx, { everything: true }, id);
  const [standing] = record ? await loadStandings(world, [record]) : [];
  if (!standing) throw notFound('pairing');
  return standing;
}

/** Locks the newest version if every party has agreed to it, chained by hash to what the project locked before. */
export async function sealWhenUnanimous(
  { tx, now }: WorkspaceWorld,
  { record, versions }: PairingStanding,
): Promise<boolean> {
  const current = versions[0];
  if (!current || !isUnanimous(current.standings)) return false;
  await lockProject(tx, record.projectId);
  const { row } = current.version;
  const previousHash = await lastPairingHash(tx, record.projectId);
  const hash = chainHash(previousHash, {
    pairing: {
      id: record.id,
      projectId: record.projectId,
      season: record.season,
      sireId: record.sireId,
      damId: record.damId,
    },
    number: row.number,
    termsId: row.termsId,
    plan: row.plan,
    figures: row.figures,
    agreed: current.standings.map(({ partyId, by, at }) => ({ partyId, by, at: at?.toISOString() ?? null })),
  });
  await lockPairingVersion(tx, row.id, { lockedAt: now, previousHash, hash });
  await setPairing(tx, record.id, { status: 'agreed' });
  return true;
}
