import 'server-only';
import { deletePhoto, findPhoto } from '@/db/queries/photos';
import { removePhoto } from '@/lib/contracts/photo';
import { afterCommit } from '../after-commit';
import { recordAudit } from '../audit';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';
import { smallKey } from './add-photo';

/** A member removes a photo; its files go once that is certain. */
export const removePhotoUseCase = workspaceUseCase(removePhoto, async (world, { params }) => {
  const found = await findPhoto(world.tx, world.sees, params.photo);
  if (!found) throw notFound('photo');
  const { photo, code } = found;
  await deletePhoto(world.tx, photo.id);
  const { storage } = world.services;
  afterCommit(world.tx, async () => {
    await storage.remove(photo.storageKey);
    await storage.remove(smallKey(photo.storageKey));
  });
  await recordAudit(world, {
    action: 'photo.remove',
    subject: { kind: 'animal', id: photo.animalId },
    detail: { code, photo: photo.id },
  });
  return { done: true as const };
});
