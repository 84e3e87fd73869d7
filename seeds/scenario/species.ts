import { combinations, loci, species } from '@/db/schema/genetics';
import { withScope } from '@/db/scope';
import type { CombinationId, LocusId, SpeciesId } from '@/lib/contracts/ids';
import type { SpeciesProfile } from '@/lib/contracts/species';
import { CATALOGUE } from '@/lib/genetics/catalogue';
import type { CatalogueSpecies } from '@/lib/genetics/catalogue/species';
import { identify } from '../identify';
import { workspaceId } from './house';

const practice = 'common practice';
const morrill =
  'Morrill et al., Herpetological Review 42:226–231, 2011 (mean 6.8 eggs, 81 % hatched); range: common practice';
const days = (from: number, usual: number, to: number, source = practice) => ({ from, usual, to, source });

const ballPython: SpeciesProfile = {
  bearing: 'eggs',
  clutchSize: { from: 3, usual: 7, to: 11, source: morrill },
  hatchRate: { fraction: '81/100', source: morrill },
  intervals: {
    pairingToOvulation: days(30, 60, 120),
    ovulationToPreLayShed: days(14, 20, 28),
    preLayShedToLaying: days(25, 30, 50),
    incubation: days(53, 58, 65),
    hatchToFirstShed: days(7, 10, 14),
  },
  incubationCelsius: { from: 31, to: 32, source: practice },
  breeding: { femaleGrams: 1500, maleGrams: 500, femaleMonths: 30, maleMonths: 12, source: practice },
};

const cornSnake: SpeciesProfile = {
  bearing: 'eggs',
  clutchSize: { from: 8, usual: 14, to: 25, source: practice },
  hatchRate: { fraction: '85/100', source: practice },
  intervals: {
    pairingToOvulation: days(14, 30, 45),
    ovulationToPreLayShed: days(10, 15, 20),
    preLayShedToLaying: days(7, 10, 14),
    incubation: days(55, 60, 65, `${practice}, at 28 °C`),
    hatchToFirstShed: days(7, 10, 14),
  },
  incubationCelsius: { from: 27, to: 29, source: practice },
  breeding: { femaleGrams: 350, maleGrams: 250, femaleMonths: 30, maleMonths: 18, source: practice },
};

export interface SownSpecies {
  id: SpeciesId;
  prefix: 'BP' | 'CS';
  catalogue: CatalogueSpecies;
}

function find(id: string): CatalogueSpecies {
  const found = CATALOGUE.find((one) => one.id === id);
  if (!found) throw new Error(`The catalogue has no ${id}.`);
  return found;
}

export const pythons: SownSpecies = {
  id: identify<SpeciesId>('species ball python'),
  prefix: 'BP',
  catalogue: find('python-regius'),
};
export const corns: SownSpecies = {
  id: identify<SpeciesId>('species corn snake'),
  prefix: 'CS',
  catalogue: find('pantherophis-guttatus'),
};

/** The row of a locus of the catalogue. */
export const locusIdOf = (key: string) => identify<LocusId>(`locus ${key}`);

/** The two species with their loci and the names of combinations, from the catalogue. */
export async function addSpecies(): Promise<void> {
  await withScope({ workspaceId }, async (tx) => {
    for (const { id, prefix, catalogue } of [pythons, corns]) {
      const { name, scientificName, sexSystem } = catalogue;
      const profile = prefix === 'BP' ? ballPython : cornSnake;
      await tx
        .insert(species)
        .values({ workspaceId, id, name, scientificName, sexSystem, codePrefix: prefix, profile });
      for (const locus of catalogue.loci) {
        const locusId = locusIdOf(locus.id);
        await tx.insert(loci).values({
          workspaceId,
          id: locusId,
          speciesId: id,
          name: locus.name,
          definition: { ...locus, id: locusId },
        });
      }
      for (const combination of catalogue.combinations) {
        const phenotypes = Object.fromEntries(
          Object.entries(combination.phenotypes).map(([key, shown]) => [locusIdOf(key), shown]),
        );
        await tx.insert(combinations).values({
          workspaceId,
          id: identify<CombinationId>(`combination ${combination.name}`),
          speciesId: id,
          name: combination.name,
          phenotypes,
        });
      }
    }
  });
}
