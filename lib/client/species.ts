'use client';

import { useQuery } from '@tanstack/react-query';
import { listAnimals } from '@/lib/contracts/animal-list';
import { showAnimal } from '@/lib/contracts/animal-record';
import type { Contract } from '@/lib/contracts/contract';
import { showLineage } from '@/lib/contracts/lineage';
import {
  createCombination,
  createLocus,
  editLocus,
  removeCombination,
  removeLocus,
} from '@/lib/contracts/locus';
import { createSpecies, editSpecies, listSpecies, showSpecies } from '@/lib/contracts/species-catalogue';
import { optionsOf, useContractMutation } from './queries';
import { useWorkspaceSlug } from './workspace';

/** Everything that is computed from a species and its loci. */
const geneticAnswers: readonly Contract[] = [listSpecies, showSpecies, listAnimals, showAnimal, showLineage];

export function useSpeciesList() {
  const workspace = useWorkspaceSlug();
  return useQuery({ ...optionsOf(listSpecies, { params: { workspace } }), staleTime: 60_000 });
}

/** A species with its loci; asks nothing while none is chosen. */
export function useSpecies(species: string) {
  const workspace = useWorkspaceSlug();
  return useQuery({
    ...optionsOf(showSpecies, { params: { workspace, species } }),
    enabled: species !== '',
    staleTime: 60_000,
  });
}

export const useCreateSpecies = () => useContractMutation(createSpecies, geneticAnswers);
export const useEditSpecies = () => useContractMutation(editSpecies, geneticAnswers);
export const useCreateLocus = () => useContractMutation(createLocus, geneticAnswers);
export const useEditLocus = () => useContractMutation(editLocus, geneticAnswers);
export const useRemoveLocus = () => useContractMutation(removeLocus, geneticAnswers);
export const useCreateCombination = () => useContractMutation(createCombination, geneticAnswers);
export const useRemoveCombination = () => useContractMutation(removeCombination, geneticAnswers);
