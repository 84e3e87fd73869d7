import { z } from 'zod';
import { instant } from './contract';
import { partyId } from './ids';

/** Where a party stands on one version of terms or of a pairing. */
export const standing = z.object({
  partyId,
  state: z.enum(['agreed', 'change_asked', 'waiting']),
  by: z.string().nullable(),
  at: instant.nullable(),
  comment: z.string(),
});
export type Standing = z.infer<typeof standing>;

export const decision = z.enum(['agreed', 'change_asked']);

/** What a party answers to a version. A change that is asked for says which. */
export const decisionFields = { decision, comment: z.string().trim().max(2000).default('') };
export const saysWhichChange = ({
  decision: decided,
  comment,
}: {
  decision: z.infer<typeof decision>;
  comment: string;
}) => decided === 'agreed' || comment.length > 0;
export const whichChange = { error: 'Say what should change.', path: ['comment'] };

/** Something that differs from the version before. */
export const versionChange = z.object({ what: z.string(), before: z.string(), after: z.string() });
export type VersionChange = z.infer<typeof versionChange>;

/** What the caller may do with an open version. */
export const myPart = z.object({
  partyId: partyId.nullable(),
  /** The caller's party takes part and the version is open. */
  mayDecide: z.boolean(),
  state: z.enum(['agreed', 'change_asked', 'waiting']).nullable(),
});
