import 'server-only';
import { insertPairingDecision, insertPairingVersion } from '@/db/queries/pairings';
import type { PairingId, PairingVersionId } from '@/lib/contracts/ids';
import type { PairingStatus } from '@/lib/contracts/project';
import { recordAudit } from '../audit';
import { Refusal, type FieldError } from '../refusal';
import type { WorkspaceWorld } from '../world';
import { findObstacles, type choosePair } from './choose-pair';
import { loadCurrent, sealWhenUnanimous } from './decide-pairing';
import { makeFigures } from './make-figures';
import { tellProposal } from './tell-parties';

export interface ProposedPlan {
  startsOn: string;
  endsOn: string;
  eggsExpected: number;
  note: string;
  prices: Record<string, number>;
  acknowledgedCautions: string[];
  answerBy: string | null;
}

type Proposed = Awaited<ReturnType<typeof choosePair>> & {
  pairingId: PairingId;
  season: number;
  number: number;
};

/**
 * Keeps a version of a pairing with its figures, counts the proposer's own party as agreeing, and tells all parties.
 * @param keep writes the pairing itself, once nothing stands against it
 */
export async function proposeVersion(
  world: WorkspaceWorld,
  proposed: Proposed,
  plan: ProposedPlan,
  keep: () => Promise<void>,
): Promise<{ id: PairingId; versionId: PairingVersionId; number: number; status: PairingStatus }> {
  const { tx, workspace, actor, now, today } = world;
  const { pairingId, season, number } = proposed;
  const { figures, prices } = await makeFigures(world, {
    ...proposed,
    startsOn: plan.startsOn,
    eggsExpected: plan.eggsExpected,
    prices: plan.prices,
  });
  const errors: FieldError[] = await findObstacles(world, proposed, {
    season,
    hasTerms: figures.termsId !== null,
    except: pairingId,
  });
  const missing = figures.cautions.filter(({ text }) => !plan.acknowledgedCautions.includes(text));
  if (missing[0])
    errors.push({
      field: 'acknowledgedCautions',
      message: `Confirm that you have read this caution: ${missing[0].text}`,
    });
  if (plan.answerBy && plan.answerBy < today)
    errors.push({ field: 'answerBy', message: 'This day is over.' });
  const { termsId, termsNumber } = figures;
  if (errors.length || termsId === null || termsNumber === null)
    throw new Refusal('invalid', errors[0]?.message ?? 'This can’t be proposed.', { errors });

  await keep();
  const versionId = crypto.randomUUID() as PairingVersionId;
  const { answerBy, ...kept } = plan;
  await insertPairingVersion(tx, {
    workspaceId: workspace.id,
    id: versionId,
    pairingId,
    number,
    termsId,
    plan: {
      startsOn: kept.startsOn,
      endsOn: kept.endsOn,
      eggsExpected: kept.eggsExpected,
      note: kept.note,
      prices,
      acknowledgedCautions: kept.acknowledgedCautions,
    },
    figures: { ...figures, termsId, termsNumber },
    proposedBy: actor.memberId,
    proposedAt: now,
    answerBy,
  });
  const standing = await loadCurrent(world, pairingId);
  if (actor.partyId && standing.partyIds.includes(actor.partyId)) {
    await insertPairingDecision(tx, {
      workspaceId: workspace.id,
      pairingVersionId: versionId,
      partyId: actor.partyId,
      decision: 'agreed',
      comment: '',
      decidedBy: actor.memberId,
      decidedAt: now,
    });
  }
  await recordAudit(world, {
    action: 'pairing.propose',
    subject: { kind: 'pairing', id: pairingId },
    detail: { number, title: figures.title, termsId, season },
  });
  const after = await loadCurrent(world, pairingId);
  const locked = await sealWhenUnanimous(world, after);
  await tellProposal(world, after);
  return { id: pairingId, versionId, number, status: locked ? 'agreed' : 'proposed' };
}
