import { describe, expect, test, vi } from 'vitest';
import type { Caller } from '@/lib/use-cases/perform';
import { reachOf } from '@/lib/use-cases/permissions';
import { makeStranger, makeWorkspace, type TestWorkspace } from '../setup/fixture';
import { findRoutes, type FoundRoute } from './find-routes';

// Who is signed in is what these tests vary; the sign-in library has tests of its own.
const signedIn = vi.hoisted(() => ({ person: null as Caller['person'] }));
vi.mock('@/lib/services/sign-in', () => ({ findPerson: () => Promise.resolve(signedIn.person) }));

const routes = await findRoutes();
const inWorkspace = routes.filter(({ contract }) => contract.access.scope === 'workspace');
const [here, there] = [await makeWorkspace(), await makeWorkspace()];
const stranger = await makeStranger();
const nowhere = '00000000-0000-4000-8000-000000000000';

/** What stands in for each parameter of a path: a thing of the workspace, or nothing that could be there. */
const parameters: Record<string, (workspace: TestWorkspace) => string> = {
  workspace: ({ slug }) => slug,
  animal: ({ sireId }) => sireId,
  species: ({ speciesId }) => speciesId,
  locus: ({ locusId }) => locusId,
  project: ({ projectId }) => projectId,
};

async function call(
  route: FoundRoute,
  slug: string,
  things: TestWorkspace,
  caller: Caller['person'],
): Promise<number> {
  signedIn.person = caller;
  const names = [...route.contract.path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name ?? '');
  const params = Object.fromEntries(
    names.map((name) => [name, name === 'workspace' ? slug : (parameters[name]?.(things) ?? nowhere)]),
  );
  const { method, consumes } = route.contract;
  const hasBody = method !== 'GET' && method !== 'DELETE';
  const body = consumes === 'multipart/form-data' ? new FormData() : '{}';
  const request = new Request('http://127.0.0.1:3000/api/v1', {
    method,
    headers: { 'idempotency-key': crypto.randomUUID() },
    ...(hasBody ? { body } : {}),
  });
  return (await route.handler(request, { params: Promise.resolve(params) })).status;
}

describe('the routes', () => {
  test('are bound to contracts that name their method and path', () => {
    expect(routes.length).toBeGreaterThan(30);
    expect(routes.map(({ name }) => name)).toEqual(
      routes.map(({ contract }) => `${contract.method} ${contract.path}`),
    );
    expect(new Set(routes.map(({ contract }) => contract.id)).size).toBe(routes.length);
  });
});

describe.each(inWorkspace.map((route) => [route.name, route] as const))('%s', (_, route) => {
  const { access, method } = route.contract;
  const action = access.scope === 'workspace' ? access.action : 'workspace.see';

  test('is closed to visitors, strangers and members of another workspace', async () => {
    expect(await call(route, here.slug, here, null)).toBe(401);
    expect(await call(route, here.slug, here, stranger.person)).toBe(404);
    expect(await call(route, here.slug, here, there.owner.person)).toBe(404);
  });

  test.each(['owner', 'partner', 'keeper', 'accountant'] as const)(
    'answers the %s as the table says',
    async (role) => {
      const status = await call(route, here.slug, here, here[role].person);
      if (reachOf(role, action) === 'no') expect(status).toBe(403);
      else expect([200, 400, 404, 409, 415, 422]).toContain(status);
    },
  );

  test('shows nothing of another workspace to a member of this one', async () => {
    const hasThing = /\{(?!workspace)\w+\}/.test(route.contract.path);
    const status = await call(route, here.slug, there, here.owner.person);
    if (reachOf('owner', action) === 'no') expect(status).toBe(403);
    else if (hasThing && method === 'GET') expect(status).toBe(404);
    else expect(status).toBeLessThan(500);
  });

  test('shows nothing of a project that a partner is not in', async () => {
    const foreign: TestWorkspace = { ...here, sireId: here.otherAnimalId, projectId: here.otherProjectId };
    const namesThing = /\{(animal|project)\}/.test(route.contract.path);
    const status = await call(route, here.slug, foreign, here.partner.person);
    if (reachOf('partner', action) === 'no') expect(status).toBe(403);
    else if (namesThing && method === 'GET' && reachOf('partner', action) === 'own') expect(status).toBe(404);
    else expect(status).toBeLessThan(500);
  });
});
