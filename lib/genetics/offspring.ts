import type Fraction from 'fraction.js';
import { livingSexes, type Cross, type KnownSex } from './cross';
import { ONE, ZERO } from './fractions';
import { phenotypeChances } from './genotype';
import type { Genotype, LocusDefinition, Phenotype } from './locus';

/** A class of young that live, with its exact chance among them. */
export interface OffspringClass<Value> {
  /** Told only where a locus is sex-linked. */
  sex: KnownSex | null;
  /** Genotype or phenotype by locus id. */
  values: Readonly<Record<string, Value>>;
  chance: Fraction;
}

/** Joint genotypes of the young that live. Multiplies all loci out: ask for few loci. */
export function genotypesOfYoung(cross: Cross): OffspringClass<Genotype>[] {
  return multiplyOut(cross, (loci, genotypes) => [
    { values: Object.fromEntries(loci.map((locus, i) => [locus.id, genotypes[i] ?? ''])), chance: ONE },
  ]);
}

/** Joint phenotypes of the young that live ('' is normal). Multiplies all loci out: ask for few loci. */
export function phenotypesOfYoung(cross: Cross): OffspringClass<Phenotype>[] {
  return multiplyOut(cross, phenotypeClasses);
}

/** Joint phenotypes of linked loci for one joint genotype. */
export function phenotypeClasses(
  loci: readonly LocusDefinition[],
  genotypes: readonly Genotype[],
): { values: Record<string, Phenotype>; chance: Fraction }[] {
  let classes: { values: Record<string, Phenotype>; chance: Fraction }[] = [{ values: {}, chance: ONE }];
  loci.forEach((locus, i) => {
    const shown = [...phenotypeChances(locus, genotypes[i] ?? '')];
    classes = classes.flatMap(({ values, chance }) =>
      shown.map(([phenotype, p]) => ({
        values: { ...values, [locus.id]: phenotype },
        chance: chance.mul(p),
      })),
    );
  });
  return classes;
}

function multiplyOut(
  cross: Cross,
  classesOf: (
    loci: readonly LocusDefinition[],
    genotypes: readonly Genotype[],
  ) => { values: Record<string, string>; chance: Fraction }[],
): OffspringClass<string>[] {
  return livingSexes(cross).flatMap(({ sex, computeAs, factor }) => {
    let rows = [{ values: {} as Record<string, string>, chance: factor }];
    for (const { loci, eggs } of cross.blocks) {
      const classes = new Map<string, { values: Record<string, string>; chance: Fraction }>();
      for (const egg of eggs[computeAs]) {
        if (egg.lethal) continue;
        for (const { values, chance } of classesOf(loci, egg.genotypes)) {
          const key = JSON.stringify(values);
          const before = classes.get(key)?.chance ?? ZERO;
          classes.set(key, { values, chance: before.add(chance.mul(egg.chance)) });
        }
      }
      rows = rows.flatMap((row) =>
        [...classes.values()].map(({ values, chance }) => ({
          values: { ...row.values, ...values },
          chance: row.chance.mul(chance),
        })),
      );
    }
    return rows.filter(({ chance }) => chance.gt(0)).map((row) => ({ sex, ...row }));
  });
}
