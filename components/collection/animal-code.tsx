import { CodeTag } from '@/components/ui/code-tag';
import { VisuallyHidden } from '@/components/ui/visually-hidden';
import type { Sex } from '@/lib/contracts/animal';
import { sexSigns, sexWords } from './words';

/** An animal's code with the sign of its sex, as on its label. */
export function AnimalCode({ code, sex, size }: { code: string; sex: Sex; size?: 'sm' | 'md' | 'lg' }) {
  return (
    <CodeTag
      size={size}
      lead={
        <>
          <span aria-hidden className="text-ink-3">
            {sexSigns[sex]}
          </span>
          <VisuallyHidden>{sexWords[sex]}</VisuallyHidden>
        </>
      }
    >
      {code}
    </CodeTag>
  );
}
