import { z } from 'zod';
import { contract, isoDay, minorUnits } from './contract';
import { animalId, partyId, projectId } from './ids';
import { pairingQuery, pairingRow } from './pairing';

export const showSeason = contract({
  id: 'season.show',
  method: 'GET',
  path: '/workspaces/{workspace}/season',
  summary:
    'A season: its pairings in time, how many are agreed, what is expected to hatch and what it would be worth',
  access: { scope: 'workspace', action: 'pairing.see' },
  query: z.object(pairingQuery),
  response: z.object({
    season: z.int(),
    /** Seasons with pairings, newest first; the shown one is among them. */
    seasons: z.array(z.int()),
    agreed: z.int(),
    of: z.int(),
    /** Expected hatchlings of the pairings shown, with the tenth and ninetieth percentile. */
    hatchlings: z.object({ expected: z.number(), from: z.int(), to: z.int() }),
    /** Absent for who may not see worth. */
    proceeds: z
      .object({ expected: minorUnits, shares: z.array(z.object({ partyId, amount: minorUnits })) })
      .optional(),
    span: z.object({ from: isoDay, to: isoDay }),
    rows: z.array(pairingRow),
  }),
});
export type Season = z.infer<typeof showSeason.response>;

const breeder = z.object({
  id: animalId,
  code: z.string(),
  name: z.string(),
  description: z.string(),
  inProject: z.boolean(),
  ageMonths: z.int().nullable(),
  grams: z.int().nullable(),
  /** What speaks against pairing it now. */
  warnings: z.array(z.string()),
  parts: z.array(z.object({ partyId, parts: z.int() })),
});
export type BreederChoice = z.infer<typeof breeder>;

export const listBreeders = contract({
  id: 'season.breeders',
  method: 'GET',
  path: '/workspaces/{workspace}/season/breeders',
  summary:
    'The animals that could be paired in a project: those of its species that the caller sees and that are here',
  access: { scope: 'workspace', action: 'pairing.see' },
  query: z.object({ project: projectId }),
  response: z.object({ sires: z.array(breeder), dams: z.array(breeder) }),
});
