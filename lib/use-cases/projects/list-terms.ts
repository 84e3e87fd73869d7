import 'server-only';
import { findTermsInForce } from '@/db/queries/clutches';
import { findProject } from '@/db/queries/projects';
import { listTerms } from '@/lib/contracts/terms';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';
import { presentTerms } from './present-terms';
import { loadTermsStandings } from './terms-standing';

/** A party reads every version of a project's terms. */
export const listTermsUseCase = workspaceUseCase(listTerms, async (world, { params }) => {
  const { tx, sees, today } = world;
  if (!(await findProject(tx, sees, params.project))) throw notFound('project');
  const { versions } = await loadTermsStandings(world, params.project);
  const inForce = await findTermsInForce(tx, params.project, today);
  return { versions: versions.map((version) => presentTerms(version, inForce?.id ?? null)) };
});
