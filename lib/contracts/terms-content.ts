import { z } from 'zod';
import { partyId } from './ids';

const clause = z.string().trim().max(2000);

/** What the parties of a project agree on. Parts are integers; rates are basis points (1/100 of a percent). */
export const termsContent = z.object({
  /** Who agrees, in order of rank: of two equal claims the first takes the odd cent. */
  parties: z.array(z.object({ id: partyId, rank: z.int().min(1) })).min(2),
  /** What each side of a pairing gives: parts of the young by the owners of the dam and of the sire. */
  damSide: z.int('Whole parts.').min(0).max(1000),
  sireSide: z.int('Whole parts.').min(0).max(1000),
  /** Taken off the top of every sale for the building, before anything is divided. */
  houseShare: z
    .object({ partyId, basisPoints: z.int('At most two decimals of a percent.').min(1).max(9_999) })
    .nullable(),
  /** Recorded costs of the clutch go back to who paid them before anything is divided. */
  costsFirst: z.boolean(),
  /** Who bears the fee of a card payment: all, off the top, or the house out of its share. */
  cardFees: z.enum(['off_the_top', 'house']),
  /** What happens with the young: sold and the proceeds divided, picked in turns, or each party its parts of each animal. */
  division: z.enum(['proceeds', 'picks', 'parts']),
  clauses: z.object({ death: clause, exit: clause, notice: clause }),
});
export type TermsContent = z.infer<typeof termsContent>;

/** What a person writes: the parties follow from the project. */
export const termsDraft = termsContent
  .omit({ parties: true })
  .refine(({ damSide, sireSide }) => damSide + sireSide > 0, {
    error: 'At least one side gets a part.',
    path: ['damSide'],
  })
  .refine(({ cardFees, houseShare }) => cardFees !== 'house' || houseShare !== null, {
    error: 'There is no house share that could bear the fees.',
    path: ['cardFees'],
  });
export type TermsDraft = z.infer<typeof termsDraft>;
