import 'server-only';
import { findAnimalsByCode, listVisibleProjects } from '@/db/queries/animals';
import { listPartyMarks } from '@/db/queries/ownership';
import { listSpecies } from '@/db/queries/species';
import { listTubs } from '@/db/queries/tubs';
import type { ImportField } from '@/lib/contracts/animal-import';
import type { AnimalId, LocusId, PartyId, ProjectId, SpeciesId, TubId } from '@/lib/contracts/ids';
import type { LocusClaim } from '@/lib/contracts/animal';
import { loadBeliefs } from '../genetics/pedigree-beliefs';
import type { SpeciesBeliefs } from '../genetics/species-beliefs';
import { invalid, type FieldError } from '../refusal';
import type { WorkspaceWorld } from '../world';
import { checkParents, type AnimalFacts } from './animal-rules';
import { claimsFromText } from './claim-text';
import { checkClaims } from './claim-rules';
import { readCsv } from './csv-text';
import { guessColumns } from './import-columns';
import * as read from './import-cells';

export interface PlannedAnimal extends AnimalFacts {
  name: string;
  sexedBy: ReturnType<typeof read.readSexedBy>;
  origin: ReturnType<typeof read.readOrigin>;
  status: ReturnType<typeof read.readStatus>;
  statusSince: string | null;
  heldBack: boolean;
  notes: string;
  sireId: AnimalId | null;
  damId: AnimalId | null;
  possibleSires: { animalId: AnimalId; weight: number }[];
  tubId: TubId | null;
  loci: ({ locusId: LocusId } & LocusClaim)[];
  owners: { partyId: PartyId; parts: number }[];
  ownedFrom: string | null;
  weights: { weighedOn: string; grams: number }[];
  projectIds: ProjectId[];
}

export interface PlannedRow {
  line: number;
  errors: FieldError[];
  animal: PlannedAnimal;
}

export interface ImportPlan {
  head: string[];
  columns: (ImportField | null)[];
  samples: string[][];
  rows: PlannedRow[];
}

const MOST_ROWS = 5000;
const fieldNames: Record<string, string> = { sireId: 'sire', damId: 'dam', hatchedOn: 'hatched' };
const inFile = (field: string) =>
  fieldNames[field] ??
  (field.startsWith('possibleSires') ? 'possible sires' : field.startsWith('loci') ? 'loci' : field);

/** Reads a file of animals and checks every row as the form would, against the collection and the other rows; saves nothing. */
export async function planImport(
  world: WorkspaceWorld,
  body: { csv: string; columns?: (ImportField | null)[] },
): Promise<ImportPlan> {
  const [head, ...lines] = readCsv(body.csv);
  if (!head || lines.length === 0) throw invalid('csv', 'The file has a head and at least one row below it.');
  if (lines.length > MOST_ROWS)
    throw invalid('csv', `The file has ${lines.length} rows; take at most ${MOST_ROWS} at once.`);
  if (body.columns && body.columns.length !== head.length)
    throw invalid('columns', `The file has ${head.length} columns.`);
  const columns = body.columns ?? guessColumns(head);
  const chosen = columns.filter((field) => field !== null);
  const twice = chosen.find((field, index) => chosen.indexOf(field) < index);
  if (twice) throw invalid('columns', `Two columns are given as "${twice}".`);
  if (!chosen.includes('code')) throw invalid('columns', 'Say which column holds the code of each animal.');

  const cellsOf = (line: readonly string[]) => (field: ImportField) => {
    const index = columns.indexOf(field);
    return index < 0 ? '' : (line[index] ?? '');
  };
  const known = await loadKnown(world, lines.map(cellsOf));
  const rows = lines.map((line, index) => readRow(world, known, cellsOf(line), index + 2));
  const codes = new Map<string, PlannedRow>();
  for (const row of rows) {
    const first = codes.get(row.animal.code);
    if (first) row.errors.push({ field: 'code', message: `Row ${first.line} has the same code.` });
    else if (row.animal.code) codes.set(row.animal.code, row);
  }
  lines.forEach((line, index) => {
    const row = rows[index];
    if (row) linkRelatives(known, codes, row, cellsOf(line));
  });
  refuseCircles(rows);
  const samples = head.map((_, column) =>
    lines
      .map((line) => line[column] ?? '')
      .filter(Boolean)
      .slice(0, 3),
  );
  return { head, columns, samples, rows };
}

type Cells = (field: ImportField) => string;
type Known = Awaited<ReturnType<typeof loadKnown>>;

