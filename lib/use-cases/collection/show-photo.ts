import 'server-only';
import { findPhoto } from '@/db/queries/photos';
import { showPhoto } from '@/lib/contracts/photo';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';
import { smallKey } from './add-photo';

/** A member sees a photo of an animal that they may see. */
export const showPhotoUseCase = workspaceUseCase(
  showPhoto,
  async ({ tx, sees, services }, { params, query }) => {
    const found = await findPhoto(tx, sees, params.photo);
    const key = found && (query.size === 'small' ? smallKey(found.photo.storageKey) : found.photo.storageKey);
    const body = key ? await services.storage.read(key) : null;
    if (!found || !body) throw notFound('photo');
    return {
      body,
      contentType: found.photo.contentType,
      fileName: `${found.code}.webp`,
      inline: true,
      keepSeconds: 86_400,
    };
  },
);
