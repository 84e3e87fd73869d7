import type { Metadata } from 'next';
import { SpeciesScreen } from '@/components/collection/species-screen';
import { Prefetch, prefetched } from '@/lib/api/page';
import { listSpeciesUseCase } from '@/lib/use-cases/collection/list-species';

export const metadata: Metadata = { title: 'Species and loci' };

export default async function SpeciesPage(props: { params: Promise<{ workspace: string }> }) {
  const { workspace } = await props.params;
  return (
    <Prefetch
      from={`/${workspace}/collection/species`}
      queries={[prefetched(listSpeciesUseCase, { params: { workspace } })]}
    >
      <SpeciesScreen />
    </Prefetch>
  );
}
