'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import { importAnimals, previewImport } from '@/lib/contracts/animal-import';
import { changeAnimals, exportAnimals, listAnimals } from '@/lib/contracts/animal-list';
import { recordOwnership } from '@/lib/contracts/animal-ownership';
import {
  addWeight,
  createAnimal,
  editAnimal,
  proposeCode,
  removeWeight,
  showAnimal,
} from '@/lib/contracts/animal-record';
import type { Contract } from '@/lib/contracts/contract';
import { addDocument, removeDocument, showDocument } from '@/lib/contracts/document';
import type { AnimalId, DocumentId, PhotoId, SpeciesId } from '@/lib/contracts/ids';
import { showLineage } from '@/lib/contracts/lineage';
import { addPhoto, editPhoto, removePhoto, showPhoto } from '@/lib/contracts/photo';
import { createTub, listTubs } from '@/lib/contracts/tub';
import { optionsOf, useContractMutation } from './queries';
import { addressOf } from './request';
import { useWorkspaceSlug } from './workspace';

export type AnimalListQuery = z.input<typeof listAnimals.query>;

/** Answers that change with an animal. */
const animalAnswers: readonly Contract[] = [listAnimals, showAnimal, showLineage, listTubs, proposeCode];

/** Animals that match; the rows before stay in sight while the next are fetched. */
export function useAnimals(query: AnimalListQuery) {
  const workspace = useWorkspaceSlug();
  return useQuery({
    ...optionsOf(listAnimals, { params: { workspace }, query }),
    placeholderData: keepPreviousData,
  });
}

export function useAnimal(animal: AnimalId | null) {
  const workspace = useWorkspaceSlug();
  return useQuery({
    ...optionsOf(showAnimal, { params: { workspace, animal: animal ?? '' } }),
    enabled: animal !== null,
  });
}

export function useProposedCode(species: SpeciesId | '') {
  const workspace = useWorkspaceSlug();
  return useQuery({
    ...optionsOf(proposeCode, { params: { workspace }, query: { species } }),
    enabled: species !== '',
    staleTime: 0,
  });
}

export const useCreateAnimal = () => useContractMutation(createAnimal, animalAnswers);
export const useEditAnimal = () => useContractMutation(editAnimal, animalAnswers);
export const useChangeAnimals = () => useContractMutation(changeAnimals, animalAnswers);
export const useRecordOwnership = () => useContractMutation(recordOwnership, animalAnswers);
export const useAddWeight = () => useContractMutation(addWeight, animalAnswers);
export const useRemoveWeight = () => useContractMutation(removeWeight, animalAnswers);
export const useAddPhoto = () => useContractMutation(addPhoto, [listAnimals, showAnimal]);
export const useEditPhoto = () => useContractMutation(editPhoto, [listAnimals, showAnimal]);
export const useRemovePhoto = () => useContractMutation(removePhoto, [listAnimals, showAnimal]);
export const useAddDocument = () => useContractMutation(addDocument, [showAnimal]);
export const useRemoveDocument = () => useContractMutation(removeDocument, [showAnimal]);
export const usePreviewImport = () => useContractMutation(previewImport);
export const useImportAnimals = () => useContractMutation(importAnimals, animalAnswers);

export function useTubs(enabled = true) {
  const workspace = useWorkspaceSlug();
  return useQuery({ ...optionsOf(listTubs, { params: { workspace } }), enabled });
}
export const useCreateTub = () => useContractMutation(createTub, [listTubs]);

/** Addresses of files, for pictures and links. */
export function useFileAddresses() {
  const workspace = useWorkspaceSlug();
  return {
    photo: (photo: PhotoId, size: 'large' | 'small') =>
      addressOf(showPhoto, { params: { workspace, photo }, query: { size } }),
    document: (document: DocumentId) => addressOf(showDocument, { params: { workspace, document } }),
    csv: (query: z.input<typeof exportAnimals.query>) =>
      addressOf(exportAnimals, { params: { workspace }, query }),
  };
}
