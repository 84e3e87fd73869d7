import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { ProjectScreen } from '@/components/projects/project-screen';
import { Prefetch, prefetched } from '@/lib/api/page';
import { projectId } from '@/lib/contracts/ids';
import { showProjectUseCase } from '@/lib/use-cases/projects/show-project';

export const metadata: Metadata = { title: 'Joint project' };

export default async function ProjectPage(props: {
  params: Promise<{ workspace: string; project: string }>;
}) {
  const { workspace, project } = await props.params;
  const id = projectId.safeParse(project).data;
  if (!id) notFound();
  return (
    <Prefetch
      from={`/${workspace}/projects/${id}`}
      queries={[prefetched(showProjectUseCase, { params: { workspace, project: id } })]}
    >
      <ProjectScreen id={id} />
    </Prefetch>
  );
}
