'use client';

import { magicLinkClient, twoFactorClient } from 'better-auth/client/plugins';
import { createAuthClient } from 'better-auth/react';

/** The sign-in library's client; it talks to /api/auth of the same site. */
export const auth = createAuthClient({ plugins: [magicLinkClient(), twoFactorClient()] });

/** Where to go after signing in: a path of this site, never another address. */
export function safeNext(next: string | undefined): string {
  return next && /^\/(?![/\\])/.test(next) ? next : '/';
}
