import { Badge, type Tone } from '@/components/ui/badge';
import type { PairingRow } from '@/lib/contracts/pairing';

type Stated = Pick<PairingRow, 'status' | 'agreed' | 'of' | 'waitingFor' | 'waitsForMe'>;

/** The state of a pairing in the words of a person. */
export function sayPairingState({ status, agreed, of, waitingFor }: Stated): { text: string; tone: Tone } {
  if (status === 'agreed') return { text: 'Agreed', tone: 'moss' };
  if (status === 'withdrawn') return { text: 'Withdrawn', tone: 'neutral' };
  if (status === 'ended') return { text: 'Ended', tone: 'neutral' };
  if (status === 'draft') return { text: 'Draft', tone: 'neutral' };
  if (agreed + waitingFor.length < of) return { text: `Change asked, ${agreed} of ${of}`, tone: 'alarm' };
  return { text: `${agreed} of ${of} agreed`, tone: 'straw' };
}

export function PairingState({ row }: { row: Stated }) {
  const { text, tone } = sayPairingState(row);
  return <Badge tone={tone}>{text}</Badge>;
}
