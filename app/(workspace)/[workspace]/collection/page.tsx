import type { Metadata } from 'next';
import { createLoader, type SearchParams } from 'nuqs/server';
import { CollectionScreen } from '@/components/collection/collection-screen';
import { listParams, listQueryOf } from '@/components/collection/list-params';
import { Prefetch, prefetched } from '@/lib/api/page';
import { listAnimalsUseCase } from '@/lib/use-cases/collection/list-animals';
import { listSpeciesUseCase } from '@/lib/use-cases/collection/list-species';

export const metadata: Metadata = { title: 'Collection' };

const loadState = createLoader(listParams);

/** The list of animals; its filters stand in the address. */
export default async function CollectionPage(props: {
  params: Promise<{ workspace: string }>;
  searchParams: Promise<SearchParams>;
}) {
  const { workspace } = await props.params;
  const params = { workspace };
  const query = listQueryOf(await loadState(props.searchParams));
  return (
    <Prefetch
      from={`/${workspace}/collection`}
      queries={[
        prefetched(listAnimalsUseCase, { params, query }),
        prefetched(listSpeciesUseCase, { params }),
      ]}
    >
      <CollectionScreen />
    </Prefetch>
  );
}
