import 'server-only';
import { drizzle, type PostgresJsDatabase } from 'drizzle-orm/postgres-js';
import postgres from 'postgres';
import * as activity from './schema/activity';
import * as auth from './schema/auth';
import * as collection from './schema/collection';
import * as genetics from './schema/genetics';
import * as ledger from './schema/ledger';
import * as projects from './schema/projects';
import * as sales from './schema/sales';
import * as season from './schema/season';
import * as workspace from './schema/workspace';

const schema = {
  ...auth,
  ...workspace,
  ...genetics,
  ...collection,
  ...projects,
  ...season,
  ...sales,
  ...ledger,
  ...activity,
};

export type Database = PostgresJsDatabase<typeof schema>;

// One pool per process, also across the reloads of development.
const kept = globalThis as {
  moietyDatabase?: { url: string; database: Database; close: () => Promise<void> };
};

/**
 * The app's connection pool, made when first asked for (importing a module must not connect).
 * Only `withScope` and the sign-in service use it.
 * @throws {Error} when DATABASE_URL is missing
 */
export function connectDatabase(): Database {
  const url = process.env.DATABASE_URL;
  if (!url)
    throw new Error(
      'DATABASE_URL is not set: start the product with "npm start", or point it at a PostgreSQL.',
    );
  if (kept.moietyDatabase?.url !== url) {
    const client = postgres(url, { max: Number(process.env.DATABASE_POOL_SIZE ?? 10), onnotice: () => {} });
    kept.moietyDatabase = {
      url,
      database: drizzle(client, { schema }),
      close: () => client.end({ timeout: 5 }),
    };
  }
  return kept.moietyDatabase.database;
}

/** Ends the pool; for scripts and tests that must exit. */
export async function closeDatabase(): Promise<void> {
  const open = kept.moietyDatabase;
  kept.moietyDatabase = undefined;
  await open?.close();
}
