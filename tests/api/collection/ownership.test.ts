import { beforeAll, describe, expect, it } from 'vitest';
import type { AnimalId, PartyId } from '@/lib/contracts/ids';
import { createAnimalUseCase } from '@/lib/use-cases/collection/create-animal';
import { recordOwnershipUseCase } from '@/lib/use-cases/collection/record-ownership';
import { showAnimalUseCase } from '@/lib/use-cases/collection/show-animal';
import { Refusal } from '@/lib/use-cases/refusal';
import { makeWorkspace, performAs, type TestMember, type TestWorkspace } from '../setup/fixture';

let workspace: TestWorkspace;
let owner: PartyId;
let partner: PartyId;
let other: PartyId;
beforeAll(async () => {
  workspace = await makeWorkspace();
  [owner, partner, other] = [
    workspace.owner.partyId!,
    workspace.partner.partyId!,
    workspace.otherPartner.partyId!,
  ];
});

async function addAnimal(parts: { partyId: PartyId; parts: number }[]): Promise<AnimalId> {
  const { id } = await performAs(workspace, workspace.owner, createAnimalUseCase, {
    body: {
      speciesId: workspace.speciesId,
      sex: 'female',
      hatchedOn: '2023-01-01',
      owners: parts,
      ownedFrom: '2023-01-01',
    },
  });
  return id;
}
const show = (by: TestMember, animal: AnimalId) =>
  performAs(workspace, by, showAnimalUseCase, { params: { animal } });
async function record(by: TestMember, animal: AnimalId, body: Record<string, unknown>) {
  return performAs(workspace, by, recordOwnershipUseCase, { params: { animal }, body });
}
async function inForce(animal: AnimalId) {
  return (
    (await show(workspace.owner, animal)).ownership.find(({ untilDay }) => untilDay === null)?.id ?? null
  );
}
async function fieldsOf(work: Promise<unknown>): Promise<Record<string, string>> {
  const error: unknown = await work.then(
    () => null,
    (reason: unknown) => reason,
  );
  if (!(error instanceof Refusal)) throw new Error(`Not refused: ${String(error)}`);
  return Object.fromEntries(
    (error.more.errors ?? [{ field: error.code, message: error.detail }]).map(({ field, message }) => [
      field,
      message,
    ]),
  );
}

describe('parts of an animal', () => {
  it('change from a day on and stay in the history, with half-open days', async () => {
    const animal = await addAnimal([{ partyId: owner, parts: 1 }]);
    const buyIn = {
      fromDay: '2024-03-01',
      reason: 'buy_in',
      price: 125_000,
      note: 'half of her',
      seen: await inForce(animal),
    };
    await record(workspace.owner, animal, {
      ...buyIn,
      parts: [
        { partyId: owner, parts: 1 },
        { partyId: partner, parts: 1 },
      ],
    });
    const { ownership } = await show(workspace.owner, animal);
    expect(ownership.map(({ fromDay, untilDay, reason }) => [fromDay, untilDay, reason])).toEqual([
      ['2024-03-01', null, 'buy_in'],
      ['2023-01-01', '2024-03-01', 'founding'],
    ]);
    expect(ownership[0]?.price).toBe(125_000);
  });

  it('of two changes at the same moment only one succeeds, and the parts stay whole', async () => {
    const animal = await addAnimal([{ partyId: owner, parts: 1 }]);
    const seen = await inForce(animal);
    const change = (to: PartyId) =>
      record(workspace.owner, animal, {
        fromDay: '2024-05-01',
        reason: 'transfer',
        seen,
        parts: [{ partyId: to, parts: 1 }],
      });
    const done = await Promise.allSettled([change(partner), change(other)]);
    expect(done.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
    const refused = done.find((result) => result.status === 'rejected');
    expect((refused?.reason as Refusal).code).toBe('stale');
    const { ownership } = await show(workspace.owner, animal);
    expect(ownership.filter(({ untilDay }) => untilDay === null)).toHaveLength(1);
    expect(ownership).toHaveLength(2);
  });

  it('can be corrected on their own first day only as a correction', async () => {
    const animal = await addAnimal([{ partyId: owner, parts: 1 }]);
    const body = {
      fromDay: '2023-01-01',
      parts: [
        { partyId: owner, parts: 2 },
        { partyId: partner, parts: 1 },
      ],
      seen: await inForce(animal),
    };
    expect(
      (await fieldsOf(record(workspace.owner, animal, { ...body, reason: 'transfer' }))).fromDay,
    ).toMatch(/correction/);
    await record(workspace.owner, animal, { ...body, reason: 'correction' });
    expect((await show(workspace.owner, animal)).ownership[0]?.parts).toHaveLength(2);
  });

  it.each([
    [
      'a day before the present parts',
      { fromDay: '2022-01-01' },
      'fromDay',
      /hold since 2023-01-01; a change comes after/,
    ],
    ['a day that has not come', { fromDay: '2100-01-01' }, 'fromDay', /not come/],
    ['a gift with a price', { reason: 'gift', price: 100 }, 'price', /gift has no price/],
  ])('refuse %s', async (_, change, field, message) => {
    const animal = await addAnimal([{ partyId: owner, parts: 1 }]);
    const body = {
      fromDay: '2024-01-01',
      reason: 'transfer',
      parts: [{ partyId: partner, parts: 1 }],
      seen: await inForce(animal),
      ...change,
    };
    expect((await fieldsOf(record(workspace.owner, animal, body)))[field]).toMatch(message);
  });

  it('a partner gives away parts of their own only', async () => {
    const animal = await addAnimal([
      { partyId: owner, parts: 1 },
      { partyId: partner, parts: 1 },
    ]);
    const body = { fromDay: '2024-01-01', reason: 'transfer', seen: await inForce(animal) };
    const taken = [
      { partyId: partner, parts: 2 },
      { partyId: owner, parts: 1 },
    ];
    expect((await fieldsOf(record(workspace.partner, animal, { ...body, parts: taken }))).parts).toMatch(
      /only parts of your own/,
    );
    await record(workspace.partner, animal, {
      ...body,
      parts: [
        { partyId: partner, parts: 1 },
        { partyId: owner, parts: 3 },
      ],
    });
    expect(
      (await fieldsOf(record(workspace.keeper, animal, { ...body, parts: taken }))).not_allowed,
    ).toBeDefined();
  });

  it('hide prices from the keeper, and earlier owners from a partner of other projects', async () => {
    const animal = await addAnimal([{ partyId: other, parts: 1 }]);
    await record(workspace.owner, animal, {
      fromDay: '2024-01-01',
      reason: 'buy_out',
      price: 90_000,
      note: 'paid in cash',
      seen: await inForce(animal),
      parts: [{ partyId: owner, parts: 1 }],
    });
    await record(workspace.owner, animal, {
      fromDay: '2024-02-01',
      reason: 'gift',
      seen: await inForce(animal),
      parts: [{ partyId: partner, parts: 1 }],
    });
    const kept = await show(workspace.keeper, animal);
    expect(kept.ownership.every(({ price, note }) => price === null && note === '')).toBe(true);
    const seen = await show(workspace.partner, animal);
    expect(seen.ownership.find(({ fromDay }) => fromDay === '2024-01-01')?.price).toBeNull();
    expect(JSON.stringify(seen.parties)).not.toContain('Other partner');
    expect((await show(workspace.accountant, animal)).ownership[1]?.price).toBe(90_000);
  });
});
