import type { Metadata } from 'next';
import { createLoader, type SearchParams } from 'nuqs/server';
import { CollectionScreen } from '@/components/collection/collection-screen';
import { listParams, listQueryOf } from '@/components/collection/list-params';
import { Prefetch, prefetched } from '@/lib/api/page';
import { listAnimalsUseCase } from '@/lib/use-cases/collection/list-animals';
import { listSpeciesUseCase } from '@/lib/use-cases/collection/list-species';
import { showAnimalUseCase } from '@/lib/use-cases/collection/show-animal';

export const metadata: Metadata = { title: 'Animal' };

const loadState = createLoader(listParams);

/** The list of animals with the record of one beside it. */
export default async function AnimalPage(props: {
  params: Promise<{ workspace: string; animal: string }>;
  searchParams: Promise<SearchParams>;
}) {
  const { workspace, animal } = await props.params;
  const params = { workspace };
  const query = listQueryOf(await loadState(props.searchParams));
  return (
    <Prefetch
      from={`/${workspace}/collection/${animal}`}
      queries={[
        prefetched(showAnimalUseCase, { params: { workspace, animal } }),
        prefetched(listAnimalsUseCase, { params, query }),
        prefetched(listSpeciesUseCase, { params }),
      ]}
    >
      <CollectionScreen />
    </Prefetch>
  );
}
