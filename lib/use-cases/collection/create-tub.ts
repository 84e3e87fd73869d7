import 'server-only';
import { findTubAt, insertTub } from '@/db/queries/tubs';
import type { TubId } from '@/lib/contracts/ids';
import { createTub } from '@/lib/contracts/tub';
import { recordAudit } from '../audit';
import { Refusal } from '../refusal';
import { workspaceUseCase } from '../world';

/** A member adds a tub to a rack. */
export const createTubUseCase = workspaceUseCase(createTub, async (world, { body }) => {
  const there = await findTubAt(world.tx, body);
  if (there) {
    const message = `${there.label} is already at row ${body.rowNumber}, column ${body.columnNumber} of this rack.`;
    throw new Refusal('already_exists', message, { errors: [{ field: 'rowNumber', message }] });
  }
  const id = crypto.randomUUID() as TubId;
  await insertTub(world.tx, { workspaceId: world.workspace.id, id, ...body });
  await recordAudit(world, {
    action: 'tub.create',
    subject: { kind: 'tub', id },
    detail: { label: body.label, rack: body.rack },
  });
  return { id };
});
