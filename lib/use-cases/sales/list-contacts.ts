import 'server-only';
import { listContactRows } from '@/db/queries/contacts';
import { listContacts } from '@/lib/contracts/contact';
import { workspaceUseCase } from '../world';

/** A member looks through the contacts. */
export const listContactsUseCase = workspaceUseCase(listContacts, async ({ tx, today }, { query }) => {
  const { due, offset, limit, ...filter } = query;
  const { rows, total } = await listContactRows(
    tx,
    { ...filter, dueBy: due ? today : undefined },
    { offset, limit },
  );
  return {
    rows: rows.map((row) => ({
      ...row,
      lastEventAt: row.lastEventAt && new Date(row.lastEventAt).toISOString(),
    })),
    total,
  };
});
