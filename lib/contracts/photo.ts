import { z } from 'zod';
import { inAnimal } from './animal-record';
import { contract, done, fileAnswer, inWorkspace, isoDay } from './contract';
import { photoId } from './ids';

const file = z.custom<File>((value) => value instanceof File && value.size > 0, 'Choose a file.');
const inPhoto = inWorkspace.extend({ photo: photoId });

export const addPhoto = contract({
  id: 'photos.add',
  method: 'POST',
  path: '/workspaces/{workspace}/animals/{animal}/photos',
  summary: 'Add a photo; it is read by its content, turned upright, freed of its metadata and made smaller',
  access: { scope: 'workspace', action: 'animal.edit' },
  params: inAnimal,
  body: z.object({ file, caption: z.string().trim().max(200).default(''), takenOn: isoDay.optional() }),
  response: z.object({ id: photoId }),
  consumes: 'multipart/form-data',
});

export const showPhoto = contract({
  id: 'photos.show',
  method: 'GET',
  path: '/workspaces/{workspace}/photos/{photo}',
  summary: 'A photo, for those who may see the animal',
  access: { scope: 'workspace', action: 'animal.see' },
  params: inPhoto,
  query: z.object({ size: z.enum(['large', 'small']).default('large') }),
  response: fileAnswer,
  produces: 'image/webp',
});

export const editPhoto = contract({
  id: 'photos.edit',
  method: 'PATCH',
  path: '/workspaces/{workspace}/photos/{photo}',
  summary: 'Change the caption of a photo, or show it first',
  access: { scope: 'workspace', action: 'animal.edit' },
  params: inPhoto,
  body: z.object({ caption: z.string().trim().max(200).optional(), first: z.literal(true).optional() }),
  response: done,
});

export const removePhoto = contract({
  id: 'photos.remove',
  method: 'DELETE',
  path: '/workspaces/{workspace}/photos/{photo}',
  summary: 'Remove a photo',
  access: { scope: 'workspace', action: 'animal.edit' },
  params: inPhoto,
  response: done,
});
