import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { withScope } from '@/db/scope';
import { mails } from '@/db/schema/activity';
import { termsVersions } from '@/db/schema/projects';
import { decideTermsUseCase } from '@/lib/use-cases/projects/decide-terms';
import { listTermsUseCase } from '@/lib/use-cases/projects/list-terms';
import { previewTermsUseCase } from '@/lib/use-cases/projects/preview-terms';
import { proposeTermsUseCase } from '@/lib/use-cases/projects/propose-terms';
import { showTermsUseCase } from '@/lib/use-cases/projects/show-terms';
import { withdrawTermsUseCase } from '@/lib/use-cases/projects/withdraw-terms';
import { chainHash } from '@/lib/use-cases/hash';
import { draftFor } from '../season/agree';
import { makeWorkspace, performAs, type TestWorkspace } from '../setup/fixture';

describe('terms of a project', () => {
  let workspace: TestWorkspace;
  let firstId: string;
  const project = () => ({ project: workspace.projectId });
  const today = new Date().toISOString().slice(0, 10);

  beforeAll(async () => {
    workspace = await makeWorkspace();
  });

  it('splits an example sale step by step, each step holding what the one before has left', async () => {
    const preview = await performAs(workspace, workspace.owner, previewTermsUseCase, {
      params: project(),
      body: { content: draftFor(workspace), price: 100_000, cardFee: 3_200 },
    });
    // 1,000.00 − 32.00 = 968.00; 8% = 77.44; 890.56 to divide 1 : 3 = 222.64 and 667.92.
    expect(preview.steps.map(({ label, amount }) => [label, amount])).toEqual([
      ['Paid by the buyer', 100_000],
      ['After the card fee', 96_800],
      ['To divide', 89_056],
    ]);
    expect(preview.steps[2]?.cuts.map(({ label, amount }) => [label, amount])).toEqual([
      ['Owner', 22_264],
      ['Partner', 66_792],
    ]);
  });

  it('refuses terms that give nobody anything, by field', async () => {
    const content = { ...draftFor(workspace), damSide: 0, sireSide: 0 };
    await expect(
      performAs(workspace, workspace.owner, proposeTermsUseCase, {
        params: project(),
        body: { content, inForceFrom: '2024-01-01' },
      }),
    ).rejects.toMatchObject({
      more: { errors: [{ field: 'content.damSide' }] },
    });
    const elsewhere = {
      ...draftFor(workspace),
      houseShare: { partyId: workspace.otherPartner.partyId!, basisPoints: 500 },
    };
    await expect(
      performAs(workspace, workspace.owner, proposeTermsUseCase, {
        params: project(),
        body: { content: elsewhere, inForceFrom: '2024-01-01' },
      }),
    ).rejects.toMatchObject({
      more: { errors: [{ field: 'content.houseShare.partyId' }] },
    });
  });

  it('counts the proposer as agreeing, tells the others by mail, and locks once all agree', async () => {
    const proposed = await performAs(workspace, workspace.owner, proposeTermsUseCase, {
      params: project(),
      body: { content: draftFor(workspace), inForceFrom: '2024-01-01' },
    });
    firstId = proposed.id;
    expect(proposed).toMatchObject({ number: 1, status: 'proposed' });
    const sent = await withScope({ workspaceId: workspace.id }, (tx) =>
      tx.select().from(mails).where(eq(mails.template, 'terms-proposed')),
    );
    expect(sent.map(({ recipient }) => recipient)).toEqual([workspace.partner.person.email]);

    const params = { ...project(), terms: firstId };
    const waiting = await performAs(workspace, workspace.partner, showTermsUseCase, { params });
    expect(waiting.standings.map(({ partyId, state }) => [partyId, state])).toEqual([
      [workspace.owner.partyId, 'agreed'],
      [workspace.partner.partyId, 'waiting'],
    ]);
    await expect(
      performAs(workspace, workspace.accountant, decideTermsUseCase, {
        params,
        body: { decision: 'agreed' },
      }),
    ).rejects.toMatchObject({ code: 'not_allowed' });
    await expect(
      performAs(workspace, workspace.otherPartner, showTermsUseCase, { params }),
    ).rejects.toMatchObject({ code: 'not_found' });

    const decided = await performAs(workspace, workspace.partner, decideTermsUseCase, {
      params,
      body: { decision: 'agreed' },
    });
    expect(decided).toEqual({ status: 'agreed', agreed: 2, of: 2 });
    const locked = await performAs(workspace, workspace.accountant, showTermsUseCase, { params });
    expect(locked).toMatchObject({ inForce: true, lockedAt: expect.any(String), me: { mayDecide: false } });
    await expect(
      withScope({ workspaceId: workspace.id }, (tx) =>
        tx.update(termsVersions).set({ note: 'other' }).where(eq(termsVersions.id, locked.id)),
      ),
    ).rejects.toThrow();
    // The seal can be checked again from what is kept.
    const again = chainHash(null, {
      terms: { id: locked.id, projectId: workspace.projectId, number: 1, inForceFrom: '2024-01-01' },
      content: locked.content,
      note: locked.note,
      agreed: locked.standings.map(({ partyId, by, at }) => ({ partyId, by, at })),
    });
    expect(locked.hash).toBe(again);
  });

  it('goes on by versions: one open at a time, a replaced one keeps its number and takes no answers', async () => {
    const content = {
      ...draftFor(workspace),
      houseShare: { partyId: workspace.owner.partyId!, basisPoints: 1000 },
    };
    await expect(
      performAs(workspace, workspace.partner, proposeTermsUseCase, {
        params: project(),
        body: { content, inForceFrom: '2024-01-01' },
      }),
    ).rejects.toMatchObject({
      more: { errors: [{ field: 'inForceFrom' }] },
    });
    const second = await performAs(workspace, workspace.partner, proposeTermsUseCase, {
      params: project(),
      body: { content, inForceFrom: today },
    });
    expect(second.number).toBe(2);
    await expect(
      performAs(workspace, workspace.owner, proposeTermsUseCase, {
        params: project(),
        body: { content, inForceFrom: today },
      }),
    ).rejects.toMatchObject({ code: 'stale' });

    const shown = await performAs(workspace, workspace.owner, showTermsUseCase, {
      params: { ...project(), terms: second.id },
    });
    expect(shown.comparedWith?.number).toBe(1);
    expect(shown.clauses.filter(({ changed }) => changed)).toEqual([
      {
        title: 'House share',
        text: '10% off the top, to Owner',
        before: '8% off the top, to Owner',
        changed: true,
      },
    ]);

    const third = await performAs(workspace, workspace.owner, proposeTermsUseCase, {
      params: project(),
      body: { content: draftFor(workspace), inForceFrom: today, replaces: second.id },
    });
    expect(third.number).toBe(3);
    await expect(
      performAs(workspace, workspace.owner, decideTermsUseCase, {
        params: { ...project(), terms: second.id },
        body: { decision: 'agreed' },
      }),
    ).rejects.toMatchObject({
      code: 'stale',
      more: { currentVersion: 3 },
    });
    const open = await performAs(workspace, workspace.owner, showTermsUseCase, {
      params: { ...project(), terms: third.id },
    });
    await expect(
      performAs(workspace, workspace.owner, withdrawTermsUseCase, {
        params: { ...project(), terms: third.id },
        body: { version: open.version + 1 },
      }),
    ).rejects.toMatchObject({ code: 'stale' });
    await performAs(workspace, workspace.owner, withdrawTermsUseCase, {
      params: { ...project(), terms: third.id },
      body: { version: open.version },
    });
    const { versions } = await performAs(workspace, workspace.partner, listTermsUseCase, {
      params: project(),
    });
    expect(versions.map(({ number, status }) => [number, status])).toEqual([
      [3, 'withdrawn'],
      [2, 'withdrawn'],
      [1, 'agreed'],
    ]);
  });
});
