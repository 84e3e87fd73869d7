import { GeneticsError } from '../genetics-error';
import { allelesOf, genotypesOf, isSexLinked } from '../genotype';
import type { Genotype, LocusDefinition, SexSystem } from '../locus';
import { checkMembers } from './check-members';
import { localWeights } from './evidence-weight';
import type { Factor } from './factor';
import { rareMutants, type Evidence, type PedigreeInput, type PedigreeMember } from './pedigree-input';
import { chanceOfParthenogenetic, chanceOfYoung, handedOn } from './transmission';

/** A pedigree as variables and factors. */
export interface PedigreeGraph {
  /** Some animal has no genotype left: nothing can be computed. */
  impossible: boolean;
  sizes: number[];
  factors: Factor[];
  genotypes: { locus: string; animal: string; variable: number; states: readonly Genotype[] }[];
  sireGroups: { group: string; variable: number; candidates: readonly string[] }[];
  /** Animals of unknown sex at sex-linked loci; state 0 is male. */
  sexes: { animal: string; variable: number }[];
}

/** The group of an animal with several possible sires. */
export function sireGroupOf(animal: PedigreeMember): string {
  return animal.sireGroup ?? `own:${animal.id}`;
}

/**
 * Writes the pedigree as a product of small tables: a prior per founder, a table per young and its parents, and for
 * several possible sires a switch per candidate, so that no table holds all candidates at once.
 */
export function buildGraph(input: PedigreeInput): PedigreeGraph {
  const members = checkMembers(input.animals);
  const graph: PedigreeGraph = {
    impossible: false,
    sizes: [],
    factors: [],
    genotypes: [],
    sireGroups: [],
    sexes: [],
  };
  const groups = addSireGroups(graph, members);
  const sexes = addSexes(graph, input, members);
  const evidenceOf = sortEvidence(input, members);
  for (const locus of input.loci) addLocus(graph, input, locus, members, groups, sexes, evidenceOf);
  return graph;
}

function addVariable(graph: PedigreeGraph, size: number): number {
  graph.sizes.push(size);
  if (size === 0) graph.impossible = true;
  return graph.sizes.length - 1;
}

type SireGroups = Map<string, { variable: number; candidates: readonly string[] }>;

function addSireGroups(graph: PedigreeGraph, members: readonly PedigreeMember[]): SireGroups {
  const groups: SireGroups = new Map();
  for (const animal of members) {
    if (!animal.sires || animal.parthenogenetic) continue;
    const group = sireGroupOf(animal);
    const candidates = Object.keys(animal.sires);
    const known = groups.get(group);
    if (known) {
      if (known.candidates.join('\n') !== candidates.join('\n')) {
        throw new GeneticsError(
          'evidence',
          animal.id,
          `${animal.id} has other possible sires than the rest of "${group}".`,
        );
      }
      continue;
    }
    const variable = addVariable(graph, candidates.length);
    graph.factors.push({ variables: [variable], table: Float64Array.from(Object.values(animal.sires)) });
    groups.set(group, { variable, candidates });
    graph.sireGroups.push({ group, variable, candidates });
  }
  return groups;
}

function addSexes(
  graph: PedigreeGraph,
  { loci }: PedigreeInput,
  members: readonly PedigreeMember[],
): Map<string, number> {
  const sexes = new Map<string, number>();
  if (!loci.some(isSexLinked)) return sexes;
  for (const { id, sex } of members) {
    if (sex !== 'unknown') continue;
    const variable = addVariable(graph, 2);
    graph.factors.push({ variables: [variable], table: Float64Array.of(0.5, 0.5) });
    sexes.set(id, variable);
    graph.sexes.push({ animal: id, variable });
  }
  return sexes;
}

function sortEvidence(input: PedigreeInput, members: readonly PedigreeMember[]): Map<string, Evidence[]> {
  const animals = new Set(members.map(({ id }) => id));
  const loci = new Set(input.loci.map(({ id }) => id));
  const sorted = new Map<string, Evidence[]>();
  for (const entry of input.evidence) {
    if (!animals.has(entry.animal))
      throw new GeneticsError('evidence', entry.animal, `"${entry.animal}" is not in the pedigree.`);
    if (!loci.has(entry.locus))
      throw new GeneticsError('evidence', entry.locus, `"${entry.locus}" is no locus here.`);
    const key = `${entry.locus}\n${entry.animal}`;
    const known = sorted.get(key);
    if (known) known.push(entry);
    else sorted.set(key, [entry]);
  }
  return sorted;
}

function readFrequencies(
  locus: LocusDefinition,
  given: Readonly<Record<string, number>> | undefined,
): number[] {
  const chosen = given ?? rareMutants(locus);
  for (const symbol of Object.keys(chosen)) {
    if (!locus.alleles.some((allele) => allele.symbol === symbol)) {
      throw new GeneticsError('unknown-allele', locus.id, `${locus.name} has no allele "${symbol}".`);
    }
  }
  const frequencies = locus.alleles.map(({ symbol }) => chosen[symbol] ?? 0);
  const total = frequencies.reduce((a, b) => a + b, 0);
  if (frequencies.some((value) => !(value >= 0)) || Math.abs(total - 1) > 1e-9) {
    throw new GeneticsError(
      'probability',
      locus.id,
      `The allele frequencies at ${locus.name} add up to ${total}, not 1.`,
    );
  }
  return frequencies;
}

