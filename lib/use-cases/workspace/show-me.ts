import 'server-only';
import { workspacesOfPerson } from '@/db/queries/workspace';
import { showMe } from '@/lib/contracts/session';
import { personUseCase } from '../world';

/** A person sees who they are and where they are a member. */
export const showMeUseCase = personUseCase(showMe, async ({ tx, person }) => ({
  ...person,
  workspaces: await workspacesOfPerson(tx, person.userId),
}));
