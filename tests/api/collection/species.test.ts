import { beforeAll, describe, expect, it } from 'vitest';
import type { LocusId } from '@/lib/contracts/ids';
import { createCombinationUseCase } from '@/lib/use-cases/collection/create-combination';
import { createAnimalUseCase } from '@/lib/use-cases/collection/create-animal';
import { createLocusUseCase } from '@/lib/use-cases/collection/create-locus';
import { editLocusUseCase } from '@/lib/use-cases/collection/edit-locus';
import { editSpeciesUseCase } from '@/lib/use-cases/collection/edit-species';
import { removeLocusUseCase } from '@/lib/use-cases/collection/remove-locus';
import { showAnimalUseCase } from '@/lib/use-cases/collection/show-animal';
import { showSpeciesUseCase } from '@/lib/use-cases/collection/show-species';
import { makeWorkspace, performAs, type TestWorkspace } from '../setup/fixture';

let workspace: TestWorkspace;
beforeAll(async () => {
  workspace = await makeWorkspace();
});

const definition = (change: Record<string, unknown> = {}) => ({
  symbol: 'p',
  chromosome: 'autosomal',
  linkage: null,
  alleles: [
    { symbol: '+', name: 'wild type' },
    { symbol: 'p', name: 'Pastel' },
  ],
  phenotypes: { '+/p': 'Pastel', 'p/p': 'Super Pastel' },
  penetrance: {},
  lethal: [],
  dominance: 'incomplete dominant',
  welfare: [],
  source: { citation: 'made up for the test', certainty: 'common practice' },
  ...change,
});
const create = (name: string, change: Record<string, unknown> = {}, by = workspace.owner) =>
  performAs(workspace, by, createLocusUseCase, {
    params: { species: workspace.speciesId },
    body: { name, definition: definition(change) },
  });
const show = () =>
  performAs(workspace, workspace.keeper, showSpeciesUseCase, { params: { species: workspace.speciesId } });

describe('loci as data', () => {
  it('a new locus is there for everyone, each genotype in words', async () => {
    await create('Pastel');
    const locus = (await show()).loci.find(({ name }) => name === 'Pastel');
    expect(locus?.genotypes.female).toEqual([
      { genotype: '+/+', phenotype: '', copies: 0, words: 'no copy' },
      { genotype: '+/p', phenotype: 'Pastel', copies: 1, words: 'one copy of Pastel' },
      { genotype: 'p/p', phenotype: 'Super Pastel', copies: 2, words: 'two copies of Pastel' },
    ]);
  });

  it.each([
    ['an allele that is not there', { phenotypes: { '+/z': 'Odd' } }, 'definition.alleles'],
    ['a chromosome that the species does not have', { chromosome: 'Z' }, 'definition.chromosome'],
    [
      'chances that do not add up',
      { penetrance: { 'p/p': { 'Super Pastel': '1/2' } } },
      'definition.penetrance',
    ],
    [
      'two alleles of one symbol',
      {
        alleles: [
          { symbol: '+', name: 'wild type' },
          { symbol: '+', name: 'other' },
        ],
      },
      'definition.alleles',
    ],
  ])('refuses %s', async (_, change, field) => {
    await expect(create(`Wrong ${field}`, change)).rejects.toMatchObject({
      code: 'invalid',
      more: { errors: [{ field }] },
    });
  });

  it('refuses a change that would contradict what is recorded, and a removal of what is used', async () => {
    const { id } = await create('Used');
    const animal = await performAs(workspace, workspace.owner, createAnimalUseCase, {
      body: {
        code: 'USED-1',
        speciesId: workspace.speciesId,
        sex: 'male',
        owners: [{ partyId: workspace.owner.partyId, parts: 1 }],
        loci: [{ locusId: id, shows: 'Super Pastel', carries: null }],
      },
    });
    const edit = (change: Record<string, unknown>, version = 1) =>
      performAs(workspace, workspace.owner, editLocusUseCase, {
        params: { locus: id },
        body: { name: 'Used', definition: definition(change), version },
      });
    await expect(edit({ phenotypes: { '+/p': 'Pastel' } })).rejects.toMatchObject({
      code: 'invalid',
      detail: expect.stringMatching(/USED-1/),
    });
    await expect(
      performAs(workspace, workspace.owner, removeLocusUseCase, { params: { locus: id } }),
    ).rejects.toMatchObject({ code: 'wrong_state' });
    await expect(edit({ lethal: ['p/p'] })).rejects.toMatchObject({
      code: 'invalid',
      detail: expect.stringMatching(/USED-1/),
    });
    const welfare = [{ text: 'Made-up harm', source: 'made up for the test', genotypes: ['p/p'] }];
    expect(await edit({ welfare })).toEqual({ version: 2 });
    await expect(edit({}, 1)).rejects.toMatchObject({ code: 'stale' });
    expect(animal.code).toBe('USED-1');
  });

  it('names combinations in the description of an animal', async () => {
    const { id: pastel } = await create('Second pastel');
    const looks: Record<string, string> = { [workspace.locusId]: 'Albino', [pastel]: 'Pastel' };
    const combine = (phenotypes: Record<string, string>) =>
      performAs(workspace, workspace.owner, createCombinationUseCase, {
        params: { species: workspace.speciesId },
        body: { name: 'Butter', phenotypes },
      });
    await expect(combine({ ...looks, [pastel]: 'Clown' })).rejects.toMatchObject({ code: 'invalid' });
    await combine(looks);
    const { id } = await performAs(workspace, workspace.owner, createAnimalUseCase, {
      body: {
        speciesId: workspace.speciesId,
        sex: 'male',
        owners: [{ partyId: workspace.owner.partyId, parts: 1 }],
        loci: Object.entries(looks).map(([locusId, shows]) => ({
          locusId: locusId as LocusId,
          shows,
          carries: null,
        })),
      },
    });
    expect(
      (await performAs(workspace, workspace.owner, showAnimalUseCase, { params: { animal: id } }))
        .description,
    ).toBe('Butter');
  });

  it("keeps how sex is decided once animals depend on it, and is the owner's to change", async () => {
    const edit = (by = workspace.owner) =>
      performAs(workspace, by, editSpeciesUseCase, {
        params: { species: workspace.speciesId },
        body: { version: 1, sexSystem: 'ZW' },
      });
    await expect(edit()).rejects.toMatchObject({
      code: 'invalid',
      more: { errors: [{ field: 'sexSystem' }] },
    });
    await expect(edit(workspace.partner)).rejects.toMatchObject({ code: 'not_allowed' });
    await expect(create('Keeper locus', {}, workspace.keeper)).rejects.toMatchObject({ code: 'not_allowed' });
  });
});
