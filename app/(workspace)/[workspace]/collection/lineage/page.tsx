import type { Metadata } from 'next';
import { LineageScreen } from '@/components/collection/lineage-screen';
import { Prefetch, prefetched } from '@/lib/api/page';
import { listSpeciesUseCase } from '@/lib/use-cases/collection/list-species';

export const metadata: Metadata = { title: 'Lineage' };

/** The graph is fetched by the browser, as it can be drawn there only. */
export default async function LineagePage(props: { params: Promise<{ workspace: string }> }) {
  const { workspace } = await props.params;
  return (
    <Prefetch
      from={`/${workspace}/collection/lineage`}
      queries={[prefetched(listSpeciesUseCase, { params: { workspace } })]}
    >
      <LineageScreen />
    </Prefetch>
  );
}
