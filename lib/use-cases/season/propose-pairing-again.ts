import 'server-only';
import { findPairing, lockPairing, setPairing } from '@/db/queries/pairings';
import { proposePairingAgain } from '@/lib/contracts/pairing';
import { notFound, Refusal, stale } from '../refusal';
import { workspaceUseCase } from '../world';
import { choosePair, seasonOf } from './choose-pair';
import { loadCurrent } from './decide-pairing';
import { proposeVersion } from './propose-version';

/** A partner proposes a new version of a pairing that is not agreed yet. Answers to the version before stay on record. */
export const proposePairingAgainUseCase = workspaceUseCase(
  proposePairingAgain,
  async (world, { params, body }) => {
    const { tx, sees } = world;
    if (!(await findPairing(tx, sees, params.pairing))) throw notFound('pairing');
    await lockPairing(tx, params.pairing);
    const { record, versions } = await loadCurrent(world, params.pairing);
    if (record.status !== 'proposed') {
      throw new Refusal(
        'wrong_state',
        record.status === 'agreed'
          ? 'This pairing is agreed by all and locked. Propose another pairing instead.'
          : 'This pairing is not open any more.',
      );
    }
    const number = versions[0]?.version.row.number ?? 0;
    if (body.seen !== number) throw stale('pairing', number);
    // Whoever is a party of the pairing may propose it again, also with an animal that they could not have chosen.
    const pair = await choosePair({ ...world, sees: { everything: true } }, record);
    const season = seasonOf(body, pair.species.profile);
    return proposeVersion(world, { ...pair, pairingId: record.id, season, number: number + 1 }, body, () =>
      setPairing(tx, record.id, { season }),
    );
  },
);
