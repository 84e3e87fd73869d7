import 'server-only';
import { createHash } from 'node:crypto';
import { canonicalJson } from './canonical-json';

/** SHA-256 of a value's canonical JSON, chained to the hash of what stands before it. */
export function chainHash(previous: string | null, content: unknown): string {
  return createHash('sha256')
    .update(previous ?? '')
    .update('\n')
    .update(canonicalJson(content))
    .digest('hex');
}
