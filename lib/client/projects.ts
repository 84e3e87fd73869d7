'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import type { ProjectId, TermsId } from '@/lib/contracts/ids';
import { createProject, editProject, listProjects, showProject } from '@/lib/contracts/project';
import { showWorkspace } from '@/lib/contracts/session';
import {
  decideTerms,
  listTerms,
  previewTerms,
  proposeTerms,
  showTerms,
  withdrawTerms,
} from '@/lib/contracts/terms';
import { optionsOf, useContractMutation } from './queries';
import { request, type RequestError } from './request';
import { useWorkspaceSlug } from './workspace';

const projectAnswers = [listProjects, showProject, showWorkspace];
const termsAnswers = [listTerms, showTerms, showProject, listProjects];

export function useProjects(query: z.input<typeof listProjects.query> = {}) {
  const workspace = useWorkspaceSlug();
  return useQuery(optionsOf(listProjects, { params: { workspace }, query }));
}

export function useProject(project: ProjectId) {
  const workspace = useWorkspaceSlug();
  return useQuery(optionsOf(showProject, { params: { workspace, project } }));
}
export const useCreateProject = () => useContractMutation(createProject, projectAnswers);
export const useEditProject = () => useContractMutation(editProject, projectAnswers);

export function useTermsList(project: ProjectId) {
  const workspace = useWorkspaceSlug();
  return useQuery(optionsOf(listTerms, { params: { workspace, project } }));
}

export function useTerms(project: ProjectId, terms: TermsId) {
  const workspace = useWorkspaceSlug();
  return useQuery(optionsOf(showTerms, { params: { workspace, project, terms } }));
}
export const useProposeTerms = () => useContractMutation(proposeTerms, termsAnswers);
export const useDecideTerms = () => useContractMutation(decideTerms, termsAnswers);
export const useWithdrawTerms = () => useContractMutation(withdrawTerms, termsAnswers);

/** How an example sale would be split by drafted terms; the last answer stays while the next is fetched. */
export function useTermsPreview(project: ProjectId, body: z.input<typeof previewTerms.body>) {
  const workspace = useWorkspaceSlug();
  return useQuery<z.output<typeof previewTerms.response>, RequestError>({
    queryKey: [previewTerms.id, workspace, project, body],
    queryFn: ({ signal }) => request(previewTerms, { params: { workspace, project }, body }, { signal }),
    placeholderData: keepPreviousData,
    retry: false,
  });
}
