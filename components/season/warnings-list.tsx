import { Notice } from '@/components/ui/notice';
import type { SeenFigures } from '@/lib/contracts/pairing';

/** What speaks against the pairing, and published cautions of welfare with their source. */
export function WarningsList({ figures }: { figures: Pick<SeenFigures, 'warnings' | 'cautions'> }) {
  if (figures.warnings.length === 0 && figures.cautions.length === 0) return null;
  return (
    <div className="flex flex-col gap-2">
      {figures.warnings.length > 0 ? (
        <Notice tone="straw">
          <ul className="list-disc space-y-1 pl-5">
            {figures.warnings.map(({ about, text }) => (
              <li key={`${about}${text}`}>{text}</li>
            ))}
          </ul>
        </Notice>
      ) : null}
      {figures.cautions.map(({ text, source }) => (
        <Notice key={text} tone="alarm" title="Welfare of the young">
          <p>{text}</p>
          <p className="mt-1 text-sm">
            Source: {source}. A veterinarian decides what is right for an animal.
          </p>
        </Notice>
      ))}
    </div>
  );
}