interface Placed {
  variable: number;
  states: readonly Genotype[];
  gametes: readonly (readonly number[])[];
}

function addLocus(
  graph: PedigreeGraph,
  { sexSystem, frequencies: given }: PedigreeInput,
  locus: LocusDefinition,
  members: readonly PedigreeMember[],
  groups: SireGroups,
  sexes: ReadonlyMap<string, number>,
  evidenceOf: ReadonlyMap<string, readonly Evidence[]>,
): void {
  const frequencies = readFrequencies(locus, given?.[locus.id]);
  const gametesOf = new Map<Genotype, number[]>();
  const placed = new Map<string, Placed>();
  for (const animal of members) {
    const founder = isFounder(animal);
    const all = genotypesOf(locus, animal.sex, sexSystem);
    const evidence = evidenceOf.get(`${locus.id}\n${animal.id}`) ?? [];
    const weights = localWeights(locus, animal.sex, sexSystem, all, evidence, founder ? frequencies : null);
    const kept = all.map((_, i) => i).filter((i) => (weights[i] ?? 0) > 0);
    const states = kept.map((i) => all[i] ?? '');
    const variable = addVariable(graph, states.length);
    graph.factors.push({ variables: [variable], table: Float64Array.from(kept, (i) => weights[i] ?? 0) });
    graph.genotypes.push({ locus: locus.id, animal: animal.id, variable, states });
    for (const state of states) if (!gametesOf.has(state)) gametesOf.set(state, handedOn(locus, state));
    placed.set(animal.id, { variable, states, gametes: states.map((state) => gametesOf.get(state) ?? []) });
    const sex = sexes.get(animal.id);
    if (sex !== undefined && isSexLinked(locus)) addSexSwitch(graph, sexSystem, variable, states, sex);
  }
  // A parent is placed before its young only by chance, so young are joined once all are placed.
  for (const animal of members)
    if (!isFounder(animal)) addYoung(graph, locus, sexSystem, animal, placed, groups, frequencies);
}

function isFounder(animal: PedigreeMember): boolean {
  return animal.dam == null && (animal.parthenogenetic === true || (animal.sire == null && !animal.sires));
}

/** Ties the number of copies to the sex. */
function addSexSwitch(
  graph: PedigreeGraph,
  system: SexSystem,
  variable: number,
  states: readonly Genotype[],
  sex: number,
): void {
  const single = system === 'XY' ? 0 : 1;
  const table = states.flatMap((state) =>
    [0, 1].map((value) => ((allelesOf(state).length === 1) === (value === single) ? 1 : 0)),
  );
  graph.factors.push({ variables: [variable, sex], table: Float64Array.from(table) });
}

function addYoung(
  graph: PedigreeGraph,
  locus: LocusDefinition,
  system: SexSystem,
  animal: PedigreeMember,
  placed: ReadonlyMap<string, Placed>,
  groups: SireGroups,
  frequencies: readonly number[],
): void {
  const young = placed.get(animal.id);
  const dam = animal.dam == null ? undefined : placed.get(animal.dam);
  if (!young) return;
  if (animal.parthenogenetic && dam) {
    const table = dam.states.flatMap((mother) =>
      young.states.map((state) => chanceOfParthenogenetic(state, mother, animal.retention ?? 0)),
    );
    graph.factors.push({ variables: [dam.variable, young.variable], table: Float64Array.from(table) });
    return;
  }
  // An unknown parent hands on an allele drawn from the founders' frequencies.
  const unknown = { variable: -1, gametes: [frequencies] };
  const group = animal.sires ? groups.get(sireGroupOf(animal)) : undefined;
  const sire = group
    ? addPaternalAllele(graph, locus, group, placed)
    : ((animal.sire == null ? undefined : placed.get(animal.sire)) ?? unknown);
  const mother = dam ?? unknown;
  const table = sire.gametes.flatMap((paternal) =>
    mother.gametes.flatMap((maternal) =>
      young.states.map((state) => chanceOfYoung(locus, system, state, paternal, maternal)),
    ),
  );
  const variables = [sire.variable, mother.variable, young.variable].filter((variable) => variable >= 0);
  graph.factors.push({ variables, table: Float64Array.from(table) });
}

/** The allele that a young has from whichever male is its sire: one switch per candidate, which counts if he is it. */
function addPaternalAllele(
  graph: PedigreeGraph,
  locus: LocusDefinition,
  group: { variable: number; candidates: readonly string[] },
  placed: ReadonlyMap<string, Placed>,
): { variable: number; gametes: readonly (readonly number[])[] } {
  const variable = addVariable(graph, locus.alleles.length);
  group.candidates.forEach((id, index) => {
    const candidate = placed.get(id);
    if (!candidate) return;
    const table = group.candidates.flatMap((_, chosen) =>
      candidate.gametes.flatMap((gametes) =>
        locus.alleles.map((_allele, a) => (chosen === index ? (gametes[a] ?? 0) : 1)),
      ),
    );
    graph.factors.push({
      variables: [group.variable, candidate.variable, variable],
      table: Float64Array.from(table),
    });
  });
  return {
    variable,
    gametes: locus.alleles.map((_, a) => locus.alleles.map((_allele, b) => (a === b ? 1 : 0))),
  };
}
