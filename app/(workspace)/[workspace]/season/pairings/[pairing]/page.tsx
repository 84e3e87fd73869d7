import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { PairingScreen } from '@/components/season/pairing-screen';
import { Prefetch, prefetched } from '@/lib/api/page';
import { pairingId } from '@/lib/contracts/ids';
import { showPairingUseCase } from '@/lib/use-cases/season/show-pairing';

export const metadata: Metadata = { title: 'Pairing' };

export default async function PairingPage(props: {
  params: Promise<{ workspace: string; pairing: string }>;
  searchParams: Promise<{ decide?: string }>;
}) {
  const { workspace, pairing } = await props.params;
  const { decide } = await props.searchParams;
  const id = pairingId.safeParse(pairing).data;
  if (!id) notFound();
  const from = `/${workspace}/season/pairings/${id}${decide === '1' ? '?decide=1' : ''}`;
  return (
    <Prefetch from={from} queries={[prefetched(showPairingUseCase, { params: { workspace, pairing: id } })]}>
      <PairingScreen id={id} />
    </Prefetch>
  );
}
