import { beforeAll, describe, expect, it } from 'vitest';
import { withScope } from '@/db/scope';
import { tubs } from '@/db/schema/collection';
import type { LocusClaim } from '@/lib/contracts/animal';
import { createAnimalUseCase } from '@/lib/use-cases/collection/create-animal';
import { claimsFromText, claimToText } from '@/lib/use-cases/collection/claim-text';
import { readCsv, writeCsv } from '@/lib/use-cases/collection/csv-text';
import { exportAnimalsUseCase } from '@/lib/use-cases/collection/export-animals';
import { importAnimalsUseCase } from '@/lib/use-cases/collection/import-animals';
import { listAnimalsUseCase } from '@/lib/use-cases/collection/list-animals';
import { addWeightUseCase } from '@/lib/use-cases/collection/add-weight';
import { previewImportUseCase } from '@/lib/use-cases/collection/preview-import';
import { makeWorkspace, performAs, type TestWorkspace } from '../setup/fixture';

let workspace: TestWorkspace;
beforeAll(async () => {
  workspace = await makeWorkspace();
});

const preview = (to: TestWorkspace, csv: string, columns?: (string | null)[]) =>
  performAs(to, to.owner, previewImportUseCase, { body: { csv, columns } });
const commit = (to: TestWorkspace, csv: string) =>
  performAs(to, to.owner, importAnimalsUseCase, { body: { csv } });
const count = async (of: TestWorkspace) => (await performAs(of, of.owner, listAnimalsUseCase)).total;
async function exported(of: TestWorkspace, query: Record<string, unknown> = {}): Promise<string> {
  const file = await performAs(of, of.owner, exportAnimalsUseCase, { query });
  return file.body as string;
}

describe('import of a file', () => {
  it('guesses what the columns are, also from the words of others', async () => {
    const { columns, rows, errors } = await preview(
      workspace,
      'Tag,Gender,DOB,Father,Colour\nX-1,F,2021,TP-001,brown\n',
    );
    expect(columns).toEqual(['code', 'sex', 'hatched', 'sire', null]);
    // The father hatched in 2022, after 2021.
    expect(errors).toBe(1);
    expect(rows[0]?.errors[0]).toMatchObject({ field: 'sire' });
  });

  it('says what is wrong in each row and imports none of them', async () => {
    const csv = [
      'code,sex,hatched,sire,dam,loci,owners,place,weights',
      'Y-1,male,2020-05-01,,,,,,',
      'Y-1,femal,2020-13-01,,,,,,',
      'TP-001,male,,,,,,,',
      'Y-3,female,2023-01-01,Y-9,Y-1,Albino: looks Blue,Nobody 1,Z9,heavy',
    ].join('\n');
    const { rows } = await preview(workspace, csv);
    expect(rows[0]?.errors).toEqual([]);
    expect(rows[1]?.errors.map(({ field }) => field).sort()).toEqual(['code', 'hatched', 'sex']);
    expect(rows[2]?.errors[0]?.message).toMatch(/already has an animal TP-001/);
    expect(rows[3]?.errors.map(({ field }) => field).sort()).toEqual([
      'dam',
      'loci',
      'owners',
      'place',
      'sire',
      'weights',
    ]);
    const before = await count(workspace);
    await expect(commit(workspace, csv)).rejects.toMatchObject({ code: 'invalid' });
    expect(await count(workspace)).toBe(before);
  });

  it('takes parents from the same file in any order, and refuses circles', async () => {
    expect(
      await commit(workspace, 'code,sex,sire,dam\nK-3,female,K-1,K-2\nK-1,male,,\nK-2,female,,\n'),
    ).toEqual({ imported: 3 });
    const circle = await preview(workspace, 'code,sex,dam\nL-1,female,L-2\nL-2,female,L-1\n');
    expect(circle.rows.flatMap(({ errors }) => errors)[0]?.message).toMatch(/own ancestor/);
  });

  it('is for the owner alone', async () => {
    await expect(
      performAs(workspace, workspace.partner, previewImportUseCase, { body: { csv: 'code\nA' } }),
    ).rejects.toMatchObject({ code: 'not_allowed' });
  });
});

