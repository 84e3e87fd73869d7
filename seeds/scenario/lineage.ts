import { makeRandom } from '../random';
import { ilse, maren, tobias, type DemoPerson } from './people';
import { drawYoung, partsOfYoung, type Alleles, type Parts, type Simulated } from './simulate';
import { corns, pythons, type SownSpecies } from './species';

const random = makeRandom(20_240_611);
const counters = { BP: 0, CS: 0 };

function nextCode(species: SownSpecies): string {
  counters[species.prefix] += 1;
  return `${species.prefix}-${String(counters[species.prefix]).padStart(3, '0')}`;
}

function parts(...owners: [DemoPerson, number][]): Parts {
  return owners.flatMap(([{ partyId }, count]) => (partyId ? [{ partyId, parts: count }] : []));
}

type Founder = [name: string, sex: 'male' | 'female', owners: Parts, alleles: Alleles];

const het = (symbol: string) => ['+', symbol] as const;
const both = (symbol: string) => [symbol, symbol] as const;

const pythonFounders: Founder[] = [
  ['Cinder', 'male', parts([maren, 1], [tobias, 1]), { piebald: both('pied') }],
  [
    'Saffron',
    'female',
    parts([maren, 1], [tobias, 2], [ilse, 1]),
    { piebald: het('pied'), pastel: het('Pas') },
  ],
  ['Bramble', 'female', parts([ilse, 1]), { clown: het('clown'), piebald: het('pied') }],
  ['Tansy', 'female', parts([tobias, 1]), { pastel: het('Pas') }],
  ['Quill', 'male', parts([maren, 1], [ilse, 1]), { 'coral-glow': het('CG'), clown: het('clown') }],
  ['Marl', 'female', parts([maren, 2], [ilse, 1]), { piebald: both('pied') }],
  ['Sorrel', 'male', parts([tobias, 1], [ilse, 1]), { clown: both('clown'), pastel: het('Pas') }],
  ['Wick', 'female', parts([maren, 1]), { albino: het('alb') }],
];

const cornFounders: Founder[] = [
  [
    'Loft',
    'male',
    parts([maren, 1], [tobias, 1]),
    { amelanistic: both('amel'), anerythristic: het('anery') },
  ],
  ['Slate', 'female', parts([tobias, 1]), { anerythristic: both('anery'), amelanistic: het('amel') }],
  ['Amber', 'female', parts([maren, 2], [tobias, 1]), { amelanistic: both('amel'), lavender: het('lav') }],
  ['Rafter', 'male', parts([tobias, 1]), { lavender: both('lav'), motley: het('mot') }],
  ['Eave', 'female', parts([maren, 1]), { motley: ['mot', 'str'], anerythristic: het('anery') }],
  ['Joist', 'male', parts([maren, 1]), { motley: het('str'), amelanistic: het('amel') }],
];

function found(species: SownSpecies, list: Founder[], hatched: number): Simulated[] {
  return list.map(([name, sex, owners, alleles], index) => ({
    code: nextCode(species),
    name,
    species,
    sex,
    hatched: hatched - index * 9,
    alleles,
    parts: owners,
    generation: 0,
  }));
}

export const sides = { pythons: { damSide: 1, sireSide: 1 }, corns: { damSide: 2, sireSide: 1 } };

/** The first of a sex, so that a generation of few animals can still be bred from. */
export function ofSex(animals: readonly Simulated[], sex: 'male' | 'female', index = 0): Simulated {
  const chosen = animals.filter((animal) => animal.sex === sex);
  const one = chosen[index % Math.max(chosen.length, 1)];
  if (!one) throw new Error(`No ${sex} in this generation of the scenario.`);
  return one;
}

