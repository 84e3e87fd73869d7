import { z } from 'zod';
import { action } from './actions';
import { contract, workspaceSlug } from './contract';
import { memberId, partyId, projectId, userId, workspaceId } from './ids';
import { role } from './roles';

const workspaceOfPerson = z.object({ slug: workspaceSlug, name: z.string(), role });

export const showMe = contract({
  id: 'me.show',
  method: 'GET',
  path: '/me',
  summary: 'The signed-in person and the workspaces they are a member of',
  access: { scope: 'person' },
  response: z.object({ userId, name: z.string(), email: z.string(), workspaces: z.array(workspaceOfPerson) }),
});

/** A party as it is drawn everywhere: its name and its mark (colour and pattern). */
export const partyMark = z.object({
  id: partyId,
  name: z.string(),
  kind: z.enum(['partner', 'house']),
  mark: z.int().min(0).max(7),
});

export const showWorkspace = contract({
  id: 'workspace.show',
  method: 'GET',
  path: '/workspaces/{workspace}',
  summary:
    'The workspace as the caller sees it: who they are in it, what they may do, and what its screens need everywhere',
  access: { scope: 'workspace', action: 'workspace.see' },
  response: z.object({
    id: workspaceId,
    slug: workspaceSlug,
    name: z.string(),
    facilityName: z.string(),
    currency: z.string(),
    timeZone: z.string(),
    today: z.iso.date(),
    temperatureUnit: z.enum(['C', 'F']),
    me: z.object({ memberId, name: z.string(), email: z.string(), role, partyId: partyId.nullable() }),
    /** What the caller may do at all; screens and actions that are not among them are not shown. */
    actions: z.array(action),
    parties: z.array(partyMark),
    projects: z.array(
      z.object({ id: projectId, name: z.string(), parties: z.array(z.object({ partyId, rank: z.int() })) }),
    ),
    workspaces: z.array(workspaceOfPerson),
    unread: z.int(),
  }),
});
