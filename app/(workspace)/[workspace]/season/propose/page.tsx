import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { ProposeScreen } from '@/components/season/propose-screen';
import { Prefetch, prefetched } from '@/lib/api/page';
import { pairingId, projectId } from '@/lib/contracts/ids';
import { listProjectsUseCase } from '@/lib/use-cases/projects/list-projects';
import { showPairingUseCase } from '@/lib/use-cases/season/show-pairing';

export const metadata: Metadata = { title: 'Propose a pairing' };

export default async function ProposePage(props: {
  params: Promise<{ workspace: string }>;
  searchParams: Promise<{ again?: string; project?: string }>;
}) {
  const { workspace } = await props.params;
  const search = await props.searchParams;
  const again = search.again === undefined ? null : (pairingId.safeParse(search.again).data ?? notFound());
  const queries = again
    ? [prefetched(showPairingUseCase, { params: { workspace, pairing: again } })]
    : [prefetched(listProjectsUseCase, { params: { workspace } })];
  return (
    <Prefetch from={`/${workspace}/season/propose`} queries={queries}>
      <ProposeScreen again={again} project={projectId.safeParse(search.project).data ?? null} />
    </Prefetch>
  );
}
