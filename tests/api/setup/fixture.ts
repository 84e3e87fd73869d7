import { randomUUID } from 'node:crypto';
import { withScope, type Transaction } from '@/db/scope';
import { users } from '@/db/schema/auth';
import { animals, ownershipParts, ownerships } from '@/db/schema/collection';
import { loci, species } from '@/db/schema/genetics';
import { projectAnimals, projectParties, projects } from '@/db/schema/projects';
import { members, parties, workspaces } from '@/db/schema/workspace';
import type { Sex } from '@/lib/contracts/animal';
import type {
  AnimalId,
  LocusId,
  MemberId,
  PartyId,
  ProjectId,
  SpeciesId,
  UserId,
  WorkspaceId,
} from '@/lib/contracts/ids';
import type { Role } from '@/lib/contracts/roles';
import type { SpeciesProfile } from '@/lib/contracts/species';
import type { Answer, Contract, Request } from '@/lib/contracts/contract';
import { perform, type Caller } from '@/lib/use-cases/perform';
import type { Person, UseCase } from '@/lib/use-cases/world';
import { defineRecessive } from './loci-for-tests';

/** What is usual for the made-up test species; the numbers carry no meaning outside of the tests. */
export const testProfile: SpeciesProfile = {
  bearing: 'eggs',
  clutchSize: { from: 3, usual: 6, to: 11, source: 'test' },
  hatchRate: { fraction: '81/100', source: 'test' },
  intervals: {
    pairingToOvulation: { from: 30, usual: 60, to: 120, source: 'test' },
    ovulationToPreLayShed: { from: 14, usual: 20, to: 28, source: 'test' },
    preLayShedToLaying: { from: 25, usual: 30, to: 50, source: 'test' },
    incubation: { from: 53, usual: 58, to: 65, source: 'test' },
    hatchToFirstShed: { from: 7, usual: 10, to: 14, source: 'test' },
  },
  incubationCelsius: { from: 31, to: 32, source: 'test' },
  breeding: { femaleGrams: 1500, maleGrams: 500, femaleMonths: 30, maleMonths: 12, source: 'test' },
};

export interface TestMember extends Caller {
  person: Person;
  memberId: MemberId;
  partyId: PartyId | null;
  role: Role;
}

export interface TestWorkspace {
  id: WorkspaceId;
  slug: string;
  /** Owner (party "Owner"), two partners, a keeper and an accountant, all verified. */
  owner: TestMember;
  partner: TestMember;
  otherPartner: TestMember;
  keeper: TestMember;
  accountant: TestMember;
  speciesId: SpeciesId;
  /** A recessive locus with alleles "+" and "a"; "a/a" looks "Albino". */
  locusId: LocusId;
  /** A project of the owner and `partner` (not of `otherPartner`), with `sire` and `dam` in it. */
  projectId: ProjectId;
  /** A project of the owner and `otherPartner` only. */
  otherProjectId: ProjectId;
  /** Owned 1 : 1 by the owner and `partner`. */
  sireId: AnimalId;
  /** Owned by `partner` alone. */
  damId: AnimalId;
  /** Owned by `otherPartner` alone, in `otherProject`. */
  otherAnimalId: AnimalId;
}

/** A person who can sign in but is a member of nothing. */
export async function makeStranger(name = 'Stranger'): Promise<Caller & { person: Person }> {
  return { person: await makePerson(name) };
}

async function makePerson(name: string): Promise<Person> {
  const userId = `user-${randomUUID()}` as UserId;
  const email = `${name.toLowerCase().replaceAll(' ', '-')}-${userId.slice(-8)}@example.test`;
  await withScope({}, (tx) => tx.insert(users).values({ id: userId, name, email, emailVerified: true }));
  return { userId, name, email };
}

async function makeMember(
  workspaceId: WorkspaceId,
  name: string,
  role: Role,
  mark: number | null,
): Promise<TestMember> {
  const person = await makePerson(name);
  const memberId = randomUUID() as MemberId;
  const partyId = mark === null ? null : (randomUUID() as PartyId);
  await withScope({ workspaceId }, async (tx) => {
    if (partyId && mark !== null) await tx.insert(parties).values({ workspaceId, id: partyId, name, mark });
    await tx.insert(members).values({ workspaceId, id: memberId, userId: person.userId, role, partyId });
  });
  return { person, memberId, partyId, role };
}

