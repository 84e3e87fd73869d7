import type { Metadata } from 'next';
import { ProjectsScreen } from '@/components/projects/projects-screen';
import { Prefetch, prefetched } from '@/lib/api/page';
import { listProjectsUseCase } from '@/lib/use-cases/projects/list-projects';

export const metadata: Metadata = { title: 'Joint projects' };

export default async function ProjectsPage(props: { params: Promise<{ workspace: string }> }) {
  const { workspace } = await props.params;
  return (
    <Prefetch
      from={`/${workspace}/projects`}
      queries={[prefetched(listProjectsUseCase, { params: { workspace } })]}
    >
      <ProjectsScreen />
    </Prefetch>
  );
}
