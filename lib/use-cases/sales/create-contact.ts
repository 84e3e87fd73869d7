import 'server-only';
import { insertContact } from '@/db/queries/contacts';
import { createContact } from '@/lib/contracts/contact';
import { recordAudit } from '../audit';
import { workspaceUseCase } from '../world';

/** A buyer or another contact is added. */
export const createContactUseCase = workspaceUseCase(createContact, async (world, { body }) => {
  const id = await insertContact(world.tx, { ...body, workspaceId: world.workspace.id });
  await recordAudit(world, {
    action: 'contact.create',
    subject: { kind: 'contact', id },
    detail: { name: body.name },
  });
  return { id };
});