/** Inserts an animal owned in the given parts since its hatching. */
async function makeAnimal(
  tx: Transaction,
  workspaceId: WorkspaceId,
  animal: {
    code: string;
    speciesId: SpeciesId;
    sex: Sex;
    hatchedOn?: string;
    sireId?: AnimalId;
    damId?: AnimalId;
  },
  owners: { partyId: PartyId; parts: number }[],
): Promise<AnimalId> {
  const id = randomUUID() as AnimalId;
  const hatchedOn = animal.hatchedOn ?? '2022-07-01';
  await tx.insert(animals).values({ workspaceId, id, origin: 'captive_bred', ...animal, hatchedOn });
  const ownershipId = randomUUID();
  await tx
    .insert(ownerships)
    .values({ workspaceId, id: ownershipId, animalId: id, fromDay: hatchedOn, reason: 'founding' });
  await tx.insert(ownershipParts).values(owners.map((owner) => ({ workspaceId, ownershipId, ...owner })));
  return id;
}

async function makeProject(
  tx: Transaction,
  workspaceId: WorkspaceId,
  project: { name: string; speciesId: SpeciesId },
  partyIds: PartyId[],
  animalIds: AnimalId[],
): Promise<ProjectId> {
  const id = randomUUID() as ProjectId;
  await tx.insert(projects).values({ workspaceId, id, startedOn: '2024-01-01', ...project });
  await tx.insert(projectParties).values(
    partyIds.map((partyId, index) => ({
      workspaceId,
      projectId: id,
      partyId,
      rank: index + 1,
      joinedOn: '2024-01-01',
    })),
  );
  await tx
    .insert(projectAnimals)
    .values(animalIds.map((animalId) => ({ workspaceId, projectId: id, animalId, addedOn: '2024-01-01' })));
  return id;
}

/** Makes a workspace of its own, so that tests need no clean-up and run beside each other. */
export async function makeWorkspace(): Promise<TestWorkspace> {
  const id = randomUUID() as WorkspaceId;
  const slug = `test-${id.slice(0, 12)}`;
  await withScope({ workspaceId: id }, (tx) =>
    tx.insert(workspaces).values({
      id,
      slug,
      name: `Test ${slug}`,
      facilityName: 'Test room',
      currency: 'USD',
      limits: {
        minimumBreedingGrams: { male: 500, female: 1500 },
        minimumBreedingMonths: { male: 12, female: 30 },
        inbreedingPerMille: 125,
      },
    }),
  );
  const owner = await makeMember(id, 'Owner', 'owner', 0);
  const partner = await makeMember(id, 'Partner', 'partner', 1);
  const otherPartner = await makeMember(id, 'Other partner', 'partner', 2);
  const keeper = await makeMember(id, 'Keeper', 'keeper', null);
  const accountant = await makeMember(id, 'Accountant', 'accountant', null);
  const [ownerParty, partnerParty, otherParty] = [owner.partyId!, partner.partyId!, otherPartner.partyId!];

  const made = await withScope({ workspaceId: id }, async (tx) => {
    const speciesId = randomUUID() as SpeciesId;
    const locusId = randomUUID() as LocusId;
    await tx.insert(species).values({
      workspaceId: id,
      id: speciesId,
      name: 'Test python',
      scientificName: 'Python test',
      sexSystem: 'XY',
      codePrefix: 'TP',
      profile: testProfile,
    });
    await tx.insert(loci).values({
      workspaceId: id,
      id: locusId,
      speciesId,
      name: 'Albino',
      definition: defineRecessive(locusId, 'Albino', 'a'),
    });
    const sireId = await makeAnimal(tx, id, { code: 'TP-001', speciesId, sex: 'male' }, [
      { partyId: ownerParty, parts: 1 },
      { partyId: partnerParty, parts: 1 },
    ]);
    const damId = await makeAnimal(tx, id, { code: 'TP-002', speciesId, sex: 'female' }, [
      { partyId: partnerParty, parts: 1 },
    ]);
    const otherAnimalId = await makeAnimal(tx, id, { code: 'TP-003', speciesId, sex: 'female' }, [
      { partyId: otherParty, parts: 1 },
    ]);
    const projectId = await makeProject(
      tx,
      id,
      { name: 'First project', speciesId },
      [ownerParty, partnerParty],
      [sireId, damId],
    );
    const otherProjectId = await makeProject(
      tx,
      id,
      { name: 'Other project', speciesId },
      [ownerParty, otherParty],
      [otherAnimalId],
    );
    return { speciesId, locusId, sireId, damId, otherAnimalId, projectId, otherProjectId };
  });
  return { id, slug, owner, partner, otherPartner, keeper, accountant, ...made };
}

/** Performs a use case as a member; params get the workspace's slug. */
export function performAs<C extends Contract>(
  workspace: { slug: string },
  caller: Caller,
  useCase: UseCase<C>,
  input: {
    params?: Record<string, unknown>;
    query?: Request<C> extends { query?: infer Q } ? Q : unknown;
    body?: unknown;
  } = {},
): Promise<Answer<C>> {
  return perform(
    useCase,
    {
      ...caller,
      idempotencyKey: caller.idempotencyKey ?? (useCase.contract.idempotent ? randomUUID() : undefined),
    },
    { ...input, params: { workspace: workspace.slug, ...input.params } },
  );
}
