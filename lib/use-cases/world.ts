import 'server-only';
import type { Transaction, Workspace } from '@/db/scope';
import type { Visibility } from '@/db/queries/visibility';
import type { MemberId, PartyId, ProjectId, UserId } from '@/lib/contracts/ids';
import type { Role } from '@/lib/contracts/roles';
import type { Contract, Input } from '@/lib/contracts/contract';
import type { Answer } from '@/lib/contracts/contract';
import type { Services } from '@/lib/services/services';

export interface Person {
  userId: UserId;
  name: string;
  /** Verified. */
  email: string;
}

/** A member at work in a workspace. */
interface Member {
  memberId: MemberId;
  userId: UserId;
  name: string;
  email: string;
  role: Role;
  partyId: PartyId | null;
  projectIds: ProjectId[];
}

interface Base {
  tx: Transaction;
  now: Date;
  services: Services;
}

/** What a use case inside a workspace works with. */
export interface WorkspaceWorld extends Base {
  workspace: Workspace;
  actor: Member;
  /** Today in the workspace's time zone, ISO 8601. */
  today: string;
  /** What the actor may see with the action of this use case; every query of tenant rows takes it. */
  sees: Visibility;
}

export interface PersonWorld extends Base {
  person: Person;
}

/** A caller who need not be signed in; `person` is who it is if so. */
interface VisitorWorld extends Base {
  person: Person | null;
}

type Run<World, C extends Contract> = (world: World, input: Input<C>) => Promise<Answer<C>>;

export type UseCase<C extends Contract = Contract> =
  | { contract: C; scope: 'workspace'; run: Run<WorkspaceWorld, C> }
  | { contract: C; scope: 'person'; run: Run<PersonWorld, C> }
  | { contract: C; scope: 'public'; run: Run<VisitorWorld, C> };

/** One thing that a member can do in a workspace. */
export function workspaceUseCase<C extends Contract>(contract: C, run: Run<WorkspaceWorld, C>): UseCase<C> {
  return { contract, scope: 'workspace', run };
}

/** One thing that any signed-in person can do. */
export function personUseCase<C extends Contract>(contract: C, run: Run<PersonWorld, C>): UseCase<C> {
  return { contract, scope: 'person', run };
}
