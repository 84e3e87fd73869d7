import { decideTermsUseCase } from '@/lib/use-cases/projects/decide-terms';
import { proposeTermsUseCase } from '@/lib/use-cases/projects/propose-terms';
import type { TermsDraft } from '@/lib/contracts/terms-content';
import { performAs, type TestWorkspace } from '../setup/fixture';

/** Terms for tests: half and half, 8% to the owner's party. */
export const draftFor = (workspace: TestWorkspace): TermsDraft => ({
  damSide: 1,
  sireSide: 1,
  houseShare: { partyId: workspace.owner.partyId!, basisPoints: 800 },
  costsFirst: false,
  cardFees: 'off_the_top',
  division: 'proceeds',
  clauses: { death: 'Each side carries its own loss.', exit: 'Six months.', notice: '' },
});

/** Has the owner propose terms for the first project and the partner agree to them. */
export async function agreeOnTerms(workspace: TestWorkspace): Promise<string> {
  const params = { project: workspace.projectId };
  const { id } = await performAs(workspace, workspace.owner, proposeTermsUseCase, {
    params,
    body: { content: draftFor(workspace), inForceFrom: '2024-01-01' },
  });
  await performAs(workspace, workspace.partner, decideTermsUseCase, {
    params: { ...params, terms: id },
    body: { decision: 'agreed' },
  });
  return id;
}
