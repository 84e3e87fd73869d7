import { beforeAll, describe, expect, it } from 'vitest';
import { withScope } from '@/db/scope';
import { loci } from '@/db/schema/genetics';
import type { AnimalRecord } from '@/lib/contracts/animal-record';
import type { AnimalId, LocusId, SpeciesId } from '@/lib/contracts/ids';
import { defineRecessive } from '@/lib/genetics/define-locus';
import { changeAnimalsUseCase } from '@/lib/use-cases/collection/change-animals';
import { createAnimalUseCase } from '@/lib/use-cases/collection/create-animal';
import { createSpeciesUseCase } from '@/lib/use-cases/collection/create-species';
import { editAnimalUseCase } from '@/lib/use-cases/collection/edit-animal';
import { listAnimalsUseCase } from '@/lib/use-cases/collection/list-animals';
import { proposeCodeUseCase } from '@/lib/use-cases/collection/propose-code';
import { showAnimalUseCase } from '@/lib/use-cases/collection/show-animal';
import { createTubUseCase } from '@/lib/use-cases/collection/create-tub';
import { Refusal } from '@/lib/use-cases/refusal';
import { makeWorkspace, performAs, testProfile, type TestMember, type TestWorkspace } from '../setup/fixture';

let workspace: TestWorkspace;
beforeAll(async () => {
  workspace = await makeWorkspace();
});

function add(by: TestMember, body: Record<string, unknown>) {
  return performAs(workspace, by, createAnimalUseCase, {
    body: {
      speciesId: workspace.speciesId,
      sex: 'female',
      owners: [{ partyId: by.partyId ?? workspace.owner.partyId, parts: 1 }],
      ...body,
    },
  });
}
const show = (by: TestMember, animal: AnimalId): Promise<AnimalRecord> =>
  performAs(workspace, by, showAnimalUseCase, { params: { animal } });
const edit = (by: TestMember, animal: AnimalId, body: Record<string, unknown>) =>
  performAs(workspace, by, editAnimalUseCase, { params: { animal }, body });

/** What a refused request was refused for, by field. */
async function refusal(work: Promise<unknown>): Promise<{ code: string; fields: Record<string, string> }> {
  const error: unknown = await work.then(
    () => null,
    (reason: unknown) => reason,
  );
  if (!(error instanceof Refusal)) throw new Error(`Not refused: ${String(error)}`);
  return {
    code: error.code,
    fields: Object.fromEntries((error.more.errors ?? []).map(({ field, message }) => [field, message])),
  };
}

