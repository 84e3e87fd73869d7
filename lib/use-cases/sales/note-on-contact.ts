import 'server-only';
import { findContact, insertContactEvent } from '@/db/queries/contacts';
import { noteOnContact } from '@/lib/contracts/contact';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';

/** Something that happened with a contact is noted in its history. */
export const noteOnContactUseCase = workspaceUseCase(
  noteOnContact,
  async ({ tx, workspace, actor, now }, { params, body }) => {
    const contact = await findContact(tx, params.contact);
    if (!contact) throw notFound('contact');
    const id = await insertContactEvent(tx, {
      ...body,
      workspaceId: workspace.id,
      contactId: contact.id,
      happenedAt: now,
      recordedBy: actor.memberId,
    });
    return { id, ...body, happenedAt: now.toISOString(), by: actor.name };
  },
);