/** Young of a pair; `owners` where they hatched before the project and were shared out by hand. */
function breed(
  pair: { dam: Simulated; sire: Simulated },
  count: number,
  hatched: number,
  { clutchCode, owners }: { clutchCode?: string; owners?: Parts } = {},
): Simulated[] {
  const { dam, sire } = pair;
  const rule = dam.species === pythons ? sides.pythons : sides.corns;
  return Array.from({ length: count }, (_, index) => {
    const drawn = drawYoung(random, pair);
    return {
      ...drawn,
      // Two of a generation are always of different sex: without both there would be no next one.
      sex: index === 0 ? 'female' : index === 1 ? 'male' : drawn.sex,
      code: nextCode(dam.species),
      name: '',
      species: dam.species,
      hatched,
      parts: owners ?? partsOfYoung(dam.parts, sire.parts, rule),
      generation: Math.max(dam.generation, sire.generation) + 1,
      dam,
      sire,
      ...(clutchCode ? { clutch: { code: clutchCode, number: index + 1 } } : {}),
    };
  });
}

const at = (animals: readonly Simulated[], index: number): Simulated => {
  const animal = animals[index];
  if (!animal) throw new Error(`The scenario has no animal ${index} here.`);
  return animal;
};

/** Days from the day of seeding of the season that is over. */
const finished = {
  pythons: { started: -290, ovulated: -230, shed: -210, laid: -180, hatched: -122 },
  corns: { started: -185, ovulated: -155, shed: -140, laid: -130, hatched: -70 },
};

export const bp0 = found(pythons, pythonFounders, -3200);
export const bp1 = [
  ...breed({ dam: at(bp0, 1), sire: at(bp0, 0) }, 4, -2150, { owners: parts([maren, 1], [tobias, 1]) }),
  ...breed({ dam: at(bp0, 2), sire: at(bp0, 4) }, 4, -2140, { owners: parts([maren, 1], [ilse, 1]) }),
];
export const bp2 = [
  ...breed({ dam: ofSex(bp1.slice(4), 'female'), sire: ofSex(bp1.slice(0, 4), 'male') }, 5, -1080),
  ...breed({ dam: at(bp0, 5), sire: ofSex(bp1.slice(4), 'male') }, 4, -1075),
];
export const cs0 = found(corns, cornFounders, -2900);
export const cs1 = [
  ...breed({ dam: at(cs0, 1), sire: at(cs0, 0) }, 4, -2000, { owners: parts([tobias, 1]) }),
  ...breed({ dam: at(cs0, 2), sire: at(cs0, 3) }, 4, -1990, { owners: parts([maren, 1], [tobias, 1]) }),
];
export const cs2 = breed(
  { dam: ofSex(cs1.slice(4), 'female'), sire: ofSex(cs1.slice(0, 4), 'male') },
  6,
  -1080,
);

/** The pairs of the season that is over; their young are the fourth generation. */
export const pastPairs = [
  {
    key: 'past 1',
    clutchCode: 'C-E1',
    dam: ofSex(bp1.slice(0, 4), 'female'),
    sire: ofSex(bp2, 'male'),
    young: 6,
    eggs: 7,
    slugs: 1,
    days: finished.pythons,
  },
  {
    key: 'past 2',
    clutchCode: 'C-E2',
    dam: at(bp0, 3),
    sire: ofSex(bp2.slice(5), 'male'),
    young: 5,
    eggs: 6,
    slugs: 0,
    days: finished.pythons,
  },
  {
    key: 'past 3',
    clutchCode: 'C-L1',
    dam: ofSex(cs1.slice(0, 4), 'female'),
    sire: ofSex(cs2, 'male'),
    young: 12,
    eggs: 14,
    slugs: 2,
    days: finished.corns,
  },
];

export const adults = [...bp0, ...bp1, ...bp2, ...cs0, ...cs1, ...cs2];
export const youngOf = new Map(
  pastPairs.map((pair) => [
    pair.key,
    breed(pair, pair.young, pair.days.hatched, { clutchCode: pair.clutchCode }),
  ]),
);
