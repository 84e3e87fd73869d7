import { classNames } from '@/components/ui/class-names';
import { partnerMark } from './partner-marks';
import { PatternFill, PatternSwatch } from './pattern-fill';

/** A holder of integer parts. `partner` is the position in the fixed order of partners, which gives colour and pattern. */
export type Share = { partner: number; name: string; parts: number };

export type ShareStripSize = 'xs' | 'sm' | 'md' | 'lg';

const heights: Record<ShareStripSize, string> = { xs: 'h-1.5', sm: 'h-2', md: 'h-3', lg: 'h-5' };
const scales: Record<ShareStripSize, number> = { xs: 4, sm: 5, md: 6, lg: 7 };

function inOrder(shares: readonly Share[]): Share[] {
  return shares.filter((share) => share.parts > 0).sort((a, b) => a.partner - b.partner);
}

/** "Odile 2 of 4, Bram 1 of 4": the strip in words. */
export function describeShares(shares: readonly Share[]): string {
  const held = inOrder(shares);
  const total = held.reduce((sum, share) => sum + share.parts, 0);
  if (held.length === 0) return 'nobody holds a part';
  if (held.length === 1) return `${held[0]?.name}, the whole`;
  return held.map((share) => `${share.name} ${share.parts} of ${total}`).join(', ');
}

/** Largest-remainder percentages in whole numbers that add up to 100, for labels only; parts are what counts. */
function wholePercents(parts: readonly number[]): number[] {
  const total = parts.reduce((sum, part) => sum + part, 0);
  const floors = parts.map((part) => Math.floor((part * 100) / total));
  let left = 100 - floors.reduce((sum, floor) => sum + floor, 0);
  const order = parts
    .map((part, index) => ({ index, rest: (part * 100) % total }))
    .sort((a, b) => b.rest - a.rest);
  for (const { index } of order) {
    if (left <= 0) break;
    floors[index] = (floors[index] ?? 0) + 1;
    left -= 1;
  }
  return floors;
}

/**
 * Who owns a thing: a strip divided exactly in proportion to integer parts, always in the order of partners. Boundaries
 * stand at exact proportions; the thin gap is taken from both neighbours alike.
 */
export function ShareStrip({
  shares,
  size = 'sm',
  labels = 'none',
  label,
  className,
}: {
  shares: readonly Share[];
  size?: ShareStripSize;
  /** `parts`: "Odile 2 of 4"; `percent`: "Odile 48%"; `names`. They wrap and never overlap. */
  labels?: 'none' | 'names' | 'parts' | 'percent';
  /** What the strip is about, spoken before the shares: "Owned by". */
  label?: string;
  className?: string;
}) {
  const held = inOrder(shares);
  const total = held.reduce((sum, share) => sum + share.parts, 0);
  const percents = labels === 'percent' ? wholePercents(held.map((share) => share.parts)) : [];
  const said = `${label ? `${label}: ` : ''}${describeShares(shares)}`;
  const starts = held.map((_, index) => held.slice(0, index).reduce((sum, share) => sum + share.parts, 0));

  return (
    <div className={classNames('min-w-0', className)}>
      <div
        role="img"
        aria-label={said}
        title={labels === 'none' ? said : undefined}
        className={classNames(
          'relative w-full overflow-hidden rounded-[2px]',
          heights[size],
          held.length === 0 && 'bg-track',
        )}
      >
        {held.map((share, index) => {
          const start = starts[index] ?? 0;
          return (
            <div
              key={`${share.partner}-${share.name}`}
              className="absolute inset-y-0"
              style={{
                left: `calc(${(start / total) * 100}% + ${index > 0 ? 0.75 : 0}px)`,
                right: `calc(${(1 - (start + share.parts) / total) * 100}% + ${index < held.length - 1 ? 0.75 : 0}px)`,
              }}
            >
              <PatternFill mark={partnerMark(share.partner)} scale={scales[size]} />
            </div>
          );
        })}
      </div>
      {labels === 'none' ? null : (
        // Spoken by the strip already.
        <ul
          aria-hidden
          className={classNames(
            'mt-1 flex flex-wrap gap-x-4 gap-y-0.5 text-sm',
            held.length <= 3 && 'justify-between',
          )}
        >
          {held.map((share, index) => {
            const mark = partnerMark(share.partner);
            return (
              <li
                key={`${share.partner}-${share.name}`}
                className="flex items-baseline gap-1.5 whitespace-nowrap"
              >
                <PatternSwatch mark={mark} className="size-2.5" />
                <span className="font-semibold" style={{ color: mark.text }}>
                  {share.name}
                </span>
                {labels === 'names' ? null : (
                  <span className="font-mono text-ink-2">
                    {labels === 'percent'
                      ? `${percents[index]}%`
                      : held.length === 1
                        ? 'the whole'
                        : `${share.parts} of ${total}`}
                  </span>
                )}
              </li>
            );
          })}
        </ul>
      )}
    </div>
  );
}
