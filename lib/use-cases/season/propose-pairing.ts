import 'server-only';
import { insertPairing } from '@/db/queries/pairings';
import type { PairingId } from '@/lib/contracts/ids';
import { proposePairing } from '@/lib/contracts/pairing';
import { workspaceUseCase } from '../world';
import { choosePair, seasonOf } from './choose-pair';
import { proposeVersion } from './propose-version';

/** A partner proposes a pairing to the parties of a project; the figures are kept with the proposal. */
export const proposePairingUseCase = workspaceUseCase(proposePairing, async (world, { body }) => {
  const pair = await choosePair(world, body);
  const season = seasonOf(body, pair.species.profile);
  const id = crypto.randomUUID() as PairingId;
  return proposeVersion(world, { ...pair, pairingId: id, season, number: 1 }, body, async () => {
    await insertPairing(world.tx, {
      workspaceId: world.workspace.id,
      id,
      projectId: pair.project.id,
      season,
      sireId: pair.sire.id,
      damId: pair.dam.id,
      status: 'proposed',
      createdBy: world.actor.memberId,
    });
  });
});
