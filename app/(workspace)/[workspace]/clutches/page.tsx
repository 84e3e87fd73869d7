import type { Metadata } from 'next';
import { ClutchesScreen } from '@/components/clutches/clutches-screen';
import { Prefetch, prefetched } from '@/lib/api/page';
import { listClutchesUseCase } from '@/lib/use-cases/season/list-clutches';

export const metadata: Metadata = { title: 'Clutches' };

export default async function ClutchesPage(props: { params: Promise<{ workspace: string }> }) {
  const { workspace } = await props.params;
  return (
    <Prefetch
      from={`/${workspace}/clutches`}
      queries={[prefetched(listClutchesUseCase, { params: { workspace }, query: {} })]}
    >
      <ClutchesScreen />
    </Prefetch>
  );
}
