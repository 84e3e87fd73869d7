import { sql, type SQL } from 'drizzle-orm';
import { bigint, date, integer, pgPolicy, timestamp, uuid } from 'drizzle-orm/pg-core';
import type { WorkspaceId } from '@/lib/contracts/ids';

/** The workspace announced to the transaction by `withScope`; null when none was. */
const announcedWorkspace = sql`nullif(current_setting('moiety.workspace_id', true), '')::uuid`;

/** The tenant boundary, repeated by the database: rows of the announced workspace and no others. */
export function tenantPolicy(table: string, alsoVisible?: SQL, alsoWritable?: SQL) {
  const own = sql`workspace_id = ${announcedWorkspace}`;
  return pgPolicy(`${table}_tenant`, {
    as: 'permissive',
    for: 'all',
    to: 'public',
    using: alsoVisible ? sql`${own} or ${alsoVisible}` : own,
    withCheck: alsoWritable ? sql`${own} or ${alsoWritable}` : own,
  });
}

/** The signed-in person announced to the transaction; null when nobody is signed in. */
export const announcedPerson = sql`nullif(current_setting('moiety.user_id', true), '')`;

export const workspaceColumn = () => uuid('workspace_id').$type<WorkspaceId>().notNull();

export const moment = (name: string) => timestamp(name, { withTimezone: true, mode: 'date' });

/** A calendar day as ISO 8601 text, free of time zones. */
export const day = (name: string) => date(name, { mode: 'string' });

/** Integer minor units of the workspace's currency; the column's check keeps it in JavaScript's safe range. */
export const minorUnits = (name: string) => bigint(name, { mode: 'number' });

/** Counts the edits of a row, so that a stale edit is refused. */
export const versionColumn = () => integer('version').notNull().default(1);

export const createdAt = () => moment('created_at').notNull().defaultNow();

/** SHA-256 of the secret in the link that somebody followed, announced to the transaction; null when none was. */
export const announcedLink = sql`nullif(current_setting('moiety.link_hash', true), '')`;

/** The verified mail address of a signed-in buyer, announced to the transaction; null when none was. */
export const announcedEmail = sql`nullif(current_setting('moiety.email', true), '')`;
