import 'server-only';
import { listOwnership, listPartyMarks } from '@/db/queries/ownership';
import { listProjectsWithParties } from '@/db/queries/workspace';
import type { AnimalId, PartyId } from '@/lib/contracts/ids';
import { reachOf } from '../permissions';
import type { WorkspaceWorld } from '../world';

/**
 * The owners of an animal over time as the caller may see them. Prices are for those who may transfer parts or see
 * the ledger, and a partner sees those of changes that their party was part of. A partner is told the names of present
 * co-owners and of the parties of shared projects; earlier owners from elsewhere stay unnamed.
 */
export async function presentOwnership({ tx, sees, actor }: WorkspaceWorld, animalId: AnimalId) {
  const sets = await listOwnership(tx, animalId);
  const marks = await listPartyMarks(tx);
  const maySeePrices =
    reachOf(actor.role, 'ownership.transfer') !== 'no' || reachOf(actor.role, 'ledger.see') !== 'no';
  const isParty = (set: { parts: { partyId: PartyId }[] } | undefined) =>
    set?.parts.some(({ partyId }) => partyId === actor.partyId) ?? false;
  const named = new Set<PartyId>(
    sees.everything
      ? marks.map(({ id }) => id)
      : [
          ...(await listProjectsWithParties(tx, sees)).flatMap((project) =>
            project.parties.map(({ partyId }) => partyId),
          ),
          ...sets
            .filter((set) => set.untilDay === null)
            .flatMap((set) => set.parts.map(({ partyId }) => partyId)),
          ...marks.filter(({ id, kind }) => kind === 'house' || id === actor.partyId).map(({ id }) => id),
        ],
  );
  const mentioned = new Set(sets.flatMap((set) => set.parts.map(({ partyId }) => partyId)));
  return {
    parties: marks
      .filter(({ id }) => mentioned.has(id))
      .map((party) => (named.has(party.id) ? party : { ...party, name: 'An earlier owner' })),
    ownership: sets.map((set, index) => {
      const seesPrice = maySeePrices && (sees.everything || isParty(set) || isParty(sets[index + 1]));
      return {
        id: set.id,
        fromDay: set.fromDay,
        untilDay: set.untilDay,
        reason: set.reason,
        parts: set.parts,
        price: seesPrice ? set.price : null,
        note: seesPrice ? set.note : '',
        derivation: set.derivation ? [...set.derivation] : null,
        recordedBy: set.recordedBy,
      };
    }),
  };
}