/** Everything of the workspace that a row can name, loaded once. */
async function loadKnown(world: WorkspaceWorld, lines: readonly Cells[]) {
  const { tx, sees } = world;
  const species = await listSpecies(tx);
  const beliefs = new Map<SpeciesId, SpeciesBeliefs>();
  for (const { id } of species) beliefs.set(id, await loadBeliefs(tx, id));
  const named = new Set<string>();
  for (const cells of lines) {
    for (const code of [cells('code'), cells('sire'), cells('dam')]) if (code) named.add(code);
    for (const piece of cells('possible sires').split(';'))
      named.add(piece.trim().replace(/\s+\d+$/, '')).add(piece.trim());
  }
  const there = await findAnimalsByCode(tx, sees, [...named]);
  return {
    species,
    beliefs,
    animals: new Map(there.map((row) => [row.code, row])),
    parties: new Map((await listPartyMarks(tx)).map(({ id, name }) => [name.toLowerCase(), id])),
    tubs: new Map((await listTubs(tx, sees)).map(({ id, label }) => [label.toLowerCase(), id])),
    projects: new Map(
      (await listVisibleProjects(tx, sees)).map((project) => [project.name.toLowerCase(), project]),
    ),
  };
}

function readRow({ today, actor }: WorkspaceWorld, known: Known, cells: Cells, line: number): PlannedRow {
  const errors: FieldError[] = [];
  const attempt = <T>(field: ImportField, work: () => T, otherwise: T): T => {
    try {
      return work();
    } catch (error) {
      if (!(error instanceof read.UnreadableCell)) throw error;
      errors.push({ field, message: error.message });
      return otherwise;
    }
  };
  const fail = (field: ImportField, message: string) => errors.push({ field, message });

  const code = cells('code');
  if (!code) fail('code', 'Every animal has a code.');
  if (code.length > 40) fail('code', 'A code has at most 40 characters.');
  if (known.animals.has(code)) fail('code', `The collection already has an animal ${code}.`);
  if (cells('name').length > 80) fail('name', 'A name has at most 80 characters.');
  if (cells('notes').length > 4000) fail('notes', 'A note has at most 4000 characters.');
  const wanted = cells('species').toLowerCase();
  const species = wanted
    ? known.species.find((row) =>
        [row.name, row.scientificName, row.codePrefix].some((name) => name.toLowerCase() === wanted),
      )
    : known.species.length === 1
      ? known.species[0]
      : undefined;
  if (!species)
    fail('species', wanted ? `There is no species "${cells('species')}" here.` : 'Say which species it is.');
  const hatched = attempt('hatched', () => read.readHatched(cells('hatched')), {
    hatchedOn: null,
    hatchedPrecision: 'day' as const,
  });
  if (hatched.hatchedOn && hatched.hatchedOn > today) fail('hatched', 'This day has not come yet.');
  const status = attempt('status', () => read.readStatus(cells('status')), 'here' as const);
  const tub = cells('place') ? known.tubs.get(cells('place').toLowerCase()) : null;
  if (tub === undefined) fail('place', `There is no tub "${cells('place')}" here.`);

  const owners = attempt('owners', () => read.readCounted(cells('owners')), []).flatMap(({ name, count }) => {
    const partyId = known.parties.get(name.toLowerCase());
    if (!partyId) fail('owners', `There is no party "${name}" here.`);
    return partyId ? [{ partyId, parts: count }] : [];
  });
  if (new Set(owners.map(({ partyId }) => partyId)).size < owners.length)
    fail('owners', 'A party is named twice.');
  if (!cells('owners') && actor.partyId) owners.push({ partyId: actor.partyId, parts: 1 });
  else if (!cells('owners')) fail('owners', 'Say who owns it.');
  const ownedFrom = attempt('owned from', () => read.readDay(cells('owned from')), null);
  if (ownedFrom && ownedFrom > today) fail('owned from', 'This day has not come yet.');
  const projectIds = cells('projects')
    .split(';')
    .map((name) => name.trim())
    .filter(Boolean)
    .flatMap((name) => {
      const project = known.projects.get(name.toLowerCase());
      if (!project) fail('projects', `There is no project "${name}" here.`);
      else if (species && project.speciesId !== species.id)
        fail('projects', `${project.name} is a project of another species.`);
      return project ? [project.id] : [];
    });

  const animal: PlannedAnimal = {
    id: crypto.randomUUID() as AnimalId,
    code,
    name: cells('name'),
    speciesId: species?.id ?? ('' as SpeciesId),
    sex: attempt('sex', () => read.readSex(cells('sex')), 'unknown'),
    sexedBy: attempt('sexed by', () => read.readSexedBy(cells('sexed by')), null),
    ...hatched,
    origin: attempt('origin', () => read.readOrigin(cells('origin')), 'unknown'),
    status,
    statusSince: attempt('status since', () => read.readDay(cells('status since')), null),
    heldBack: attempt('held back', () => read.readYes(cells('held back')), false),
    notes: cells('notes'),
    sireId: null,
    damId: null,
    possibleSires: [],
    tubId: tub ?? null,
    loci: [],
    owners,
    ownedFrom,
    weights: attempt('weights', () => read.readWeights(cells('weights'), today), []),
    projectIds,
  };
  const beliefs = species && known.beliefs.get(species.id);
  if (beliefs) readLoci(beliefs, animal, cells('loci'), fail);
  return { line, errors, animal };
}

