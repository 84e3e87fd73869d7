import type { PunnettSquare } from '@/lib/contracts/pairing-figures';
import { looksWords } from '@/lib/genetics/describe';
import { fractionText } from '@/lib/genetics/fractions';
import { allelesOf, isMutant } from '@/lib/genetics/genotype';
import { punnettSquare, type Gamete } from '@/lib/genetics/punnett';
import type { BeliefLocus, SpeciesBeliefs } from '../genetics/species-beliefs';
import type { CrossedPair } from './cross-pair';

/** Squares that are worth drawing: one for two loci that segregate, and one for each by itself. */
const MOST_SQUARES = 5;

interface KnownLocus {
  locus: BeliefLocus;
  sire: string;
  dam: string;
  /** Whose genotype is supposed here rather than known. */
  supposed: ('sire' | 'dam')[];
  segregates: boolean;
}

/** Punnett squares of the loci at which the young can differ; for an uncertain parent, as if it carried the allele. */
export function squareFigures(
  pair: CrossedPair,
  sexSystem: SpeciesBeliefs['sexSystem'],
  names: Record<'sire' | 'dam', string>,
): PunnettSquare[] {
  const known = pair.loci.map((locus) => supposeGenotypes(pair, locus));
  const differing = known.filter(({ segregates }) => segregates);
  const fixed = known.filter(({ segregates }) => !segregates).map(({ locus }) => locus.name);
  const [first, second] = differing;
  const sets = [...(first && second ? [[first, second]] : []), ...differing.map((one) => [one])].slice(
    0,
    MOST_SQUARES,
  );
  return sets.map((loci) => squareOf(loci, fixed, sexSystem, names));
}

function supposeGenotypes(pair: CrossedPair, locus: BeliefLocus): KnownLocus {
  const pick = (side: 'sire' | 'dam') => {
    const odds = [...(pair.beliefs[side].get(locus.id) ?? [])].sort((a, b) => b[1].compare(a[1]));
    const carrying = odds.find(([genotype]) => isMutant(locus.definition, genotype));
    return {
      genotype: (odds.length > 1 ? carrying : odds[0])?.[0] ?? odds[0]?.[0] ?? '',
      isSupposed: odds.length > 1,
    };
  };
  const [sire, dam] = [pick('sire'), pick('dam')];
  const differs = (genotype: string) => new Set(allelesOf(genotype)).size > 1;
  return {
    locus,
    sire: sire.genotype,
    dam: dam.genotype,
    supposed: [
      ...(sire.isSupposed ? (['sire'] as const) : []),
      ...(dam.isSupposed ? (['dam'] as const) : []),
    ],
    segregates:
      differs(sire.genotype) || differs(dam.genotype) || locus.definition.chromosome !== 'autosomal',
  };
}

function squareOf(
  loci: readonly KnownLocus[],
  fixed: readonly string[],
  sexSystem: SpeciesBeliefs['sexSystem'],
  names: Record<'sire' | 'dam', string>,
): PunnettSquare {
  const definitions = loci.map(({ locus }) => ({ ...locus.definition, id: locus.id as string }));
  const genotypes = (side: 'sire' | 'dam') =>
    Object.fromEntries(loci.map((one) => [one.locus.id, one[side]]));
  const square = punnettSquare(sexSystem, definitions, genotypes('sire'), genotypes('dam'));
  const supposed = loci.flatMap((one) =>
    one.supposed.map((side) => `${names[side]} carries ${one.locus.name}`),
  );
  const notes = [
    supposed.length > 0 ? `Drawn as if ${[...new Set(supposed)].join(' and ')}.` : '',
    fixed.length > 0 && loci.length > 1
      ? `All young are alike at ${fixed.join(', ')}, so it is left out.`
      : '',
  ];
  return {
    title: loci.map(({ locus }) => locus.name).join(' and '),
    columns: square.sire.map(labelOf),
    rows: square.dam.map(labelOf),
    cells: square.cells.map((row) =>
      row.map((cell) => {
        const looks = looksWords(definitions, cell.phenotypes[0]?.phenotypes ?? {});
        return {
          genotype: cell.genotypes.join(' · ') + (cell.sex ? (cell.sex === 'male' ? ' ♂' : ' ♀') : ''),
          looksLike: cell.lethal ? 'dies in the egg' : looks === 'Normal' ? '' : looks,
          odds: fractionText(cell.chance),
        };
      }),
    ),
    note: notes.filter(Boolean).join(' '),
  };
}

const labelOf = ({ alleles, sex }: Gamete) =>
  `${alleles.map((allele) => allele ?? '–').join(' ')}${sex ? (sex === 'male' ? ' → ♂' : ' → ♀') : ''}`;
