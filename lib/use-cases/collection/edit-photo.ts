import 'server-only';
import { findPhoto, showPhotoFirst, updateCaption } from '@/db/queries/photos';
import { editPhoto } from '@/lib/contracts/photo';
import { recordAudit } from '../audit';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';

/** A member captions a photo or puts it first. */
export const editPhotoUseCase = workspaceUseCase(editPhoto, async (world, { params, body }) => {
  const found = await findPhoto(world.tx, world.sees, params.photo);
  if (!found) throw notFound('photo');
  const { photo, code } = found;
  if (body.caption !== undefined) await updateCaption(world.tx, photo.id, body.caption);
  if (body.first) await showPhotoFirst(world.tx, photo.animalId, photo.id);
  await recordAudit(world, {
    action: 'photo.edit',
    subject: { kind: 'animal', id: photo.animalId },
    detail: { code, photo: photo.id, ...body },
  });
  return { done: true as const };
});
