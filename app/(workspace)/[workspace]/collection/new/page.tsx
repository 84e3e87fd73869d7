import type { Metadata } from 'next';
import { NewAnimalScreen } from '@/components/collection/animal-form';
import { Prefetch, prefetched } from '@/lib/api/page';
import { listSpeciesUseCase } from '@/lib/use-cases/collection/list-species';

export const metadata: Metadata = { title: 'Add an animal' };

export default async function NewAnimalPage(props: { params: Promise<{ workspace: string }> }) {
  const { workspace } = await props.params;
  return (
    <Prefetch
      from={`/${workspace}/collection/new`}
      queries={[prefetched(listSpeciesUseCase, { params: { workspace } })]}
    >
      <NewAnimalScreen />
    </Prefetch>
  );
}
