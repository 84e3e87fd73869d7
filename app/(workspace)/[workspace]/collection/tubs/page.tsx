import type { Metadata } from 'next';
import { TubsScreen } from '@/components/collection/tubs-screen';
import { Prefetch, prefetched } from '@/lib/api/page';
import { listTubsUseCase } from '@/lib/use-cases/collection/list-tubs';

export const metadata: Metadata = { title: 'Tubs' };

export default async function TubsPage(props: { params: Promise<{ workspace: string }> }) {
  const { workspace } = await props.params;
  return (
    <Prefetch
      from={`/${workspace}/collection/tubs`}
      queries={[prefetched(listTubsUseCase, { params: { workspace } })]}
    >
      <TubsScreen />
    </Prefetch>
  );
}
