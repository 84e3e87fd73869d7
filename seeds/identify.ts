import { createHash } from 'node:crypto';

/** A UUID that is always the same for a name, so that seeding twice gives the same rows. */
export function identify<Id extends string>(name: string): Id {
  const hex = createHash('sha256').update(`moiety demo ${name}`).digest('hex');
  const variant = ((parseInt(hex[16] ?? '0', 16) & 0x3) | 0x8).toString(16);
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-4${hex.slice(13, 16)}-${variant}${hex.slice(17, 20)}-${hex.slice(20, 32)}` as Id;
}
