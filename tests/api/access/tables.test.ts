import postgres from 'postgres';
import { afterAll, describe, expect, test } from 'vitest';
import { withScope } from '@/db/scope';
import { animals } from '@/db/schema/collection';
import { projectAnimals } from '@/db/schema/projects';
import { makeWorkspace } from '../setup/fixture';

const owner = postgres(process.env.DATABASE_OWNER_URL ?? '', { max: 1, onnotice: () => {} });
afterAll(() => owner.end());

/** Tables of the sign-in belong to people; every other table belongs to a workspace. */
const peoplesTables = ['users', 'sessions', 'credentials', 'verifications', 'two_factors', 'rate_limits'];

describe('the catalogue of the database', () => {
  test('row security is on, forced and has a policy on every table of a workspace', async () => {
    const tables = await owner<{ name: string; enabled: boolean; forced: boolean; policies: number }[]>`
      select c.relname as name, c.relrowsecurity as enabled, c.relforcerowsecurity as forced,
             (select count(*)::int from pg_policy p where p.polrelid = c.oid) as policies
      from pg_class c join pg_namespace n on n.oid = c.relnamespace
      where n.nspname = 'public' and c.relkind = 'r'`;
    const tenant = tables.filter(({ name }) => !peoplesTables.includes(name));
    expect(tenant.length).toBeGreaterThan(40);
    expect(tenant.filter(({ enabled, forced, policies }) => !enabled || !forced || policies === 0)).toEqual(
      [],
    );
  });

  test('every key from one table of a workspace to another carries the workspace', async () => {
    const loose = await owner<{ name: string }[]>`
      select k.conname as name from pg_constraint k
      join pg_class source on source.oid = k.conrelid join pg_class target on target.oid = k.confrelid
      where k.contype = 'f' and source.relnamespace = 'public'::regnamespace
        and target.relname not in ('workspaces', 'users')
        and exists (select 1 from pg_attribute a where a.attrelid = k.confrelid and a.attname = 'workspace_id')
        and not exists (
          select 1 from unnest(k.conkey) column_number
          join pg_attribute a on a.attrelid = k.conrelid and a.attnum = column_number where a.attname = 'workspace_id')`;
    expect(loose.map(({ name }) => name)).toEqual([]);
  });

  test('the app can neither change nor remove what only grows', async () => {
    const rights = await owner<{ table_name: string; privilege_type: string }[]>`
      select table_name, privilege_type from information_schema.role_table_grants
      where grantee = 'moiety_app' and privilege_type in ('UPDATE', 'DELETE', 'TRUNCATE')
        and table_name in ('entries', 'postings', 'sale_splits', 'audit_log', 'terms_decisions', 'pairing_decisions')`;
    expect(rights.map((row) => ({ ...row }))).toEqual([]);
  });
});

describe('two workspaces', () => {
  test('a transaction sees the rows of the announced workspace only, and nothing without one', async () => {
    const [here, there] = [await makeWorkspace(), await makeWorkspace()];
    const seenHere = await withScope({ workspaceId: here.id }, (tx) =>
      tx.select({ workspaceId: animals.workspaceId }).from(animals),
    );
    expect(seenHere.length).toBe(3);
    expect(new Set(seenHere.map((row) => row.workspaceId))).toEqual(new Set([here.id]));
    const seenByNobody = await withScope({ userId: there.owner.person.userId }, (tx) =>
      tx.select().from(animals),
    );
    expect(seenByNobody).toEqual([]);
  });

  test('a row can neither be written into another workspace nor point at one of its rows', async () => {
    const [here, there] = [await makeWorkspace(), await makeWorkspace()];
    await expect(
      withScope({ workspaceId: here.id }, (tx) =>
        tx.insert(animals).values({ workspaceId: there.id, code: 'X-1', speciesId: there.speciesId }),
      ),
    ).rejects.toMatchObject({ cause: { code: '42501' } });
    await expect(
      withScope({ workspaceId: here.id }, (tx) =>
        tx
          .insert(projectAnimals)
          .values({
            workspaceId: here.id,
            projectId: here.projectId,
            animalId: there.sireId,
            addedOn: '2024-01-01',
          }),
      ),
    ).rejects.toMatchObject({ cause: { code: '23503' } });
  });
});
