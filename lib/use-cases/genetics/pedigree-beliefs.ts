import 'server-only';
import { loadClaims, loadSpeciesForComputing } from '@/db/queries/lineage';
import type { Transaction } from '@/db/scope';
import type { SpeciesId } from '@/lib/contracts/ids';
import { notFound } from '../refusal';
import type { SpeciesBeliefs } from './species-beliefs';

/**
 * What every animal of a species probably carries. The full pedigree of the workspace is used, whoever asks: what a
 * viewer is shown of it is narrowed by the caller.
 */
export async function loadBeliefs(tx: Transaction, speciesId: SpeciesId): Promise<SpeciesBeliefs> {
  const found = await loadSpeciesForComputing(tx, speciesId);
  if (!found) throw notFound('species');
  const claims = new Map((await loadClaims(tx, speciesId)).map((row) => [`${row.animalId} ${row.locusId}`, row.claim]));
  return {
    speciesId,
    sexSystem: found.species.sexSystem,
    loci: found.loci,
    describe: (animalId) => {
      const words = found.loci.map(({ id }) => claims.get(`${animalId} ${id}`)?.shows).filter(Boolean);
      return words.join(' ') || 'Normal';
    },
    belief: (animalId, locusId) => {
      const claim = claims.get(`${animalId} ${locusId}`);
      const genotypes = Object.entries(claim?.carries?.genotypes ?? {}).map(([genotype, text]) => {
        const [top = 0, bottom = 1] = text.split('/').map(Number);
        return { genotype, probability: top / bottom };
      });
      return { locusId, genotypes, shows: claim?.shows ?? null, source: claim ? 'recorded' : 'nothing' };
    },
  };
}
