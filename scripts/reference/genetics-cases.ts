import type Fraction from 'fraction.js';
import { chanceInClutch } from '@/lib/genetics/clutch-odds';
import { crossParents, lethalShare } from '@/lib/genetics/cross';
import { testFit } from '@/lib/genetics/goodness-of-fit';
import { genotypesOfYoung, phenotypesOfYoung, type OffspringClass } from '@/lib/genetics/offspring';
import { asList, asObject, asText, type CaseKind, type Finding, type Json } from './case-kind';
import { compareClosely, compareExactly, compareSame, readFraction } from './compare';
import { phenotypeForCase, phenotypeFromCase, readCross } from './read-genetics';

const keyOf = (sex: string | null, values: Readonly<Record<string, string>>) =>
  `${sex ?? ''} ${Object.keys(values)
    .toSorted()
    .map((id) => `${id}:${values[id]}`)
    .join(' ')}`.trim();

/** Every expected class must be there with its chance, and nothing else. */
function compareClasses(
  what: string,
  expected: Json,
  actual: readonly OffspringClass<string>[],
  word: 'genotype' | 'phenotype',
): Finding[] {
  const left = new Map<string, Fraction>();
  for (const { sex, values, chance } of actual) {
    const shown =
      word === 'genotype'
        ? values
        : Object.fromEntries(Object.entries(values).map(([id, v]) => [id, phenotypeForCase(v)]));
    left.set(keyOf(sex, shown), chance);
  }
  const findings = asList(expected, what).map((entry) => {
    const row = asObject(entry, what);
    const values = Object.fromEntries(
      Object.entries(asObject(row[word], word)).map(([id, v]) => [id, asText(v, word)]),
    );
    const key = keyOf(row.sex === undefined ? null : asText(row.sex, 'sex'), values);
    const found = left.get(key) ?? null;
    left.delete(key);
    return compareExactly(`${what}: ${key}`, row.p, found);
  });
  return [
    ...findings,
    ...[...left].map(([key, chance]) => compareExactly(`${what}: ${key} (not expected)`, '0', chance)),
  ];
}

const cross: CaseKind = (input, expected) => {
  const result = crossParents(readCross(input));
  const findings: Finding[] = [];
  if (expected.lethal !== undefined)
    findings.push(compareExactly('lethal', expected.lethal, lethalShare(result)));
  if (expected.genotypes_of_survivors !== undefined) {
    findings.push(
      ...compareClasses('genotypes', expected.genotypes_of_survivors, genotypesOfYoung(result), 'genotype'),
    );
  }
  if (expected.phenotypes_of_survivors !== undefined) {
    findings.push(
      ...compareClasses(
        'phenotypes',
        expected.phenotypes_of_survivors,
        phenotypesOfYoung(result),
        'phenotype',
      ),
    );
  }
  return findings;
};

const clutch: CaseKind = (input, expected) => {
  const { eggs, at_least: atLeast, sex } = input;
  if (typeof eggs !== 'number') throw new Error('eggs must be a number.');
  if (atLeast !== undefined && typeof atLeast !== 'number') throw new Error('at_least must be a number.');
  if (sex !== undefined && sex !== 'male' && sex !== 'female')
    throw new Error('sex must be "male" or "female".');
  const phenotype = Object.fromEntries(
    Object.entries(asObject(input.phenotype ?? {}, 'phenotype')).map(([id, shown]) => [
      id,
      phenotypeFromCase(asText(shown, 'phenotype')),
    ]),
  );
  const p = chanceInClutch(
    crossParents(readCross(input)),
    { phenotype, ...(sex ? { sex } : {}) },
    eggs,
    atLeast ?? 1,
  );
  return expected.p === undefined ? [] : [compareExactly('p', expected.p, p)];
};

const fit: CaseKind = (input, expected) => {
  const counts = Object.entries(asObject(input.observed, 'observed')).map(([name, count]) => {
    if (typeof count !== 'number') throw new Error(`observed ${name} must be a number.`);
    return [name, count] as const;
  });
  const weights = Object.entries(asObject(input.expected_ratio, 'expected_ratio')).map(
    ([name, ratio]) => [name, readFraction(ratio, name)] as const,
  );
  // A ratio such as 9:3:3:1 is brought to chances.
  const total = weights.map(([, weight]) => weight).reduce((a, b) => a.add(b));
  const chances = Object.fromEntries(weights.map(([name, weight]) => [name, weight.div(total)]));
  const result = testFit(Object.fromEntries(counts), chances);
  const findings: Finding[] = [];
  if (expected.chi_squared !== undefined)
    findings.push(compareExactly('chi_squared', expected.chi_squared, result.chiSquared));
  if (expected.degrees_of_freedom !== undefined) {
    findings.push(compareSame('degrees_of_freedom', expected.degrees_of_freedom, result.degreesOfFreedom));
  }
  if (expected.exact_p_value !== undefined) {
    // A decimal in the file is rounded; a fraction is exact.
    const decimal =
      typeof expected.exact_p_value === 'number' || !String(expected.exact_p_value).includes('/');
    findings.push(
      decimal
        ? compareClosely('exact_p_value', expected.exact_p_value, result.exactPValue?.valueOf())
        : compareExactly('exact_p_value', expected.exact_p_value, result.exactPValue),
    );
  }
  return findings;
};

export const geneticsCaseKinds: Readonly<Record<string, CaseKind>> = { cross, clutch, fit };
