import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { ClutchScreen } from '@/components/clutches/clutch-screen';
import { Prefetch, prefetched } from '@/lib/api/page';
import { clutchId } from '@/lib/contracts/ids';
import { showClutchUseCase } from '@/lib/use-cases/season/show-clutch';

export const metadata: Metadata = { title: 'Clutch' };

export default async function ClutchPage(props: { params: Promise<{ workspace: string; clutch: string }> }) {
  const { workspace, clutch } = await props.params;
  const id = clutchId.safeParse(clutch).data;
  if (!id) notFound();
  return (
    <Prefetch
      from={`/${workspace}/clutches/${id}`}
      queries={[prefetched(showClutchUseCase, { params: { workspace, clutch: id } })]}
    >
      <ClutchScreen id={id} />
    </Prefetch>
  );
}
