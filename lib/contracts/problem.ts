import { z } from 'zod';

/** A problem document (RFC 9457) with the fields that were wrong. */
export const problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string(),
  errors: z.array(z.object({ field: z.string(), message: z.string() })).default([]),
  /** With a stale edit: the version that is there now. */
  currentVersion: z.int().optional(),
});
export type Problem = z.infer<typeof problem>;
