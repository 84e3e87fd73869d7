import { ONE, parseProbability, sum } from './fractions';
import { GeneticsError } from './genetics-error';
import { allelesOf, genotypesWithCopies, joinAlleles } from './genotype';
import type { LocusDefinition, SexSystem } from './locus';

/**
 * Checks that a definition is sound.
 * @param system also checks that the species has the chromosome, if given
 * @throws {GeneticsError} naming the rule that is broken: 'alleles', 'unknown-allele', 'genotype', 'chromosome',
 *   'phenotype', 'probability', 'penetrance', 'lethal', 'welfare' or 'linkage'
 */
export function checkLocus(locus: LocusDefinition, system?: SexSystem): void {
  const fail = (rule: ConstructorParameters<typeof GeneticsError>[0], message: string): never => {
    throw new GeneticsError(rule, locus.id, `${locus.name || locus.id}: ${message}`);
  };
  const symbols = locus.alleles.map(({ symbol }) => symbol);
  if (symbols.length < 2) fail('alleles', 'a locus needs the wild type and at least one other allele.');
  if (new Set(symbols).size !== symbols.length) fail('alleles', 'two alleles share a symbol.');
  const odd = symbols.find((symbol) => !/^[^\s/]+$/.test(symbol));
  if (odd !== undefined) fail('alleles', `"${odd}" cannot be a symbol: it is empty or holds a space or "/".`);
  if (system && locus.chromosome !== 'autosomal') {
    const has = { XY: 'X', ZW: 'Z', TSD: null, unknown: null }[system];
    if (has !== locus.chromosome)
      fail('chromosome', `the species (${system}) has no ${locus.chromosome} chromosome.`);
  }
  const possible = new Set([
    ...genotypesWithCopies(locus, 2),
    ...(locus.chromosome === 'autosomal' ? [] : genotypesWithCopies(locus, 1)),
  ]);
  const known = (genotype: string, where: string) => {
    const joined = joinAlleles(locus, allelesOf(genotype));
    if (joined !== genotype) fail('genotype', `write "${joined}" instead of "${genotype}" under ${where}.`);
    if (!possible.has(genotype))
      fail('genotype', `"${genotype}" under ${where} is no genotype of this locus.`);
  };
  for (const [genotype, shown] of Object.entries(locus.phenotypes)) {
    known(genotype, 'phenotypes');
    if (/^\s*normal\s*$/i.test(shown))
      fail('phenotype', `leave "${genotype}" out: what is not named is normal.`);
  }
  for (const [genotype, chances] of Object.entries(locus.penetrance)) {
    known(genotype, 'penetrance');
    const total = sum(Object.values(chances).map((chance) => parseProbability(chance, locus.id)));
    if (!total.equals(ONE))
      fail('penetrance', `the chances of "${genotype}" add up to ${total.toFraction()}, not 1.`);
  }
  for (const genotype of locus.lethal) known(genotype, 'lethal');
  const livingCopies = (copies: 1 | 2) =>
    genotypesWithCopies(locus, copies).some((genotype) => !locus.lethal.includes(genotype));
  if (!livingCopies(2) || (locus.chromosome !== 'autosomal' && !livingCopies(1))) {
    fail('lethal', 'every genotype is lethal.');
  }
  for (const note of locus.welfare) {
    if (!note.text.trim() || !note.source.trim()) fail('welfare', 'a caution needs a text and its source.');
    for (const genotype of note.genotypes) known(genotype, 'welfare');
  }
  if (locus.linkage && (!locus.linkage.group || !(locus.linkage.position >= 0))) {
    fail('linkage', 'a place needs a group and a position of 0 centimorgans or more.');
  }
}
