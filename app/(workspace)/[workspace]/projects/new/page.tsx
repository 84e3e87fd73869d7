import type { Metadata } from 'next';
import { NewProjectScreen } from '@/components/projects/project-form';
import { Prefetch, prefetched } from '@/lib/api/page';
import { listSpeciesUseCase } from '@/lib/use-cases/collection/list-species';

export const metadata: Metadata = { title: 'Start a joint project' };

export default async function NewProjectPage(props: { params: Promise<{ workspace: string }> }) {
  const { workspace } = await props.params;
  return (
    <Prefetch
      from={`/${workspace}/projects/new`}
      queries={[prefetched(listSpeciesUseCase, { params: { workspace } })]}
    >
      <NewProjectScreen />
    </Prefetch>
  );
}
