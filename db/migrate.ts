import { existsSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { drizzle } from 'drizzle-orm/postgres-js';
import { migrate } from 'drizzle-orm/postgres-js/migrator';
import PgBoss from 'pg-boss';
import postgres from 'postgres';

const root = path.resolve(import.meta.dirname, '..');

/** Any number that no other lock of this database uses: one migration at a time, also when several instances deploy. */
const MIGRATION_LOCK = 5_460_281;

/** The role that the app connects as; the migrations and the set-up know it by the same name. */
const APP_ROLE = 'moiety_app';

/**
 * The rights of the app on the job queue. A queue is a partition, and only the owner may make one: so the two
 * functions that make and drop queues run as the owner, and what they make is opened to the app by default.
 */
const QUEUE_RIGHTS = `
  GRANT USAGE ON SCHEMA pgboss TO ${APP_ROLE};
  GRANT SELECT, INSERT, UPDATE, DELETE ON ALL TABLES IN SCHEMA pgboss TO ${APP_ROLE};
  ALTER DEFAULT PRIVILEGES IN SCHEMA pgboss GRANT SELECT, INSERT, UPDATE, DELETE ON TABLES TO ${APP_ROLE};
  ALTER FUNCTION pgboss.create_queue(text, json) SECURITY DEFINER SET search_path = pg_catalog, pg_temp;
  ALTER FUNCTION pgboss.delete_queue(text) SECURITY DEFINER SET search_path = pg_catalog, pg_temp;
  REVOKE ALL ON FUNCTION pgboss.create_queue(text, json), pgboss.delete_queue(text) FROM PUBLIC;
  GRANT EXECUTE ON FUNCTION pgboss.create_queue(text, json), pgboss.delete_queue(text) TO ${APP_ROLE};
`;

/** Installs or upgrades the tables of the job queue; the app itself never changes tables. */
async function installQueue(ownerUrl: string, sql: postgres.Sql): Promise<void> {
  const boss = new PgBoss({ connectionString: ownerUrl, max: 2, supervise: false, schedule: false });
  boss.on('error', (error) => console.error(error));
  await boss.start();
  await boss.stop({ graceful: false, wait: true });
  await sql.unsafe(QUEUE_RIGHTS);
}

/**
 * Brings a database to the newest tables: the generated migrations in order, then the job queue.
 *
 * @param ownerUrl connection string of the role that owns the tables (not the app's role)
 * @returns how many migrations were run now
 * @throws what PostgreSQL says; a migration that fails leaves nothing behind
 */
export async function migrateDatabase(ownerUrl: string): Promise<number> {
  const sql = postgres(ownerUrl, { max: 1, onnotice: () => {}, connect_timeout: 15 });
  try {
    await sql`select pg_advisory_lock(${MIGRATION_LOCK})`;
    const folder = path.join(root, 'drizzle');
    const before = await countMigrations(sql);
    if (existsSync(path.join(folder, 'meta/_journal.json'))) {
      await migrate(drizzle(sql), { migrationsFolder: folder });
    }
    await installQueue(ownerUrl, sql);
    return (await countMigrations(sql)) - before;
  } finally {
    await sql.end({ timeout: 5 });
  }
}

async function countMigrations(sql: postgres.Sql): Promise<number> {
  const [table] = await sql<
    { found: string | null }[]
  >`select to_regclass('drizzle.__drizzle_migrations') as found`;
  if (table?.found == null) return 0;
  const [row] = await sql<
    { count: number }[]
  >`select count(*)::int as count from drizzle.__drizzle_migrations`;
  return row?.count ?? 0;
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const ownerUrl = process.env.DATABASE_OWNER_URL;
  if (ownerUrl === undefined || ownerUrl === '') {
    console.error(
      'DATABASE_OWNER_URL is not set: migrations run as the owner of the tables, not as the app.',
    );
    process.exit(1);
  }
  try {
    const count = await migrateDatabase(ownerUrl);
    process.stdout.write(`${count} migration${count === 1 ? '' : 's'} run\n`);
  } catch (error) {
    console.error(explain(error));
    process.exit(1);
  }
}

/** What failed and why, without the stack of the driver; the statement stands in the first message. */
function explain(error: unknown): string {
  if (!(error instanceof Error)) return String(error);
  return error.cause === undefined ? error.message : `${error.message}\n${explain(error.cause)}`;
}
