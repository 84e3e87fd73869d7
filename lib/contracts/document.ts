import { z } from 'zod';
import { inAnimal } from './animal-record';
import { contract, done, fileAnswer, inWorkspace } from './contract';
import { documentId } from './ids';

const file = z.custom<File>((value) => value instanceof File && value.size > 0, 'Choose a file.');
const inDocument = inWorkspace.extend({ document: documentId });

export const addDocument = contract({
  id: 'documents.add',
  method: 'POST',
  path: '/workspaces/{workspace}/animals/{animal}/documents',
  summary: 'Keep a PDF, picture or text with an animal; it is known by its content, not by its name',
  access: { scope: 'workspace', action: 'animal.edit' },
  params: inAnimal,
  body: z.object({ file, name: z.string().trim().max(120).optional() }),
  response: z.object({ id: documentId }),
  consumes: 'multipart/form-data',
});

export const showDocument = contract({
  id: 'documents.show',
  method: 'GET',
  path: '/workspaces/{workspace}/documents/{document}',
  summary: 'A document of an animal, for those who may see the animal',
  access: { scope: 'workspace', action: 'animal.see' },
  params: inDocument,
  response: fileAnswer,
  produces: 'application/octet-stream',
});

export const removeDocument = contract({
  id: 'documents.remove',
  method: 'DELETE',
  path: '/workspaces/{workspace}/documents/{document}',
  summary: 'Remove a document from an animal',
  access: { scope: 'workspace', action: 'animal.edit' },
  params: inDocument,
  response: done,
});
