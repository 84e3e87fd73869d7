import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { withScope } from '@/db/scope';
import { mails } from '@/db/schema/activity';
import { animalLoci } from '@/db/schema/collection';
import { pairingVersions } from '@/db/schema/season';
import { addDays } from '@/lib/season/days';
import { decidePairingUseCase } from '@/lib/use-cases/season/decide-pairing';
import { listBreedersUseCase } from '@/lib/use-cases/season/list-breeders';
import { previewPairingUseCase } from '@/lib/use-cases/season/preview-pairing';
import { proposePairingAgainUseCase } from '@/lib/use-cases/season/propose-pairing-again';
import { proposePairingUseCase } from '@/lib/use-cases/season/propose-pairing';
import { showPairingUseCase } from '@/lib/use-cases/season/show-pairing';
import { showSeasonUseCase } from '@/lib/use-cases/season/show-season';
import { withdrawPairingUseCase } from '@/lib/use-cases/season/withdraw-pairing';
import { makeWorkspace, performAs, type TestWorkspace } from '../setup/fixture';
import { agreeOnTerms } from './agree';

const startsOn = addDays(new Date().toISOString().slice(0, 10), 7);
const plan = { startsOn, endsOn: addDays(startsOn, 60), eggsExpected: 6 };

/** A het sire and a dam that is het with two chances in three: the classic uncertain cross. */
async function recordGenes({ id, sireId, damId, locusId }: TestWorkspace): Promise<void> {
  await withScope({ workspaceId: id }, (tx) =>
    tx.insert(animalLoci).values([
      {
        workspaceId: id,
        animalId: sireId,
        locusId,
        claim: { shows: '', carries: { genotypes: { '+/a': '1' }, basis: 'proven' } },
      },
      {
        workspaceId: id,
        animalId: damId,
        locusId,
        claim: { shows: '', carries: { genotypes: { '+/+': '1/3', '+/a': '2/3' }, basis: 'stated' } },
      },
    ]),
  );
}