function readLoci(
  beliefs: SpeciesBeliefs,
  animal: PlannedAnimal,
  cell: string,
  fail: (field: 'loci', message: string) => void,
): void {
  const found = claimsFromText(cell);
  if ('unreadable' in found) {
    fail(
      'loci',
      `"${found.unreadable}" can't be read; write "Locus: looks Phenotype, carries a/b = 2/3", with | between loci.`,
    );
    return;
  }
  for (const { locus, claim } of found.claims) {
    const id = beliefs.loci.find(({ name }) => name.toLowerCase() === locus.toLowerCase())?.id;
    if (!id) fail('loci', `The species has no locus "${locus}".`);
    else animal.loci.push({ locusId: id, ...claim });
  }
  for (const { message } of checkClaims(beliefs, animal, animal.loci)) fail('loci', message);
}

/** Sire, dam and possible sires by code: a row of the file, or an animal that is there already. */
function linkRelatives(
  known: Known,
  codes: ReadonlyMap<string, PlannedRow>,
  row: PlannedRow,
  cells: Cells,
): void {
  const look = (field: ImportField, code: string): AnimalFacts | null => {
    if (!code) return null;
    const facts = codes.get(code)?.animal ?? known.animals.get(code) ?? null;
    if (!facts)
      row.errors.push({
        field,
        message: `There is no animal ${code}, neither in the file nor in the collection.`,
      });
    return facts;
  };
  const sire = look('sire', cells('sire'));
  const dam = look('dam', cells('dam'));
  const possible = cells('possible sires')
    .split(';')
    .map((piece) => piece.trim())
    .filter(Boolean)
    .flatMap((piece) => {
      // A code may itself end in a number after a space; the whole text is tried first.
      const isWhole = codes.has(piece) || known.animals.has(piece);
      const found = isWhole ? null : /^(.*\S)\s+(\d{1,4})$/.exec(piece);
      const facts = look('possible sires', found?.[1] ?? piece);
      return facts ? [{ facts, weight: Math.max(1, Number(found?.[2] ?? 1)) }] : [];
    });
  const { animal } = row;
  animal.sireId = sire?.id ?? null;
  animal.damId = dam?.id ?? null;
  animal.possibleSires = possible.map(({ facts, weight }) => ({ animalId: facts.id, weight }));
  if (!animal.speciesId) return;
  for (const { field, message } of checkParents(animal, {
    sire,
    dam,
    possibleSires: possible.map(({ facts }) => facts),
  })) {
    row.errors.push({ field: inFile(field), message });
  }
}

/** Rows that are their own ancestors within the file. */
function refuseCircles(rows: readonly PlannedRow[]): void {
  const byId = new Map(rows.map((row) => [row.animal.id, row]));
  const state = new Map<AnimalId, 'open' | 'done'>();
  const visit = (row: PlannedRow): void => {
    if (state.has(row.animal.id)) return;
    state.set(row.animal.id, 'open');
    for (const parent of parentsIn(row)) {
      const above = byId.get(parent);
      if (!above) continue;
      if (state.get(parent) === 'open') {
        row.errors.push({
          field: 'sire',
          message: `${row.animal.code} and ${above.animal.code} descend from each other: an animal can't be its own ancestor.`,
        });
      } else visit(above);
    }
    state.set(row.animal.id, 'done');
  };
  for (const row of rows) visit(row);
}

export function parentsIn({ animal }: PlannedRow): AnimalId[] {
  return [animal.sireId, animal.damId, ...animal.possibleSires.map(({ animalId }) => animalId)].filter(
    (id) => id !== null,
  );
}
