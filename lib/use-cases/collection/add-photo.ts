import 'server-only';
import { createHash } from 'node:crypto';
import { findAnimal } from '@/db/queries/animals';
import { countPhotos, insertPhoto } from '@/db/queries/photos';
import type { PhotoId } from '@/lib/contracts/ids';
import { addPhoto } from '@/lib/contracts/photo';
import { prepareImage } from '@/lib/services/images';
import { recordAudit } from '../audit';
import { invalid, notFound, Refusal } from '../refusal';
import { workspaceUseCase } from '../world';

const MOST_BYTES = 15 * 1024 * 1024;
const MOST_PHOTOS = 60;

/** The key of the thumbnail beside a photo. */
export const smallKey = (storageKey: string) => storageKey.replace(/\.webp$/, '-small.webp');

/** A member adds a photo to an animal. */
export const addPhotoUseCase = workspaceUseCase(addPhoto, async (world, { params, body }) => {
  const { tx, sees, workspace, services, today } = world;
  const animal = await findAnimal(tx, sees, params.animal);
  if (!animal) throw notFound('animal');
  if (body.file.size > MOST_BYTES) throw new Refusal('too_large', 'This photo is larger than 15 MB.');
  if (body.takenOn && body.takenOn > today) throw invalid('takenOn', 'This day has not come yet.');
  if ((await countPhotos(tx, animal.id)) >= MOST_PHOTOS)
    throw invalid('file', `${animal.code} has ${MOST_PHOTOS} photos already; remove one first.`);
  const image = await prepareImage(new Uint8Array(await body.file.arrayBuffer()));
  if (!image) {
    throw new Refusal(
      'unsupported_file',
      'This file is no picture that can be read here. Take a JPEG, PNG, WebP or GIF.',
      {
        errors: [
          {
            field: 'file',
            message: 'This file is no picture that can be read here. Take a JPEG, PNG, WebP or GIF.',
          },
        ],
      },
    );
  }
  const id = crypto.randomUUID() as PhotoId;
  const storageKey = `photos/${workspace.id}/${id}.webp`;
  await services.storage.write(storageKey, image.large, 'image/webp');
  await services.storage.write(smallKey(storageKey), image.small, 'image/webp');
  await insertPhoto(tx, {
    workspaceId: workspace.id,
    id,
    animalId: animal.id,
    storageKey,
    contentType: 'image/webp',
    width: image.width,
    height: image.height,
    sha256: createHash('sha256').update(image.large).digest('hex'),
    caption: body.caption,
    takenOn: body.takenOn ?? null,
  });
  await recordAudit(world, {
    action: 'photo.add',
    subject: { kind: 'animal', id: animal.id },
    detail: { code: animal.code, photo: id },
  });
  return { id };
});
