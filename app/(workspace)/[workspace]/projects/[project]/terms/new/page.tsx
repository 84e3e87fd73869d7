import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { TermsEditorScreen } from '@/components/projects/terms-editor-screen';
import { Prefetch, prefetched } from '@/lib/api/page';
import { projectId } from '@/lib/contracts/ids';
import { listTermsUseCase } from '@/lib/use-cases/projects/list-terms';
import { showProjectUseCase } from '@/lib/use-cases/projects/show-project';

export const metadata: Metadata = { title: 'Propose terms' };

export default async function NewTermsPage(props: {
  params: Promise<{ workspace: string; project: string }>;
}) {
  const { workspace, project } = await props.params;
  const id = projectId.safeParse(project).data;
  if (!id) notFound();
  const params = { workspace, project: id };
  return (
    <Prefetch
      from={`/${workspace}/projects/${id}/terms/new`}
      queries={[prefetched(showProjectUseCase, { params }), prefetched(listTermsUseCase, { params })]}
    >
      <TermsEditorScreen project={id} />
    </Prefetch>
  );
}
