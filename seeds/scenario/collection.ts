import { animalLoci, animals, ownershipParts, ownerships, weights } from '@/db/schema/collection';
import { withScope, type Transaction } from '@/db/scope';
import type { AnimalId, ClutchId, TubId } from '@/lib/contracts/ids';
import type { AnimalStatus } from '@/lib/contracts/animal';
import { dayFromNow } from '../calendar';
import { identify } from '../identify';
import { makeRandom } from '../random';
import { workspaceId } from './house';
import { ilse, maren, ravi } from './people';
import { claimOf, type Parts, type Simulated } from './simulate';
import { locusIdOf } from './species';

export const animalIdOf = ({ code }: Simulated) => identify<AnimalId>(`animal ${code}`);
export const clutchIdOf = (code: string) => identify<ClutchId>(`clutch ${code}`);

const random = makeRandom(77);
/** Animals that are not simply here. */
const elsewhere: Record<string, { status: AnimalStatus; since: number; notes: string }> = {
  'BP-008': { status: 'on_loan', since: -40, notes: 'Lent for a season; comes back in spring.' },
  'CS-006': { status: 'died', since: -95, notes: 'Found dead; the veterinarian saw no sign of infection.' },
  'BP-012': { status: 'quarantine', since: -12, notes: 'Back from a loan; kept apart for 90 days.' },
};

async function own(tx: Transaction, animal: Simulated, now: Date): Promise<void> {
  const animalId = animalIdOf(animal);
  const fromDay = dayFromNow(now, animal.hatched);
  const keep = async (key: string, parts: Parts, row: Partial<typeof ownerships.$inferInsert>) => {
    const id = identify(`ownership ${animal.code} ${key}`);
    await tx
      .insert(ownerships)
      .values({ workspaceId, id, animalId, fromDay, reason: 'founding', recordedBy: maren.memberId, ...row });
    await tx.insert(ownershipParts).values(parts.map((part) => ({ workspaceId, ownershipId: id, ...part })));
  };
  if (animal.code === 'BP-006' && maren.partyId && ilse.partyId) {
    const boughtOn = dayFromNow(now, -1400);
    await keep('before', [{ partyId: maren.partyId, parts: 1 }], { untilDay: boughtOn });
    await keep('now', animal.parts, {
      fromDay: boughtOn,
      reason: 'buy_in',
      price: 90_000,
      note: `${ilse.name} bought one part of three.`,
    });
    return;
  }
  const derivation =
    animal.generation > 1 && animal.dam && animal.sire
      ? [`Dam ${animal.dam.code} and sire ${animal.sire.code}: each side's parts go to that parent's owners.`]
      : null;
  await keep('now', animal.parts, { reason: derivation ? 'hatched' : 'founding', derivation });
}

function gramsAt(animal: Simulated, ageDays: number): number {
  const isPython = animal.species.prefix === 'BP';
  const grown = isPython ? (animal.sex === 'female' ? 1900 : 950) : animal.sex === 'female' ? 520 : 430;
  const start = isPython ? 65 : 8;
  return Math.round((start + (grown - start) * (1 - Math.exp(-ageDays / 420))) * (0.97 + random() * 0.06));
}

function weighings(animal: Simulated, now: Date): (typeof weights.$inferInsert)[] {
  const isYoung = animal.hatched > -400;
  return Array.from({ length: isYoung ? 3 : 8 }, (_, index) => -6 - index * (isYoung ? 20 : 31))
    .filter((day) => day > animal.hatched)
    .map((day) => ({
      workspaceId,
      id: identify(`weight ${animal.code} ${day}`),
      animalId: animalIdOf(animal),
      weighedOn: dayFromNow(now, day),
      grams: gramsAt(animal, day - animal.hatched),
      recordedBy: ravi.memberId,
    }));
}

/** Animals with what they show and carry, their owners and their weights; parents must be there or come first. */
export async function addAnimals(
  list: readonly Simulated[],
  tubs: readonly TubId[],
  now: Date,
): Promise<void> {
  await withScope({ workspaceId }, async (tx) => {
    for (const [index, animal] of list.entries()) {
      const id = animalIdOf(animal);
      const other = elsewhere[animal.code];
      const isYoung = animal.clutch !== undefined;
      // Every third hatchling has not been sexed yet.
      const isSexed = !isYoung || index % 3 !== 2;
      await tx.insert(animals).values({
        workspaceId,
        id,
        code: animal.code,
        name: animal.name,
        speciesId: animal.species.id,
        sex: isSexed ? animal.sex : 'unknown',
        sexedBy: isSexed ? (isYoung ? 'popped' : 'probed') : null,
        hatchedOn: dayFromNow(now, animal.hatched),
        hatchedPrecision: animal.generation === 0 ? 'year' : 'day',
        origin: 'captive_bred',
        status: other?.status ?? 'here',
        statusSince: other ? dayFromNow(now, other.since) : null,
        notes: other?.notes ?? '',
        damId: animal.dam ? animalIdOf(animal.dam) : null,
        sireId: animal.sire ? animalIdOf(animal.sire) : null,
        clutchId: animal.clutch ? clutchIdOf(animal.clutch.code) : null,
        hatchNumber: animal.clutch?.number ?? null,
        tubId: other && other.status !== 'quarantine' ? null : (tubs[index] ?? null),
        heldBack: isYoung && index % 5 === 0,
      });
      await tx.insert(animalLoci).values(
        animal.species.catalogue.loci.map((locus) => ({
          workspaceId,
          animalId: id,
          locusId: locusIdOf(locus.id),
          claim: claimOf(animal, locus),
          recordedOn: dayFromNow(now, animal.hatched),
        })),
      );
      await own(tx, animal, now);
      await tx.insert(weights).values(weighings(animal, now));
    }
  });
}
