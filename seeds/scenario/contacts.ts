import { contactEvents, contacts } from '@/db/schema/sales';
import { withScope } from '@/db/scope';
import { addDays } from 'date-fns';
import type { ContactId } from '@/lib/contracts/ids';
import { dayFromNow } from '../calendar';
import { identify } from '../identify';
import { workspaceId } from './house';
import { buyer, maren } from './people';

interface Person {
  key: string;
  name: string;
  email: string;
  town: string;
  tags: string[];
  inquiry?: { days: number; body: string };
  followUp?: { days: number; note: string };
}

const people: Person[] = [
  {
    key: 'nadia',
    name: buyer.name,
    email: buyer.email,
    town: 'Larkspur Falls',
    tags: ['regular'],
    inquiry: { days: -20, body: 'Looks for a female that carries pied.' },
  },
  {
    key: 'oren',
    name: 'Oren Halloway',
    email: 'oren@buyers.example',
    town: 'Tilden Cross',
    tags: ['pied'],
    inquiry: { days: -9, body: 'Asks whether a pied pair of this season is still free.' },
    followUp: { days: 0, note: 'Send pictures of the pied hatchlings.' },
  },
  {
    key: 'lucia',
    name: 'Lucia Brandvold',
    email: 'lucia@buyers.example',
    town: 'Quarry Bend',
    tags: ['corn snake', 'first animal'],
    inquiry: { days: -4, body: 'First snake for the family; asks what an amelanistic corn snake needs.' },
    followUp: { days: -2, note: 'Answer the questions on feeding and housing.' },
  },
  {
    key: 'dmitri',
    name: 'Dmitri Aldous',
    email: 'dmitri@buyers.example',
    town: 'Northmere',
    tags: [],
    inquiry: { days: -31, body: 'Would trade a motley male.' },
    followUp: { days: 12, note: 'Tell him what was decided on the trade.' },
  },
  {
    key: 'hana',
    name: 'Hana Pellworth',
    email: 'hana@buyers.example',
    town: 'Eastwick Mill',
    tags: ['waits for lavender'],
  },
  { key: 'basil', name: 'Basil Ormerod', email: 'basil@buyers.example', town: 'Cobble Hythe', tags: [] },
];

/** Six invented buyers, some with a question and a day on which to come back to them. */
export async function addContacts(now: Date): Promise<void> {
  await withScope({ workspaceId }, async (tx) => {
    for (const { key, name, email, town, tags, inquiry, followUp } of people) {
      const id = identify<ContactId>(`contact ${key}`);
      await tx.insert(contacts).values({
        workspaceId,
        id,
        name,
        email,
        address: { street: '', postcode: '', town, region: '', country: 'United States' },
        tags,
        followUpOn: followUp ? dayFromNow(now, followUp.days) : null,
        followUpNote: followUp?.note ?? '',
      });
      if (inquiry) {
        await tx.insert(contactEvents).values({
          workspaceId,
          id: identify(`inquiry ${key}`),
          contactId: id,
          kind: 'inquiry',
          body: inquiry.body,
          happenedAt: addDays(now, inquiry.days),
          recordedBy: maren.memberId,
        });
      }
    }
  });
}
