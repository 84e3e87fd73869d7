import type { Metadata } from 'next';
import { EditAnimalScreen } from '@/components/collection/animal-form';
import { Prefetch, prefetched } from '@/lib/api/page';
import type { AnimalId } from '@/lib/contracts/ids';
import { listSpeciesUseCase } from '@/lib/use-cases/collection/list-species';
import { showAnimalUseCase } from '@/lib/use-cases/collection/show-animal';

export const metadata: Metadata = { title: 'Edit an animal' };

export default async function EditAnimalPage(props: {
  params: Promise<{ workspace: string; animal: string }>;
}) {
  const { workspace, animal } = await props.params;
  return (
    <Prefetch
      from={`/${workspace}/collection/${animal}/edit`}
      queries={[
        prefetched(showAnimalUseCase, { params: { workspace, animal } }),
        prefetched(listSpeciesUseCase, { params: { workspace } }),
      ]}
    >
      <EditAnimalScreen id={animal as AnimalId} />
    </Prefetch>
  );
}
