import 'server-only';
import { findAnimal } from '@/db/queries/animals';
import { loadPedigree, visibleIdsOfSpecies } from '@/db/queries/lineage';
import { findSpecies } from '@/db/queries/species';
import type { AnimalId } from '@/lib/contracts/ids';
import { showLineage, type LineageNode } from '@/lib/contracts/lineage';
import { carriesProbability } from '../genetics/copies';
import { loadBeliefs } from '../genetics/pedigree-beliefs';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';
import { chooseLineage, parentsOf, relationFinder, type PedigreeLinks } from './choose-lineage';
import { groupBy } from '../genetics/group-by';

/** A member looks at the lineage of an animal, or of a whole species, as far as they may see it. */
export const showLineageUseCase = workspaceUseCase(showLineage, async ({ tx, sees }, { query }) => {
  const root = query.animal ? await findAnimal(tx, sees, query.animal) : null;
  if (query.animal && !root) throw notFound('animal');
  const species = await findSpecies(tx, root?.speciesId ?? query.species!);
  if (!species) throw notFound('species');
  const pedigree = await loadPedigree(tx, species.id);
  const visible = await visibleIdsOfSpecies(tx, sees, species.id);
  const links: PedigreeLinks = {
    byId: new Map(pedigree.rows.map((row) => [row.id, row])),
    possibleSires: new Map(
      [...groupBy(pedigree.possibleSires, (row) => row.animalId)].map(([id, rows]) => [
        id,
        rows.map((row) => row.sireId),
      ]),
    ),
  };
  const chosen = root
    ? chooseLineage(links, visible, root.id, query.up, query.down)
    : new Set([...visible].flatMap((id) => [id, ...parentsOf(links, id)]));

  const beliefs = await loadBeliefs(tx, species.id);
  const locus = beliefs.loci.find(({ id }) => id === query.locus);
  // Keys of animals that are not shown say nothing: they are counted in the order of the answer.
  const hidden = new Map<AnimalId, string>();
  for (const id of [...chosen].sort()) if (!visible.has(id)) hidden.set(id, `hidden-${hidden.size + 1}`);
  const keyOf = (id: AnimalId | null) => (id && chosen.has(id) ? (hidden.get(id) ?? id) : null);
  const sexOfHidden = new Map<AnimalId, LineageNode['sex']>();
  for (const id of chosen) {
    const row = links.byId.get(id);
    if (!row || !visible.has(id)) continue;
    if (row.damId) sexOfHidden.set(row.damId, 'female');
    for (const sire of [row.sireId, ...(links.possibleSires.get(id) ?? [])])
      if (sire) sexOfHidden.set(sire, 'male');
  }

  const nodes = [...chosen].flatMap((id): LineageNode[] => {
    const row = links.byId.get(id);
    if (!row) return [];
    if (!visible.has(id)) return [hiddenNode(hidden.get(id) ?? '', sexOfHidden.get(id) ?? 'unknown')];
    const belief = locus ? beliefs.belief(id, locus.id) : null;
    return [
      {
        key: id,
        shown: true,
        code: row.code,
        name: row.name,
        sex: row.sex,
        hatchedOn: row.hatchedOn,
        status: row.status,
        description: beliefs.describe(id),
        fill: belief && {
          shows: beliefs.shows(belief),
          carries: carriesProbability(beliefs, belief),
          words: beliefs.words(belief),
        },
        sire: keyOf(row.sireId),
        dam: keyOf(row.damId),
        possibleSires: (links.possibleSires.get(id) ?? []).map(keyOf).filter((key) => key !== null),
      },
    ];
  });
  return {
    root: root?.id ?? null,
    speciesId: species.id,
    loci: beliefs.loci.map(({ id, name }) => ({ id, name })),
    nodes: nodes.sort(
      (a, b) =>
        (a.hatchedOn ?? '').localeCompare(b.hatchedOn ?? '') ||
        a.code.localeCompare(b.code, 'en', { numeric: true }),
    ),
    relatedMates: relatedMates(links, chosen, visible, (id) => hidden.get(id) ?? id),
  };
});

function hiddenNode(key: string, sex: LineageNode['sex']): LineageNode {
  return {
    key,
    shown: false,
    code: '',
    name: '',
    sex,
    hatchedOn: null,
    status: null,
    description: '',
    fill: null,
    sire: null,
    dam: null,
    possibleSires: [],
  };
}

/** Pairs of parents in the graph that have a common ancestor, seen or not. */
function relatedMates(
  links: PedigreeLinks,
  chosen: ReadonlySet<AnimalId>,
  visible: ReadonlySet<AnimalId>,
  keyOf: (id: AnimalId) => string,
): [string, string][] {
  const areRelated = relationFinder(links);
  const pairs = new Map<string, [string, string]>();
  for (const id of chosen) {
    const row = links.byId.get(id);
    if (!row?.damId || !visible.has(id)) continue;
    for (const sire of [row.sireId, ...(links.possibleSires.get(id) ?? [])]) {
      if (!sire || !chosen.has(sire) || !chosen.has(row.damId)) continue;
      const pair: [string, string] = [keyOf(sire), keyOf(row.damId)];
      if (!pairs.has(pair.join()) && areRelated(sire, row.damId)) pairs.set(pair.join(), pair);
    }
  }
  return [...pairs.values()];
}