describe('adding an animal', () => {
  it('takes the next free code of the species, and says it beforehand', async () => {
    const proposed = await performAs(workspace, workspace.owner, proposeCodeUseCase, {
      query: { species: workspace.speciesId },
    });
    const made = await add(workspace.owner, {});
    expect(made.code).toBe(proposed.code);
    expect(made.code).toMatch(/^TP-\d{3}$/);
    const next = await performAs(workspace, workspace.owner, proposeCodeUseCase, {
      query: { species: workspace.speciesId },
    });
    expect(Number(next.code.slice(3))).toBe(Number(made.code.slice(3)) + 1);
  });

  it('keeps everything that was said, and derives what its looks imply', async () => {
    const { id } = await add(workspace.owner, {
      code: 'EVERY-1',
      name: 'Wren',
      sex: 'female',
      hatchedOn: '2024-07-01',
      hatchedPrecision: 'month',
      sireId: workspace.sireId,
      damId: workspace.damId,
      loci: [{ locusId: workspace.locusId, shows: 'Albino', carries: null }],
    });
    const animal = await show(workspace.owner, id);
    expect(animal).toMatchObject({
      code: 'EVERY-1',
      name: 'Wren',
      hatchedPrecision: 'month',
      description: 'Albino',
    });
    expect(animal.sire).toMatchObject({ shown: true, code: 'TP-001' });
    // A recessive look has two copies for certain.
    expect(animal.loci[0]?.copies).toEqual([
      { letter: 'a', probability: 1 },
      { letter: 'a', probability: 1 },
    ]);
    expect(animal.ownership[0]).toMatchObject({
      reason: 'founding',
      untilDay: null,
      parts: [{ partyId: workspace.owner.partyId, parts: 1 }],
    });
  });

  it('computes what the young of two hets may carry: 66% when they look normal (2 of 3, textbook monohybrid cross)', async () => {
    const het = [
      { locusId: workspace.locusId, shows: '', carries: { genotypes: { '+/a': '1' }, basis: 'proven' } },
    ];
    const sire = await add(workspace.owner, { sex: 'male', hatchedOn: '2020-06-01', loci: het });
    const dam = await add(workspace.owner, { sex: 'female', hatchedOn: '2020-06-01', loci: het });
    const child = await add(workspace.owner, {
      hatchedOn: '2023-06-01',
      sireId: sire.id,
      damId: dam.id,
      loci: [{ locusId: workspace.locusId, shows: '', carries: null }],
    });
    const {
      loci: [locus],
      description,
    } = await show(workspace.owner, child.id);
    expect(locus?.copies[1].probability).toBeCloseTo(2 / 3, 12);
    expect(description).toBe('Normal, 66% het Albino');
  });

  it.each([
    ['a sire that is female', { sireId: 'dam' }, 'sireId', /TP-002 is recorded as female; a sire is male/],
    ['a dam that is male', { damId: 'sire' }, 'damId', /TP-001 is recorded as male; a dam is female/],
    [
      'a parent born after its young',
      { sireId: 'sire', hatchedOn: '2020-01-01' },
      'sireId',
      /TP-001 hatched 2022-07-01, not before .* a parent is born before its young/,
    ],
    ['a day that has not come', { hatchedOn: '2100-01-01' }, 'hatchedOn', /not come/],
    ['a taken code', { code: 'TP-001' }, 'code', /already has the code TP-001/],
    ['one possible sire', { possibleSires: [{ animalId: 'sire' }] }, 'possibleSires', /at least two/],
    [
      'an unknown allele',
      { loci: [{ shows: null, carries: { genotypes: { '+/z': '1' }, basis: 'stated' } }] },
      'loci.0.carries',
      /no allele "z"/,
    ],
    [
      'odds that do not add up',
      { loci: [{ shows: null, carries: { genotypes: { '+/a': '1/2' }, basis: 'stated' } }] },
      'loci.0.carries',
      /add up to 1\/2/,
    ],
    [
      'a look that the locus does not have',
      { loci: [{ shows: 'Clown', carries: null }] },
      'loci.0.shows',
      /"Clown" is no look of Albino/,
    ],
    [
      'looks against what is carried',
      { loci: [{ shows: 'Albino', carries: { genotypes: { '+/a': '1' }, basis: 'stated' } }] },
      'loci.0.carries',
      /can't look Albino/,
    ],
  ])('refuses %s and saves nothing', async (_, given, field, message) => {
    const ids: Record<string, string> = { sire: workspace.sireId, dam: workspace.damId };
    const body = JSON.parse(JSON.stringify(given), (key, value: unknown) =>
      ['sireId', 'damId', 'animalId'].includes(key) ? ids[String(value)] : value,
    ) as Record<string, unknown>;
    if (Array.isArray(body.loci))
      body.loci = body.loci.map((claim: object) => ({ locusId: workspace.locusId, ...claim }));
    const before = await performAs(workspace, workspace.owner, listAnimalsUseCase);
    const { code, fields } = await refusal(add(workspace.owner, body));
    expect(code).toBe('invalid');
    expect(fields[field]).toMatch(message);
    expect((await performAs(workspace, workspace.owner, listAnimalsUseCase)).total).toBe(before.total);
  });

  it('refuses a parent of another species and a pair on the Z of a ZW female', async () => {
    const other = await performAs(workspace, workspace.owner, createSpeciesUseCase, {
      body: {
        name: 'Test gecko',
        scientificName: 'Gekko test',
        sexSystem: 'ZW',
        codePrefix: 'TG',
        profile: testProfile,
      },
    });
    const zLinked = crypto.randomUUID() as LocusId;
    await withScope({ workspaceId: workspace.id }, (tx) =>
      tx.insert(loci).values({
        workspaceId: workspace.id,
        id: zLinked,
        speciesId: other.id,
        name: 'Pale',
        definition: defineRecessive({
          id: zLinked,
          name: 'Pale',
          allele: 'p',
          chromosome: 'Z',
          source: { citation: 'made up', certainty: 'common practice' },
        }),
      }),
    );
    const { fields } = await refusal(
      add(workspace.owner, {
        speciesId: other.id as SpeciesId,
        code: 'TG-900',
        sireId: workspace.sireId,
        loci: [{ locusId: zLinked, shows: null, carries: { genotypes: { 'p/p': '1' }, basis: 'tested' } }],
      }),
    );
    expect(fields.sireId).toMatch(/TP-001 is of another species/);
    expect(fields['loci.0.carries']).toMatch(/TG-900: A female cannot be "p\/p" at Pale \(Z\)/);
    const hen = await add(workspace.owner, {
      speciesId: other.id,
      loci: [{ locusId: zLinked, shows: null, carries: { genotypes: { p: '1' }, basis: 'tested' } }],
    });
    expect((await show(workspace.owner, hen.id)).loci[0]).toMatchObject({ single: true });
  });
});

