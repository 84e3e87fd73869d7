import { beforeAll, describe, expect, it } from 'vitest';
import type { AnimalId } from '@/lib/contracts/ids';
import { createAnimalUseCase } from '@/lib/use-cases/collection/create-animal';
import { showLineageUseCase } from '@/lib/use-cases/collection/show-lineage';
import { makeWorkspace, performAs, type TestMember, type TestWorkspace } from '../setup/fixture';

let workspace: TestWorkspace;
const ids: Record<string, AnimalId> = {};
beforeAll(async () => {
  workspace = await makeWorkspace();
  const add = async (code: string, sex: string, body: Record<string, unknown> = {}) => {
    const made = await performAs(workspace, workspace.owner, createAnimalUseCase, {
      body: {
        code,
        sex,
        speciesId: workspace.speciesId,
        owners: [{ partyId: workspace.partner.partyId, parts: 1 }],
        ...body,
      },
    });
    ids[code] = made.id;
  };
  const het = [
    { locusId: workspace.locusId, shows: '', carries: { genotypes: { '+/a': '1' }, basis: 'proven' } },
  ];
  await add('G-1', 'male', { loci: het });
  await add('G-2', 'female', { loci: het, owners: [{ partyId: workspace.otherPartner.partyId, parts: 1 }] });
  await add('P-1', 'male', {
    sireId: ids['G-1'],
    damId: ids['G-2'],
    loci: [{ locusId: workspace.locusId, shows: '', carries: null }],
  });
  await add('P-2', 'female', {
    sireId: ids['G-1'],
    damId: ids['G-2'],
    loci: [{ locusId: workspace.locusId, shows: 'Albino', carries: null }],
  });
  await add('C-1', 'unknown', { sireId: ids['P-1'], damId: ids['P-2'] });
  await add('S-1', 'male', {});
  await add('C-2', 'female', {
    damId: ids['P-2'],
    possibleSires: [{ animalId: ids['P-1'] }, { animalId: ids['S-1'] }],
  });
});

const look = (by: TestMember, query: Record<string, unknown>) =>
  performAs(workspace, by, showLineageUseCase, { query: query as never });
const codes = (nodes: { code: string }[]) => nodes.map(({ code }) => code).sort();

describe('lineage', () => {
  it('goes so many generations up and down, with the other parents of the young', async () => {
    expect(codes((await look(workspace.owner, { animal: ids['C-1'], up: 1, down: 0 })).nodes)).toEqual([
      'C-1',
      'P-1',
      'P-2',
    ]);
    expect(codes((await look(workspace.owner, { animal: ids['C-1'], up: 2, down: 0 })).nodes)).toEqual([
      'C-1',
      'G-1',
      'G-2',
      'P-1',
      'P-2',
    ]);
    expect(codes((await look(workspace.owner, { animal: ids['S-1'], up: 0, down: 1 })).nodes)).toEqual([
      'C-2',
      'P-1',
      'P-2',
      'S-1',
    ]);
  });

  it('marks matings of relatives over the whole pedigree, also those that are not in sight', async () => {
    const { relatedMates } = await look(workspace.owner, { animal: ids['C-1'], up: 1, down: 0 });
    expect(relatedMates).toEqual([[ids['P-1'], ids['P-2']]]);
    const { relatedMates: of } = await look(workspace.owner, { animal: ids['P-1'], up: 1, down: 0 });
    expect(of).toEqual([]);
  });

  it('fills by a locus: who shows it, who carries it, who may', async () => {
    const { nodes } = await look(workspace.owner, {
      animal: ids['C-1'],
      up: 2,
      down: 0,
      locus: workspace.locusId,
    });
    const fill = (code: string) => nodes.find((node) => node.code === code)?.fill;
    expect(fill('P-2')).toMatchObject({ shows: true, carries: 1 });
    expect(fill('G-1')).toMatchObject({ shows: false, carries: 1 });
    // A normal child of two hets: two of three (textbook monohybrid cross).
    expect(fill('P-1')?.carries).toBeCloseTo(2 / 3, 12);
    // Its mother has two copies, so it carries one for certain.
    expect(fill('C-1')?.carries).toBe(1);
  });

  it('shows an ancestor that may not be seen as a bare symbol, and follows nothing through it', async () => {
    const lineage = await look(workspace.partner, {
      animal: ids['P-1'],
      up: 3,
      down: 0,
      locus: workspace.locusId,
    });
    const hidden = lineage.nodes.filter(({ shown }) => !shown);
    expect(hidden).toEqual([
      expect.objectContaining({
        key: 'hidden-1',
        code: '',
        name: '',
        description: '',
        fill: null,
        sex: 'female',
        sire: null,
        dam: null,
      }),
    ]);
    expect(JSON.stringify(lineage)).not.toContain(ids['G-2']);
    // What the hidden mother carries still counts for her young.
    expect(lineage.nodes.find(({ code }) => code === 'P-1')?.fill?.carries).toBeCloseTo(2 / 3, 12);
    await expect(look(workspace.partner, { animal: ids['G-2'] })).rejects.toMatchObject({
      code: 'not_found',
    });
  });

  it('shows the whole of a species, and refuses to be asked for nothing', async () => {
    expect((await look(workspace.owner, { species: workspace.speciesId })).nodes).toHaveLength(10);
    await expect(look(workspace.owner, {})).rejects.toMatchObject({ code: 'invalid' });
  });
});