describe('export', () => {
  it('imports again without loss', async () => {
    const home = await makeWorkspace();
    const add = (body: Record<string, unknown>) =>
      performAs(home, home.owner, createAnimalUseCase, {
        body: {
          speciesId: home.speciesId,
          sex: 'unknown',
          owners: [{ partyId: home.owner.partyId, parts: 1 }],
          ...body,
        },
      });
    const place = { room: 'N', rack: 'R', label: 'B4', rowNumber: 1, columnNumber: 1 };
    await withScope({ workspaceId: home.id }, (tx) =>
      tx.insert(tubs).values({ workspaceId: home.id, ...place }),
    );
    const sire = await add({
      code: 'S 7',
      sex: 'male',
      hatchedOn: '2019-04-01',
      hatchedPrecision: 'month',
      name: '=HYPERLINK("x")',
      notes: 'two\nlines, "quoted"; \'-1 and | bars',
    });
    const second = await add({
      code: 'S 8',
      sex: 'male',
      hatchedOn: '2019-01-01',
      hatchedPrecision: 'year',
      origin: 'wild_caught',
      status: 'died',
      statusSince: '2024-02-02',
    });
    await add({
      code: 'Y-1',
      sex: 'female',
      sexedBy: 'probed',
      hatchedOn: '2023-06-05',
      damId: home.damId,
      possibleSires: [
        { animalId: sire.id, weight: 3 },
        { animalId: second.id, weight: 1 },
      ],
      owners: [
        { partyId: home.owner.partyId, parts: 2 },
        { partyId: home.partner.partyId, parts: 1 },
      ],
      ownedFrom: '2023-07-01',
      heldBack: true,
      projectId: home.projectId,
      loci: [
        {
          locusId: home.locusId,
          shows: '',
          carries: { genotypes: { '+/+': '1/3', '+/a': '2/3' }, basis: 'tested' },
        },
      ],
      tubId: (await withScope({ workspaceId: home.id }, (tx) => tx.select({ id: tubs.id }).from(tubs)))[0]
        ?.id,
    }).then(({ id }) =>
      performAs(home, home.owner, addWeightUseCase, {
        params: { animal: id },
        body: { weighedOn: '2024-01-02', grams: 640 },
      }),
    );

    const away = await makeWorkspace();
    await withScope({ workspaceId: away.id }, (tx) =>
      tx.insert(tubs).values({ workspaceId: away.id, ...place }),
    );
    // The two workspaces are made alike; only the animals of the fixture are there already.
    const first = await exported(home);
    const ofFixture = new Set(['TP-001', 'TP-002', 'TP-003']);
    const [head = [], ...rows] = readCsv(first);
    const fresh = writeCsv(
      head,
      rows.filter(([code = '']) => !ofFixture.has(code)),
    );
    expect(await commit(away, fresh)).toEqual({ imported: 3 });
    expect(readCsv(await exported(away))).toEqual(readCsv(first));
  });

  it('runs no formula in a spreadsheet', async () => {
    const cells = ['=1+1', '+1', '-1', '@x', '\tx', "'=1", 'plain', "it's"];
    const text = writeCsv(cells, [cells]);
    for (const line of text.replace('\uFEFF', '').trim().split('\r\n').slice(1))
      expect(line).not.toMatch(/(^|,|")[=+\-@\t]/);
    expect(readCsv(text)[1]).toEqual(cells);
  });

  it('takes the chosen rows, and to a partner only what they may see', async () => {
    const codes = (text: string) =>
      readCsv(text)
        .slice(1)
        .map(([code]) => code);
    expect(codes(await exported(workspace, { ids: workspace.sireId }))).toEqual(['TP-001']);
    const file = await performAs(workspace, workspace.partner, exportAnimalsUseCase, {
      query: { ids: [workspace.damId, workspace.otherAnimalId].join(',') },
    });
    expect(codes(file.body as string)).toEqual(['TP-002']);
  });
});

describe('a locus in a cell', () => {
  it.each<LocusClaim>([
    { shows: 'Albino', carries: null },
    { shows: '', carries: { genotypes: { '+/a': '2/3', '+/+': '1/3' }, basis: 'tested' } },
    { shows: null, carries: { genotypes: { 'a/a': '1' }, basis: 'proven' } },
  ])('is read as it was written: %j', (claim) => {
    expect(claimsFromText(claimToText('Albino', claim))).toEqual({ claims: [{ locus: 'Albino', claim }] });
  });
});