describe('changing an animal', () => {
  it('refuses an ancestor of itself, naming both', async () => {
    const grandmother = await add(workspace.owner, { code: 'OLD-1' });
    const mother = await add(workspace.owner, { code: 'OLD-2', damId: grandmother.id });
    const child = await add(workspace.owner, { code: 'OLD-3', damId: mother.id });
    const { fields } = await refusal(edit(workspace.owner, grandmother.id, { version: 1, damId: child.id }));
    expect(fields.damId).toMatch(/OLD-3 descends from OLD-1: an animal can't be its own ancestor/);
    expect((await show(workspace.owner, grandmother.id)).dam).toBeNull();
    expect((await refusal(edit(workspace.owner, mother.id, { version: 1, sex: 'male' }))).fields.sex).toMatch(
      /dam of OLD-3/,
    );
  });

  it('refuses a stale edit and tells the version that is there', async () => {
    const { id } = await add(workspace.owner, { name: 'First' });
    expect(await edit(workspace.owner, id, { version: 1, name: 'Second' })).toEqual({ version: 2 });
    const late: unknown = await edit(workspace.keeper, id, { version: 1, name: 'Third' }).catch(
      (error: unknown) => error,
    );
    expect(late).toMatchObject({ code: 'stale', more: { currentVersion: 2 } });
    expect((await show(workspace.owner, id)).name).toBe('Second');
  });

  it('lets one of two edits at the same moment through', async () => {
    const { id } = await add(workspace.owner, {});
    const done = await Promise.allSettled([
      edit(workspace.owner, id, { version: 1, name: 'A' }),
      edit(workspace.owner, id, { version: 1, name: 'B' }),
    ]);
    expect(done.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
    expect((await show(workspace.owner, id)).version).toBe(2);
  });

  it('changes many at once, or none', async () => {
    const [a, b] = [await add(workspace.owner, {}), await add(workspace.owner, {})];
    const tub = await performAs(workspace, workspace.keeper, createTubUseCase, {
      body: { room: 'North', rack: 'A', label: 'A1', rowNumber: 1, columnNumber: 1 },
    });
    const change = (ids: string[], by = workspace.owner) =>
      performAs(workspace, by, changeAnimalsUseCase, {
        body: { ids, change: { kind: 'tub', tubId: tub.id } },
      });
    expect(await change([a.id, b.id])).toEqual({ changed: 2 });
    expect((await show(workspace.owner, a.id)).tub).toMatchObject({ label: 'A1' });
    // The partner may not see the other partner's animal, so nothing is changed for theirs either.
    expect((await refusal(change([workspace.damId, workspace.otherAnimalId], workspace.partner))).code).toBe(
      'not_found',
    );
    expect((await show(workspace.owner, workspace.damId)).tub).toBeNull();
  });
});

describe('who sees what', () => {
  it('lists to a partner what they hold or share, and nothing else', async () => {
    const { rows } = await performAs(workspace, workspace.partner, listAnimalsUseCase);
    expect(rows.map(({ code }) => code)).toEqual(['TP-001', 'TP-002']);
    expect((await refusal(show(workspace.partner, workspace.otherAnimalId))).code).toBe('not_found');
    expect(
      (await refusal(edit(workspace.partner, workspace.otherAnimalId, { version: 1, name: 'x' }))).code,
    ).toBe('not_found');
  });

  it('shows a parent that may not be seen without anything of it, and keeps it through an edit', async () => {
    const child = await add(workspace.owner, {
      code: 'MIX-1',
      hatchedOn: '2024-01-01',
      damId: workspace.otherAnimalId,
      owners: [{ partyId: workspace.partner.partyId, parts: 1 }],
    });
    const seen = await show(workspace.partner, child.id);
    expect(seen.dam).toEqual({ shown: false });
    expect(JSON.stringify(seen)).not.toContain('TP-003');
    await edit(workspace.partner, child.id, { version: 1, name: 'Renamed' });
    expect((await show(workspace.owner, child.id)).dam).toMatchObject({ code: 'TP-003' });
  });

  it('does not let a partner add an animal that they could not see, nor an accountant any', async () => {
    const owners = [{ partyId: workspace.owner.partyId, parts: 1 }];
    expect((await refusal(add(workspace.partner, { owners }))).fields.owners).toMatch(/could not see it/);
    expect((await refusal(add(workspace.accountant, { owners }))).code).toBe('not_allowed');
  });

  it('finds by look, locus and holder', async () => {
    const find = async (query: Record<string, unknown>) =>
      (await performAs(workspace, workspace.owner, listAnimalsUseCase, { query })).rows.map(
        ({ code }) => code,
      );
    expect(await find({ search: 'every albino' })).toEqual(['EVERY-1']);
    expect(await find({ locus: workspace.locusId, at: 'shows' })).toEqual(['EVERY-1']);
    expect(await find({ holder: workspace.otherPartner.partyId })).toEqual(['TP-003']);
    expect((await find({ sort: '-code', sex: 'male' }))[0]).not.toBe(
      (await find({ sort: 'code', sex: 'male' }))[0],
    );
  });
});