describe('pairings', () => {
  let workspace: TestWorkspace;
  const pair = () => ({ projectId: workspace.projectId, sireId: workspace.sireId, damId: workspace.damId });

  beforeAll(async () => {
    workspace = await makeWorkspace();
    await recordGenes(workspace);
  });

  it('can be looked at before terms are agreed, but not proposed', async () => {
    const preview = await performAs(workspace, workspace.partner, previewPairingUseCase, { body: pair() });
    expect(preview.obstacles.map(({ field }) => field)).toEqual(['projectId']);
    await expect(
      performAs(workspace, workspace.partner, proposePairingUseCase, { body: { ...pair(), ...plan } }),
    ).rejects.toMatchObject({ code: 'invalid' });
  });

  it('gives exact odds, and the odds of a clutch as a mixture over the uncertain dam', async () => {
    await agreeOnTerms(workspace);
    const { figures, obstacles } = await performAs(workspace, workspace.partner, previewPairingUseCase, {
      body: { ...pair(), ...plan },
    });
    expect(obstacles).toEqual([]);
    const albino = figures.outcomes.find(({ looksLike }) => looksLike === 'Albino');
    // 2/3 · 1/4, and 2/3 · (1 − (3/4)⁶): by hand.
    expect(albino).toMatchObject({ odds: '1/6' });
    expect(albino?.atLeastOne).toBeCloseTo((2 / 3) * (1 - 0.75 ** 6), 10);
    expect(figures.uncertain).toContain('TP-002');
    expect(figures.parents.dam.loci[0]?.copies[1]?.probability).toBeCloseTo(2 / 3, 10);
    expect(figures.squares[0]).toMatchObject({ columns: ['+', 'a'], rows: ['+', 'a'] });
    expect(figures.squares[0]?.cells[1]?.[1]).toEqual({ genotype: 'a/a', looksLike: 'Albino', odds: '1/4' });
  });

  it('divides expected proceeds by the terms, to the cent', async () => {
    const { figures } = await performAs(workspace, workspace.partner, previewPairingUseCase, {
      body: { ...pair(), ...plan },
    });
    const albino = figures.outcomes.find(({ looksLike }) => looksLike === 'Albino')!.key;
    const priced = await performAs(workspace, workspace.partner, previewPairingUseCase, {
      body: { ...pair(), ...plan, prices: { [albino]: 60_001 } },
    });
    const { proceeds } = priced.figures;
    // 600.01 · 1/6 · 6 eggs · 81/100 = 486.0081, rounded once to 486.01; 8% of it is 38.88.
    expect(proceeds?.expected).toBe(48_601);
    expect(proceeds?.steps).toEqual([
      { label: expect.stringContaining('8%'), amount: 3888, partyId: workspace.owner.partyId },
    ]);
    // The sire is held half and half, the dam by the partner alone: 1 of 4 and 3 of 4 of 447.13.
    expect(proceeds?.shares.map(({ partyId, amount, parts }) => [partyId, amount, parts])).toEqual([
      [workspace.owner.partyId, 11_178, 1],
      [workspace.partner.partyId, 33_535, 3],
    ]);
  });

  it('tells a keeper what can hatch and nothing of money', async () => {
    const preview = await performAs(workspace, workspace.keeper, previewPairingUseCase, {
      body: { ...pair(), ...plan },
    });
    expect(preview.figures.outcomes.length).toBeGreaterThan(0);
    expect(JSON.stringify(preview)).not.toMatch(/price|proceeds|medians/);
    await expect(
      performAs(workspace, workspace.keeper, proposePairingUseCase, { body: { ...pair(), ...plan } }),
    ).rejects.toMatchObject({ code: 'not_allowed' });
  });

  it('is proposed, changed, agreed by all, and locked with what was seen', async () => {
    const first = await performAs(workspace, workspace.partner, proposePairingUseCase, {
      body: { ...pair(), ...plan, answerBy: addDays(startsOn, 0) },
    });
    expect(first).toMatchObject({ number: 1, status: 'proposed' });
    const sent = await withScope({ workspaceId: workspace.id }, (tx) =>
      tx.select().from(mails).where(eq(mails.template, 'pairing-proposed')),
    );
    expect(sent.map(({ recipient }) => recipient)).toEqual([workspace.owner.person.email]);
    expect(sent[0]?.data.link).toContain(`/${workspace.slug}/season/pairings/${first.id}?decide=1`);

    const params = { pairing: first.id };
    const shown = await performAs(workspace, workspace.owner, showPairingUseCase, { params });
    expect(shown).toMatchObject({
      agreed: 1,
      of: 2,
      waitsForMe: true,
      waitingFor: [workspace.owner.partyId],
      me: { mayDecide: true, state: 'waiting' },
    });

    await expect(
      performAs(workspace, workspace.owner, decidePairingUseCase, {
        params,
        body: { versionId: first.versionId, decision: 'change_asked' },
      }),
    ).rejects.toMatchObject({ code: 'invalid' });
    await performAs(workspace, workspace.owner, decidePairingUseCase, {
      params,
      body: { versionId: first.versionId, decision: 'change_asked', comment: 'Start a week later.' },
    });
    await expect(
      performAs(workspace, workspace.partner, proposePairingAgainUseCase, {
        params,
        body: { seen: 0, ...plan },
      }),
    ).rejects.toMatchObject({ code: 'stale' });
    const second = await performAs(workspace, workspace.partner, proposePairingAgainUseCase, {
      params,
      body: { seen: 1, ...plan, startsOn: addDays(startsOn, 7) },
    });

    await expect(
      performAs(workspace, workspace.owner, decidePairingUseCase, {
        params,
        body: { versionId: first.versionId, decision: 'agreed' },
      }),
    ).rejects.toMatchObject({ code: 'stale', more: { currentVersion: 2 } });
    const decided = await performAs(workspace, workspace.owner, decidePairingUseCase, {
      params,
      body: { versionId: second.versionId, decision: 'agreed' },
    });
    expect(decided).toEqual({ status: 'agreed', agreed: 2, of: 2 });

    const locked = await performAs(workspace, workspace.partner, showPairingUseCase, { params });
    expect(locked.versions[0]).toMatchObject({
      number: 2,
      lockedAt: expect.any(String),
      hash: expect.stringMatching(/^[0-9a-f]{64}$/),
    });
    expect(locked.versions[0]?.changes).toContainEqual({
      what: 'Together from',
      before: startsOn,
      after: addDays(startsOn, 7),
    });
    await expect(
      performAs(workspace, workspace.owner, decidePairingUseCase, {
        params,
        body: { versionId: second.versionId, decision: 'change_asked', comment: 'No.' },
      }),
    ).rejects.toMatchObject({ code: 'wrong_state' });
    await expect(
      performAs(workspace, workspace.partner, withdrawPairingUseCase, {
        params,
        body: { version: locked.version },
      }),
    ).rejects.toMatchObject({ code: 'wrong_state' });
    await expect(
      withScope({ workspaceId: workspace.id }, (tx) =>
        tx.update(pairingVersions).set({ hash: 'other' }).where(eq(pairingVersions.id, second.versionId)),
      ),
    ).rejects.toThrow();
  });

  it('can’t be proposed twice in a season', async () => {
    await expect(
      performAs(workspace, workspace.owner, proposePairingUseCase, { body: { ...pair(), ...plan } }),
    ).rejects.toMatchObject({ more: { errors: [{ field: 'damId' }] } });
  });

  it('stands in the season, with worth only for who may see it', async () => {
    const owner = await performAs(workspace, workspace.owner, showSeasonUseCase);
    expect(owner).toMatchObject({ agreed: 1, of: 1, hatchlings: { expected: expect.closeTo(4.86, 6) } });
    expect(owner.proceeds).toBeDefined();
    const keeper = await performAs(workspace, workspace.keeper, showSeasonUseCase);
    expect(keeper.rows).toHaveLength(1);
    expect(JSON.stringify(keeper)).not.toMatch(/price|proceeds|amount/);
  });

  it('does not exist for a partner outside the project, nor as a choice from outside', async () => {
    const season = await performAs(workspace, workspace.otherPartner, showSeasonUseCase);
    expect(season.rows).toEqual([]);
    const { rows } = await performAs(workspace, workspace.owner, showSeasonUseCase);
    await expect(
      performAs(workspace, workspace.otherPartner, showPairingUseCase, { params: { pairing: rows[0]!.id } }),
    ).rejects.toMatchObject({ code: 'not_found' });
    await expect(
      performAs(workspace, workspace.partner, previewPairingUseCase, {
        body: { ...pair(), damId: workspace.otherAnimalId },
      }),
    ).rejects.toMatchObject({ more: { errors: [{ field: 'damId' }] } });
    const breeders = await performAs(workspace, workspace.partner, listBreedersUseCase, {
      query: { project: workspace.projectId },
    });
    expect(breeders.dams.map(({ code }) => code)).toEqual(['TP-002']);
  });
});
