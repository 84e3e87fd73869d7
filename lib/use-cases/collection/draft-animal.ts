import 'server-only';
import { findAnimals } from '@/db/queries/animals';
import { ancestorIds } from '@/db/queries/lineage';
import { findTub } from '@/db/queries/tubs';
import type { LocusClaim } from '@/lib/contracts/animal';
import type { AnimalId, LocusId, TubId } from '@/lib/contracts/ids';
import type { SpeciesBeliefs } from '../genetics/species-beliefs';
import type { FieldError } from '../refusal';
import type { WorkspaceWorld } from '../world';
import { checkParents, type AnimalFacts } from './animal-rules';
import { checkClaims } from './claim-rules';

export interface DraftAnimal extends AnimalFacts {
  sireId: AnimalId | null;
  damId: AnimalId | null;
  possibleSires: readonly { animalId: AnimalId; weight: number }[];
  tubId: TubId | null;
  statusSince: string | null;
  loci: readonly ({ locusId: LocusId } & LocusClaim)[];
}

/**
 * Everything that can be wrong with an animal before it is saved, each with its field. Relatives that stay as they
 * were are taken as they are, also where the caller may not see them; newly named ones have to be seen.
 */
export async function checkDraft(
  world: WorkspaceWorld,
  draft: DraftAnimal,
  species: SpeciesBeliefs,
  kept: ReadonlySet<AnimalId>,
): Promise<FieldError[]> {
  const { tx, sees, today } = world;
  const errors: FieldError[] = [];
  if (draft.hatchedOn && draft.hatchedOn > today)
    errors.push({ field: 'hatchedOn', message: 'This day has not come yet.' });
  if (draft.statusSince && draft.statusSince > today)
    errors.push({ field: 'statusSince', message: 'This day has not come yet.' });
  if (draft.tubId && !(await findTub(tx, draft.tubId)))
    errors.push({ field: 'tubId', message: 'There is no such tub here.' });

  const named = [draft.sireId, draft.damId, ...draft.possibleSires.map(({ animalId }) => animalId)].filter(
    (id) => id !== null,
  );
  const keptHere = named.filter((id) => kept.has(id));
  const found = new Map(
    [
      ...(await findAnimals(tx, { everything: true }, keptHere)),
      ...(await findAnimals(
        tx,
        sees,
        named.filter((id) => !kept.has(id)),
      )),
    ].map((row) => [row.id, row]),
  );
  const look = (id: AnimalId | null, field: string): AnimalFacts | null => {
    if (!id) return null;
    const row = found.get(id);
    if (!row) errors.push({ field, message: 'There is no such animal here, or you may not see it.' });
    return row ?? null;
  };
  const sire = look(draft.sireId, 'sireId');
  const dam = look(draft.damId, 'damId');
  const possibleSires = draft.possibleSires.map(({ animalId }, index) =>
    look(animalId, `possibleSires.${index}.animalId`),
  );
  errors.push(
    ...checkParents(draft, { sire, dam, possibleSires: possibleSires.filter((row) => row !== null) }),
  );

  const parents = [
    { field: 'sireId', facts: sire },
    { field: 'damId', facts: dam },
    ...possibleSires.map((facts, index) => ({ field: `possibleSires.${index}.animalId`, facts })),
  ];
  for (const { field, facts } of parents) {
    if (!facts || facts.id === draft.id || errors.some((error) => error.field === field)) continue;
    if ((await ancestorIds(tx, [facts.id])).has(draft.id)) {
      errors.push({
        field,
        message: `${facts.code} descends from ${draft.code}: an animal can't be its own ancestor.`,
      });
    }
  }
  errors.push(...checkClaims(species, draft, draft.loci));
  return errors;
}
