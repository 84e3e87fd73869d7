import type { Metadata } from 'next';
import { ImportScreen } from '@/components/collection/import-screen';
import { Prefetch, prefetched } from '@/lib/api/page';
import { listSpeciesUseCase } from '@/lib/use-cases/collection/list-species';

export const metadata: Metadata = { title: 'Import from CSV' };

export default async function ImportPage(props: { params: Promise<{ workspace: string }> }) {
  const { workspace } = await props.params;
  return (
    <Prefetch
      from={`/${workspace}/collection/import`}
      queries={[prefetched(listSpeciesUseCase, { params: { workspace } })]}
    >
      <ImportScreen />
    </Prefetch>
  );
}
