import 'server-only';
import {
  countUnread,
  listParties,
  listProjectsWithParties,
  workspacesOfPerson,
} from '@/db/queries/workspace';
import { showWorkspace } from '@/lib/contracts/session';
import { actionsOf, reachOf } from '../permissions';
import { workspaceUseCase } from '../world';

/** A member sees the workspace's frame: what they may do in it, its parties and their projects. */
export const showWorkspaceUseCase = workspaceUseCase(
  showWorkspace,
  async ({ tx, workspace, actor, today }) => {
    const projectReach = reachOf(actor.role, 'project.see');
    const projects = await listProjectsWithParties(
      tx,
      projectReach === 'all'
        ? { everything: true }
        : { everything: false, partyId: actor.partyId, projectIds: actor.projectIds },
    );
    const partiesSeen = new Set(projects.flatMap((project) => project.parties.map(({ partyId }) => partyId)));
    const parties = (await listParties(tx)).filter(
      (party) =>
        projectReach === 'all' ||
        party.kind === 'house' ||
        party.id === actor.partyId ||
        partiesSeen.has(party.id),
    );
    return {
      id: workspace.id,
      slug: workspace.slug,
      name: workspace.name,
      facilityName: workspace.facilityName,
      currency: workspace.currency,
      timeZone: workspace.timeZone,
      temperatureUnit: workspace.temperatureUnit,
      today,
      me: {
        memberId: actor.memberId,
        name: actor.name,
        email: actor.email,
        role: actor.role,
        partyId: actor.partyId,
      },
      actions: actionsOf(actor.role),
      parties,
      projects,
      workspaces: await workspacesOfPerson(tx, actor.userId),
      unread: await countUnread(tx, actor.memberId),
    };
  },
);
