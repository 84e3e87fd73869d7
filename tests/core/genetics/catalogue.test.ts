import { describe, expect, it } from 'vitest';
import { CATALOGUE } from '@/lib/genetics/catalogue';
import { checkLocus } from '@/lib/genetics/check-locus';
import { phenotypesOf } from '@/lib/genetics/genotype';

describe('the catalogue', () => {
  it.each(CATALOGUE.map((species) => [species.name, species] as const))(
    '%s is sound and names its sources',
    (_name, species) => {
      expect(species.source.citation).not.toBe('');
      expect(new Set(species.loci.map(({ id }) => id)).size).toBe(species.loci.length);
      for (const locus of species.loci) {
        expect(() => checkLocus(locus, species.sexSystem)).not.toThrow();
        expect(locus.source.citation).not.toBe('');
      }
      for (const { phenotypes } of species.combinations) {
        for (const [id, shown] of Object.entries(phenotypes)) {
          const locus = species.loci.find((each) => each.id === id);
          expect(locus && phenotypesOf(locus)).toContain(shown);
        }
      }
      expect(JSON.parse(JSON.stringify(species))).toEqual(species);
    },
  );
});
