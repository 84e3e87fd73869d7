import { beforeAll, describe, expect, it } from 'vitest';
import { createProjectUseCase } from '@/lib/use-cases/projects/create-project';
import { editProjectUseCase } from '@/lib/use-cases/projects/edit-project';
import { listCommentsUseCase } from '@/lib/use-cases/projects/list-comments';
import { listProjectsUseCase } from '@/lib/use-cases/projects/list-projects';
import { showProjectUseCase } from '@/lib/use-cases/projects/show-project';
import { sumHoldings } from '@/lib/use-cases/projects/sum-holdings';
import { writeCommentUseCase } from '@/lib/use-cases/projects/write-comment';
import type { PartyId } from '@/lib/contracts/ids';
import { agreeOnTerms } from '../season/agree';
import { makeWorkspace, performAs, type TestWorkspace } from '../setup/fixture';

describe('holdings', () => {
  it('adds up animals as wholes, exactly: 1/2 + 1/3 of the first party is 5 of 12', () => {
    const [a, b] = ['a' as PartyId, 'b' as PartyId];
    const held = sumHoldings([
      [
        { partyId: a, parts: 1 },
        { partyId: b, parts: 1 },
      ],
      [
        { partyId: a, parts: 1 },
        { partyId: b, parts: 2 },
      ],
    ]);
    expect(held).toEqual({
      of: 12,
      parts: [
        { partyId: a, parts: 5 },
        { partyId: b, parts: 7 },
      ],
    });
    expect(sumHoldings([[], []])).toEqual({ of: 0, parts: [] });
  });
});

describe('joint projects', () => {
  let workspace: TestWorkspace;
  beforeAll(async () => {
    workspace = await makeWorkspace();
  });

  it('are seen by their parties only; a keeper sees them without terms', async () => {
    const names = async (member: TestWorkspace['owner']) =>
      (await performAs(workspace, member, listProjectsUseCase)).rows.map(({ name }) => name);
    expect(await names(workspace.owner)).toEqual(['First project', 'Other project']);
    expect(await names(workspace.partner)).toEqual(['First project']);
    const keeper = await performAs(workspace, workspace.keeper, showProjectUseCase, {
      params: { project: workspace.projectId },
    });
    expect(keeper.terms).toBeUndefined();
    expect(keeper.termsInForce).toBeUndefined();
    await expect(
      performAs(workspace, workspace.otherPartner, showProjectUseCase, {
        params: { project: workspace.projectId },
      }),
    ).rejects.toMatchObject({ code: 'not_found' });
  });

  it('shows parties in rank order, animals with their owners, and holdings', async () => {
    const shown = await performAs(workspace, workspace.partner, showProjectUseCase, {
      params: { project: workspace.projectId },
    });
    expect(shown.parties.map(({ name, rank }) => [name, rank])).toEqual([
      ['Owner', 1],
      ['Partner', 2],
    ]);
    expect(shown.animalRows.map(({ code }) => code)).toEqual(['TP-001', 'TP-002']);
    expect(shown.holdings).toMatchObject({ of: 4 });
  });

  it('is started by a partner with others, who must be a party and sees the animals', async () => {
    const body = {
      name: 'New line',
      speciesId: workspace.speciesId,
      parties: [workspace.partner.partyId!, workspace.otherPartner.partyId!],
      animals: [workspace.damId],
    };
    await expect(
      performAs(workspace, workspace.partner, createProjectUseCase, {
        body: { ...body, parties: [workspace.owner.partyId!, workspace.otherPartner.partyId!] },
      }),
    ).rejects.toMatchObject({ more: { errors: [{ field: 'parties' }] } });
    await expect(
      performAs(workspace, workspace.partner, createProjectUseCase, {
        body: { ...body, animals: [workspace.otherAnimalId] },
      }),
    ).rejects.toMatchObject({ more: { errors: [{ field: 'animals.0' }] } });
    await expect(
      performAs(workspace, workspace.partner, createProjectUseCase, {
        body: { ...body, name: 'First project' },
      }),
    ).rejects.toMatchObject({ more: { errors: [{ field: 'name' }] } });
    await expect(
      performAs(workspace, workspace.keeper, createProjectUseCase, { body }),
    ).rejects.toMatchObject({ code: 'not_allowed' });
    const { id } = await performAs(workspace, workspace.partner, createProjectUseCase, { body });
    const shown = await performAs(workspace, workspace.otherPartner, showProjectUseCase, {
      params: { project: id },
    });
    expect(shown).toMatchObject({ name: 'New line', animals: 1, termsInForce: null });
  });

  it('refuses an edit of a version that is no longer there, and taking out a party that is bound by terms', async () => {
    const params = { project: workspace.projectId };
    const before = await performAs(workspace, workspace.owner, showProjectUseCase, { params });
    const saved = await performAs(workspace, workspace.owner, editProjectUseCase, {
      params,
      body: { version: before.version, purpose: 'A pale line.' },
    });
    expect(saved.version).toBe(before.version + 1);
    await expect(
      performAs(workspace, workspace.partner, editProjectUseCase, {
        params,
        body: { version: before.version, purpose: 'Mine.' },
      }),
    ).rejects.toMatchObject({ code: 'stale', more: { currentVersion: saved.version } });
    await agreeOnTerms(workspace);
    await expect(
      performAs(workspace, workspace.owner, editProjectUseCase, {
        params,
        body: {
          version: saved.version,
          parties: [workspace.owner.partyId!, workspace.otherPartner.partyId!],
        },
      }),
    ).rejects.toMatchObject({ more: { errors: [{ field: 'parties' }] } });
  });

  it('lets the parties of terms talk, and nobody else', async () => {
    const { terms } = await performAs(workspace, workspace.owner, showProjectUseCase, {
      params: { project: workspace.projectId },
    });
    const params = { kind: 'terms', subject: terms![0]!.id };
    await performAs(workspace, workspace.partner, writeCommentUseCase, {
      params,
      body: { body: 'Fine with me.' },
    });
    const { comments } = await performAs(workspace, workspace.owner, listCommentsUseCase, { params });
    expect(comments).toMatchObject([{ name: 'Partner', body: 'Fine with me.', mine: false }]);
    await expect(
      performAs(workspace, workspace.otherPartner, listCommentsUseCase, { params }),
    ).rejects.toMatchObject({ code: 'not_found' });
    await expect(
      performAs(workspace, workspace.keeper, listCommentsUseCase, { params }),
    ).rejects.toMatchObject({ code: 'not_allowed' });
    await expect(
      performAs(workspace, workspace.owner, writeCommentUseCase, { params, body: { body: '  ' } }),
    ).rejects.toMatchObject({ more: { errors: [{ field: 'body' }] } });
  });
});
