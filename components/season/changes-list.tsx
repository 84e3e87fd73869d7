import { sayDay } from '@/components/drawings/season-days';
import type { VersionChange } from '@/lib/contracts/agreement';

/** What differs from the version before: old struck through, new after the arrow. */
export function ChangesList({ changes }: { changes: readonly VersionChange[] }) {
  if (changes.length === 0)
    return <p className="text-base text-ink-3">Nothing that is shown here differs.</p>;
  return (
    <dl className="flex flex-col gap-1.5 text-base">
      {changes.map(({ what, before, after }) => (
        <div key={what} className="flex flex-wrap gap-x-2">
          <dt className="text-ink-2">{what}</dt>
          <dd className="min-w-0 break-words">
            {before ? (
              <>
                <del className="text-ink-3">{say(before)}</del> <span aria-hidden>→</span>
                <span className="sr-only">is now</span>{' '}
              </>
            ) : null}
            <ins className="font-semibold no-underline">{say(after) || 'nothing'}</ins>
          </dd>
        </div>
      ))}
    </dl>
  );
}

/** Days cross the wire as ISO 8601 and are told as people write them. */
const say = (value: string) => (/^\d{4}-\d{2}-\d{2}$/.test(value) ? sayDay(value) : value);
