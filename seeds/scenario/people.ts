import type { MemberId, PartyId, UserId } from '@/lib/contracts/ids';
import type { Role } from '@/lib/contracts/roles';
import { identify } from '../identify';

/** Invented people of the demo; every address ends in a domain that can't exist. */
export interface DemoPerson {
  key: string;
  userId: UserId;
  name: string;
  email: string;
  role: Role | 'buyer';
  memberId: MemberId;
  partyId: PartyId | null;
  mark: number | null;
  /** What one would try with this account. */
  what: string;
}

function person(
  key: string,
  name: string,
  role: DemoPerson['role'],
  mark: number | null,
  what: string,
): DemoPerson {
  return {
    key,
    userId: `demo-${key}` as UserId,
    name,
    email: `${key}@kilnhouse.example`,
    role,
    memberId: identify<MemberId>(`member ${key}`),
    partyId: mark === null ? null : identify<PartyId>(`party ${key}`),
    mark,
    what,
  };
}

export const maren = person(
  'maren',
  'Maren Oyelowo',
  'owner',
  0,
  'runs the Kilnhouse and holds parts in both projects',
);
export const tobias = person(
  'tobias',
  'Tobias Wrenfield',
  'partner',
  1,
  'partner in both projects; two proposals wait for an answer',
);
export const ilse = person('ilse', 'Ilse Achterdal', 'partner', 2, 'partner in the Ember pieds only');
export const ravi = person(
  'ravi',
  'Ravi Quillon',
  'keeper',
  null,
  'does the daily work: logs, clutches and hatchlings, no prices',
);
const gwen = person(
  'gwen',
  'Gwen Farthingale',
  'accountant',
  null,
  'checks the ledger, closes periods, exports',
);
export const buyer = person(
  'nadia',
  'Nadia Verhoeven',
  'buyer',
  null,
  'bought an animal; signs in with a link by mail',
);

export const members = [maren, tobias, ilse, ravi, gwen];
export const partners = [maren, tobias, ilse];

/** One password for all demo accounts; they exist only in the demo. */
export const demoPassword = 'kilnhouse-demo';
