import 'server-only';
import { listSalesOfSpecies } from '@/db/queries/pairing-sales';
import type { SpeciesId } from '@/lib/contracts/ids';
import type { SpeciesBeliefs } from '../genetics/species-beliefs';
import type { WorkspaceWorld } from '../world';

export interface EarlierPrice {
  /** Median of the sales, minor units; of an even number the lower of the middle two, which was really paid. */
  median: number;
  sales: number;
}

/** Median price of earlier sales per look, by the key of the outcome table; only sales of animals that the caller sees. */
export async function loadEarlierPrices(
  { tx, sees }: WorkspaceWorld,
  speciesId: SpeciesId,
  beliefs: SpeciesBeliefs,
): Promise<Map<string, EarlierPrice>> {
  const prices = new Map<string, number[]>();
  for (const { animalId, amount } of await listSalesOfSpecies(tx, sees, speciesId)) {
    const shown = beliefs.loci.flatMap((locus) => {
      const { shows } = beliefs.belief(animalId, locus.id);
      return shows ? [`${locus.id}=${shows}`] : [];
    });
    const key = shown.sort().join(' ') || 'normal';
    prices.set(key, [...(prices.get(key) ?? []), amount]);
  }
  return new Map(
    [...prices].map(([key, amounts]) => {
      const sorted = [...amounts].sort((a, b) => a - b);
      return [key, { median: sorted[Math.floor((sorted.length - 1) / 2)] ?? 0, sales: sorted.length }];
    }),
  );
}

/** The key of a look without the sex that it may be told for. */
export const lookKey = (outcomeKey: string) => outcomeKey.replace(/^(male|female)( |$)/, '') || 'normal';
