import { eq } from 'drizzle-orm';
import { credentials, users } from '@/db/schema/auth';
import { tubs } from '@/db/schema/collection';
import { members as memberRows, parties, workspaces } from '@/db/schema/workspace';
import { withScope } from '@/db/scope';
import type { PartyId, TubId, UserId, WorkspaceId } from '@/lib/contracts/ids';
import { signIn } from '@/lib/services/sign-in';
import { identify } from '../identify';
import { buyer, demoPassword, members, partners, type DemoPerson } from './people';

export const workspaceId = identify<WorkspaceId>('workspace kilnhouse');
export const slug = 'kilnhouse';
/** Takes the share for the building. */
export const housePartyId = identify<PartyId>('party house');

/** Whether the workspace of the scenario is there. Its own scope shows it, whoever is or is not a member. */
export async function isHouseThere(): Promise<boolean> {
  const found = await withScope({ workspaceId }, (tx) =>
    tx.select({ id: workspaces.id }).from(workspaces).where(eq(workspaces.slug, slug)),
  );
  return found.length > 0;
}

async function addAccount(person: DemoPerson, password: string): Promise<void> {
  const { userId, name, email } = person;
  await withScope({}, async (tx) => {
    await tx.insert(users).values({ id: userId, name, email, emailVerified: true }).onConflictDoNothing();
    await tx
      .insert(credentials)
      .values({
        id: `demo-credential-${person.key}`,
        accountId: userId,
        providerId: 'credential',
        userId,
        password,
      })
      .onConflictDoNothing();
  });
}

/** Everybody who can sign in; all addresses are verified. */
export async function addAccounts(): Promise<void> {
  const { password } = await signIn().$context;
  const hash = await password.hash(demoPassword);
  for (const person of [...members, buyer]) await addAccount(person, hash);
}

/** The workspace with its parties and members. */
export async function addHouse(joinedAt: Date): Promise<void> {
  await withScope({ workspaceId }, async (tx) => {
    await tx.insert(workspaces).values({
      id: workspaceId,
      slug,
      name: 'The Kilnhouse',
      facilityName: 'Kilnhouse, Unit 2',
      currency: 'USD',
      salesTaxBasisPoints: 725,
      invoicePrefix: 'KH-',
      limits: {
        minimumBreedingGrams: { male: 300, female: 350 },
        minimumBreedingMonths: { male: 12, female: 24 },
        inbreedingPerMille: 125,
      },
    });
    await tx
      .insert(parties)
      .values({ workspaceId, id: housePartyId, name: 'Kilnhouse building', kind: 'house', mark: 7 });
    for (const { partyId, name, mark, email } of partners) {
      if (partyId && mark !== null)
        await tx.insert(parties).values({ workspaceId, id: partyId, name, mark, email });
    }
    for (const { memberId, userId, role, partyId } of members) {
      if (role === 'buyer') continue;
      await tx
        .insert(memberRows)
        .values({ workspaceId, id: memberId, userId: userId satisfies UserId, role, partyId, joinedAt });
    }
  });
}

const racks = [
  { rack: 'A', room: 'Adults', rows: 4, columns: 6, purpose: 'adult' },
  { rack: 'B', room: 'Adults', rows: 4, columns: 6, purpose: 'adult' },
  { rack: 'H', room: 'Hatchlings', rows: 6, columns: 8, purpose: 'hatchling' },
  { rack: 'I', room: 'Hatchlings', rows: 2, columns: 1, purpose: 'incubator' },
] as const;

/** Two racks for adults, one for hatchlings and the incubator. */
export async function addTubs(): Promise<Record<'adult' | 'hatchling' | 'incubator', TubId[]>> {
  const byPurpose: Record<'adult' | 'hatchling' | 'incubator', TubId[]> = {
    adult: [],
    hatchling: [],
    incubator: [],
  };
  const rows = racks.flatMap(({ rack, room, rows: height, columns, purpose }) =>
    Array.from({ length: height * columns }, (_, index) => {
      const label = `${rack}${String(index + 1).padStart(2, '0')}`;
      const id = identify<TubId>(`tub ${label}`);
      byPurpose[purpose].push(id);
      return {
        workspaceId,
        id,
        room,
        rack,
        label,
        rowNumber: Math.floor(index / columns) + 1,
        columnNumber: (index % columns) + 1,
        purpose,
      };
    }),
  );
  await withScope({ workspaceId }, (tx) => tx.insert(tubs).values(rows));
  return byPurpose;
}
