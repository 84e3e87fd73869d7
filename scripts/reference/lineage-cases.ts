import { inferPedigree } from '@/lib/genetics/pedigree/infer';
import type { Evidence, PedigreeMember } from '@/lib/genetics/pedigree/pedigree-input';
import { inbreedingCoefficients } from '@/lib/kinship/inbreeding';
import { kinshipOf } from '@/lib/kinship/kinship';
import { orderPedigree, placeIn } from '@/lib/kinship/pedigree-order';
import {
  asList,
  asObject,
  asText,
  type CaseKind,
  type Finding,
  type Json,
  type JsonObject,
} from './case-kind';
import { compareClosely, compareSame, readFraction } from './compare';
import { phenotypeFromCase, readLoci, readSexSystem } from './read-genetics';

const numbers = (value: Json | undefined, what: string): Record<string, number> =>
  Object.fromEntries(
    Object.entries(asObject(value, what)).map(([key, p]) => [key, readFraction(p, what).valueOf()]),
  );

const optionalText = (value: Json | undefined, what: string): string | null =>
  value === undefined || value === null ? null : asText(value, what);

function readMember(given: JsonObject): PedigreeMember {
  const sex = given.sex ?? 'unknown';
  if (sex !== 'male' && sex !== 'female' && sex !== 'unknown')
    throw new Error(`sex: ${JSON.stringify(sex)} is not known.`);
  const group = optionalText(given.sire_group, 'sire_group');
  return {
    id: asText(given.id, 'id of an animal'),
    sex,
    sire: optionalText(given.sire, 'sire'),
    dam: optionalText(given.dam, 'dam'),
    ...(given.sires == null ? {} : { sires: numbers(given.sires, 'sires') }),
    ...(group === null ? {} : { sireGroup: group }),
    ...(given.parthenogenetic === true ? { parthenogenetic: true } : {}),
    ...(given.retention == null ? {} : { retention: readFraction(given.retention, 'retention').valueOf() }),
  };
}

function readEvidence(given: JsonObject): Evidence[] {
  const animal = asText(given.id, 'id of an animal');
  const evidence: Evidence[] = [];
  for (const [locus, chances] of Object.entries(asObject(given.prior ?? {}, 'prior'))) {
    evidence.push({ animal, locus, kind: 'prior', genotypes: numbers(chances, 'prior') });
  }
  for (const [locus, shown] of Object.entries(asObject(given.phenotype ?? {}, 'phenotype'))) {
    evidence.push({
      animal,
      locus,
      kind: 'phenotype',
      phenotype: phenotypeFromCase(asText(shown, 'phenotype')),
    });
  }
  for (const [locus, value] of Object.entries(asObject(given.test ?? {}, 'test'))) {
    const test = asObject(value, 'test');
    const error = readFraction(test.error ?? 0, 'error').valueOf();
    evidence.push({ animal, locus, kind: 'test', genotype: asText(test.genotype, 'genotype'), error });
  }
  return evidence;
}

const pedigree: CaseKind = (input, expected) => {
  const animals = asList(input.animals, 'animals').map((entry) => asObject(entry, 'an animal'));
  const frequencies = Object.fromEntries(
    Object.entries(asObject(input.founder_frequencies ?? {}, 'founder_frequencies')).map(
      ([locus, chances]) => [locus, numbers(chances, 'founder_frequencies')],
    ),
  );
  const result = inferPedigree({
    sexSystem: readSexSystem(input.sex_system),
    loci: readLoci(input),
    animals: animals.map(readMember),
    evidence: animals.flatMap(readEvidence),
    frequencies,
  });
  const findings: Finding[] = [compareSame('impossible', expected.impossible ?? false, result.impossible)];
  const within = (what: string, given: Json, actual: ReadonlyMap<string, number> | undefined) => {
    const chances = asObject(given, what);
    for (const name of new Set([...Object.keys(chances), ...(actual?.keys() ?? [])])) {
      findings.push(
        compareClosely(`${what} ${name}`, chances[name] ?? 0, actual ? (actual.get(name) ?? 0) : undefined),
      );
    }
  };
  for (const [locus, byAnimal] of Object.entries(asObject(expected.posterior ?? {}, 'posterior'))) {
    for (const [animal, chances] of Object.entries(asObject(byAnimal, locus))) {
      within(`${locus} of ${animal}:`, chances, result.beliefs.get(locus)?.get(animal));
    }
  }
  for (const [group, chances] of Object.entries(asObject(expected.sires ?? {}, 'sires'))) {
    within(`sire of ${group}:`, chances, result.sires.get(group));
  }
  return findings;
};

const kinship: CaseKind = (input, expected) => {
  const animals = asList(input.animals, 'animals').map((entry) => {
    const given = asObject(entry, 'an animal');
    return {
      id: asText(given.id, 'id'),
      sire: optionalText(given.sire, 'sire'),
      dam: optionalText(given.dam, 'dam'),
    };
  });
  const ordered = orderPedigree(animals);
  const inbreeding = inbreedingCoefficients(ordered);
  const findings = Object.entries(asObject(expected.inbreeding ?? {}, 'inbreeding')).map(([id, F]) =>
    compareClosely(`F of ${id}`, F, inbreeding[placeIn(ordered, id)]),
  );
  const wanted = asObject(expected.kinship ?? {}, 'kinship');
  for (const entry of asList(input.pairs ?? [], 'pairs')) {
    const [a, b] = asList(entry, 'a pair').map((id) => asText(id, 'id'));
    const key = `${a},${b}`;
    const value = kinshipOf(ordered, a ?? '', b ?? '');
    if (wanted[key] !== undefined) findings.push(compareClosely(`kinship ${key}`, wanted[key], value));
  }
  for (const key of Object.keys(wanted)) {
    if (findings.some(({ what }) => what === `kinship ${key}`)) continue;
    const [a = '', b = ''] = key.split(',');
    findings.push(compareClosely(`kinship ${key}`, wanted[key], kinshipOf(ordered, a, b)));
  }
  return findings;
};

export const lineageCaseKinds: Readonly<Record<string, CaseKind>> = { pedigree, kinship };
