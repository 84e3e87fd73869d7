import postgres from 'postgres';
import { afterAll, describe, expect, test } from 'vitest';
import { refuseRemote } from '../../../scripts/setup/template.mjs';

const app = postgres(process.env.DATABASE_URL ?? '', { max: 1, onnotice: () => {} });
afterAll(() => app.end());

describe('the database of a test file', () => {
  test('is a clone on this machine, with the queue installed', async () => {
    const [row] = await app`select current_database() as name, inet_server_addr()::text as address`;
    expect(row?.name).toMatch(/^moiety_run_\d+_\d+_w\d+$/);
    expect(row?.address).toMatch(/^127\./);
    const [queue] = await app`select version from pgboss.version`;
    expect(queue?.version).toBeGreaterThan(0);
  });

  test('is used as a role that owns nothing and cannot step around row-level security', async () => {
    const [role] = await app`
      select current_user as name, rolsuper, rolbypassrls, rolcreatedb, rolcreaterole
      from pg_roles where rolname = current_user`;
    expect(role).toEqual({
      name: 'moiety_app',
      rolsuper: false,
      rolbypassrls: false,
      rolcreatedb: false,
      rolcreaterole: false,
    });
    const owned = await app`
      select c.oid::regclass::text as name from pg_class c
      where c.relowner = (select oid from pg_roles where rolname = current_user)`;
    expect(owned.map((row) => row.name)).toEqual([]);
    await expect(app`create table not_allowed (id int)`).rejects.toThrow(/permission denied/);
  });
});

describe('refusing a database that is not on this machine', () => {
  test.each(['postgres://a:b@127.0.0.1:5432/x', 'postgres://a:b@localhost/x', 'postgres://a:b@[::1]:5432/x'])(
    'takes %s',
    (url) => expect(() => refuseRemote(url)).not.toThrow(),
  );
  test.each([
    'postgres://a:b@db.example:5432/x',
    'postgres://a:b@10.0.0.4/x',
    'postgres://a:b@127.0.0.1.example/x',
  ])('refuses %s', (url) => expect(() => refuseRemote(url)).toThrow(/only one on this machine/));
});
