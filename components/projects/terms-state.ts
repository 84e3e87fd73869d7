import type { Tone } from '@/components/ui/badge';
import type { TermsStatus } from '@/lib/contracts/project';

/** The state of a version of terms in the words of a person. */
export function termsState({
  status,
  inForce,
  agreed,
  of,
}: {
  status: TermsStatus;
  inForce: boolean;
  agreed: number;
  of: number;
}): { text: string; tone: Tone } {
  if (status === 'withdrawn') return { text: 'Withdrawn', tone: 'neutral' };
  if (status === 'draft') return { text: 'Draft', tone: 'neutral' };
  if (status === 'proposed') return { text: `${agreed} of ${of} agreed`, tone: 'straw' };
  return inForce ? { text: 'In force', tone: 'moss' } : { text: 'Agreed', tone: 'slate' };
}
