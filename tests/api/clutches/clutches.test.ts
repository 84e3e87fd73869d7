import { eq } from 'drizzle-orm';
import { randomUUID } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { withScope } from '@/db/scope';
import { animalLoci, ownerships } from '@/db/schema/collection';
import { pairings } from '@/db/schema/season';
import type { ClutchId, PairingId } from '@/lib/contracts/ids';
import { addDays } from '@/lib/season/days';
import { layClutchUseCase } from '@/lib/use-cases/season/lay-clutch';
import { listClutchesUseCase } from '@/lib/use-cases/season/list-clutches';
import { listPairingEventsUseCase } from '@/lib/use-cases/season/list-pairing-events';
import { logHatchlingsUseCase } from '@/lib/use-cases/season/log-hatchlings';
import { logPairingEventUseCase } from '@/lib/use-cases/season/log-pairing-event';
import { showClutchUseCase } from '@/lib/use-cases/season/show-clutch';
import { agreeOnTerms } from '../season/agree';
import { makeWorkspace, performAs, type TestMember, type TestWorkspace } from '../setup/fixture';

const today = new Date().toISOString().slice(0, 10);
const laidOn = addDays(today, -60);
const hatchedOn = addDays(today, -1);

describe('clutches', () => {
  let workspace: TestWorkspace;
  let pairing: PairingId;
  let clutch: ClutchId;
  const show = (who: TestMember) => performAs(workspace, who, showClutchUseCase, { params: { clutch } });
  const young = (code: string, look?: string) => ({
    code,
    sex: 'unknown' as const,
    grams: 62,
    shows: look === undefined ? {} : { [workspace.locusId]: look },
  });
  const hatch = (
    who: TestMember,
    hatchlings: ReturnType<typeof young>[],
    idempotencyKey: string = randomUUID(),
    day = hatchedOn,
  ) =>
    performAs(workspace, { ...who, idempotencyKey }, logHatchlingsUseCase, {
      params: { clutch },
      body: { hatchedOn: day, hatchlings },
    });

  beforeAll(async () => {
    workspace = await makeWorkspace();
    const { id: workspaceId, projectId, sireId, damId, locusId, owner } = workspace;
    await agreeOnTerms(workspace);
    pairing = randomUUID() as PairingId;
    await withScope({ workspaceId }, async (tx) => {
      await tx.insert(pairings).values({
        workspaceId,
        id: pairing,
        projectId,
        season: 2026,
        sireId,
        damId,
        status: 'agreed',
        createdBy: owner.memberId,
      });
      const claim = { shows: '', carries: { genotypes: { '+/a': '1' }, basis: 'proven' as const } };
      await tx
        .insert(animalLoci)
        .values([sireId, damId].map((animalId) => ({ workspaceId, animalId, locusId, claim })));
    });
    const laid = await performAs(workspace, workspace.keeper, layClutchUseCase, {
      params: { pairing },
      body: { laidOn, eggs: 4 },
    });
    clutch = laid.id;
  });

  it('logs what was seen of the pairing', async () => {
    await performAs(workspace, workspace.keeper, logPairingEventUseCase, {
      params: { pairing },
      body: { kind: 'lock', seenOn: laidOn, minutes: 95 },
    });
    const { events } = await performAs(workspace, workspace.partner, listPairingEventsUseCase, {
      params: { pairing },
    });
    expect(events).toMatchObject([{ kind: 'lock', minutes: 95, by: 'Keeper', retracted: false }]);
  });

  it('tells what may hatch and whose it will be', async () => {
    const { possibleLooks, derivation, state, proposedCodes } = await show(workspace.partner);
    // Het × het: 3/4 and 1/4, Mendel.
    expect(possibleLooks.map(({ odds }) => odds)).toEqual(['3/4', '1/4']);
    // Half of each side; the sire is owned 1 : 1, the dam by the partner: owner 1/4, partner 3/4.
    expect(derivation.parts).toEqual([
      { partyId: workspace.owner.partyId, parts: 1 },
      { partyId: workspace.partner.partyId, parts: 3 },
    ]);
    expect(state).toBe('hatching');
    expect(proposedCodes).toHaveLength(4);
    const of = (wanted: 'hatching' | 'incubating') =>
      performAs(workspace, workspace.owner, listClutchesUseCase, { query: { state: wanted } });
    expect((await of('hatching')).total).toBe(1);
    expect((await of('incubating')).total).toBe(0);
  });

  it('names every field that is wrong and logs nothing', async () => {
    await expect(hatch(workspace.keeper, [young('A'), young('A'), young('TP-001')])).rejects.toMatchObject({
      more: { errors: [{ field: 'hatchlings.1.code' }, { field: 'hatchlings.2.code' }] },
    });
    const five = ['A', 'B', 'C', 'D', 'E'].map((code) => young(code));
    await expect(hatch(workspace.keeper, five)).rejects.toMatchObject({
      more: { errors: [{ field: 'hatchlings' }] },
    });
    await expect(hatch(workspace.keeper, [young('A', 'Piebald')])).rejects.toMatchObject({
      more: { errors: [{ field: 'hatchlings.0.shows' }] },
    });
    const foreign = { ...young('A'), shows: { [randomUUID()]: '' } };
    await expect(hatch(workspace.keeper, [foreign])).rejects.toMatchObject({
      more: { errors: [{ field: 'hatchlings.0.shows' }] },
    });
    for (const day of [addDays(laidOn, -1), addDays(today, 3)]) {
      await expect(hatch(workspace.keeper, [young('A')], randomUUID(), day)).rejects.toMatchObject({
        more: { errors: [{ field: 'hatchedOn' }] },
      });
    }
    expect((await show(workspace.owner)).young).toEqual([]);
  });

  it('is not for accountants, nor for who is not in the project or the workspace', async () => {
    await expect(hatch(workspace.accountant, [young('A')])).rejects.toMatchObject({ code: 'not_allowed' });
    await expect(show(workspace.otherPartner)).rejects.toMatchObject({ code: 'not_found' });
    await expect(hatch(workspace.otherPartner, [young('A')])).rejects.toMatchObject({ code: 'not_found' });
    expect((await performAs(workspace, workspace.otherPartner, listClutchesUseCase)).total).toBe(0);
    const other = await makeWorkspace();
    await expect(
      performAs(other, other.owner, showClutchUseCase, { params: { clutch } }),
    ).rejects.toMatchObject({ code: 'not_found' });
  });

  it('logs the young once, each with its owners and how they came about', async () => {
    const key = randomUUID();
    const first = await hatch(workspace.keeper, [young('Y-1', 'Albino'), young('Y-2', '')], key);
    expect(await hatch(workspace.keeper, [young('Y-1', 'Albino'), young('Y-2', '')], key)).toEqual(first);
    const shown = await show(workspace.partner);
    expect(shown.young.map(({ code, hatchNumber, grams }) => [code, hatchNumber, grams])).toEqual([
      ['Y-1', 1, 62],
      ['Y-2', 2, 62],
    ]);
    expect(shown.young[0]?.looksLike).toBe('Albino');
    expect(shown.young[0]?.parts).toHaveLength(2);
    expect(shown.young[0]?.parts).toEqual(expect.arrayContaining(shown.derivation.parts));
    expect(shown).toMatchObject({ state: 'hatched', hatchedOn });
    const [id] = first.ids;
    const [held] = await withScope({ workspaceId: workspace.id }, (tx) =>
      tx.select().from(ownerships).where(eq(ownerships.animalId, id!)),
    );
    expect(held).toMatchObject({ reason: 'hatched', fromDay: hatchedOn, derivation: shown.derivation.steps });
  });
});
