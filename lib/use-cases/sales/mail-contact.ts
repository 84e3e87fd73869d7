import 'server-only';
import { findContact, insertContactEvent } from '@/db/queries/contacts';
import { mailContact } from '@/lib/contracts/contact';
import { recordAudit } from '../audit';
import { queueMail } from '../queue-mail';
import { notFound, Refusal } from '../refusal';
import { workspaceUseCase } from '../world';

/** A mail goes out to a contact and is noted in its history. */
export const mailContactUseCase = workspaceUseCase(mailContact, async (world, { params, body }) => {
  const { tx, workspace, actor, now } = world;
  const contact = await findContact(tx, params.contact);
  if (!contact) throw notFound('contact');
  if (!contact.email) throw new Refusal('wrong_state', 'This contact has no mail address. Add one first.');
  await queueMail(world, {
    workspaceId: workspace.id,
    contactId: contact.id,
    template: 'contact-mail',
    to: contact.email,
    data: { ...body, seller: workspace.name },
  });
  const event = { kind: 'mail' as const, body: `${body.subject}\n\n${body.text}` };
  const id = await insertContactEvent(tx, {
    ...event,
    workspaceId: workspace.id,
    contactId: contact.id,
    happenedAt: now,
    recordedBy: actor.memberId,
  });
  await recordAudit(world, {
    action: 'contact.mail',
    subject: { kind: 'contact', id: contact.id },
    detail: { subject: body.subject },
  });
  return { id, ...event, happenedAt: now.toISOString(), by: actor.name };
});
