import 'server-only';
import { findContact, updateContact } from '@/db/queries/contacts';
import { editContact } from '@/lib/contracts/contact';
import { recordAudit } from '../audit';
import { notFound, stale } from '../refusal';
import { workspaceUseCase } from '../world';

/** A contact is changed; a new follow-up day lets the reminder come again. */
export const editContactUseCase = workspaceUseCase(editContact, async (world, { params, body }) => {
  const { tx } = world;
  const contact = await findContact(tx, params.contact);
  if (!contact) throw notFound('contact');
  const { version, ...fields } = body;
  const followUpReminderSentOn =
    fields.followUpOn === contact.followUpOn ? contact.followUpReminderSentOn : null;
  if (!(await updateContact(tx, contact.id, version, { ...fields, followUpReminderSentOn })))
    throw stale('contact', contact.version);
  await recordAudit(world, { action: 'contact.edit', subject: { kind: 'contact', id: contact.id } });
  return { version: version + 1 };
});
