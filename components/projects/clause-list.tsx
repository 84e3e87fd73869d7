import type { ClauseLine } from '@/lib/contracts/terms';

/** Terms clause by clause; where a clause differs from the version before, both stand beside one another. */
export function ClauseList({
  clauses,
  comparedWith,
}: {
  clauses: readonly ClauseLine[];
  comparedWith: number | null;
}) {
  return (
    <dl className="divide-y divide-rule-2">
      {clauses.map((clause) => (
        <div
          key={clause.title}
          className={`grid gap-x-5 gap-y-0.5 py-2.5 text-base sm:grid-cols-[11rem_minmax(0,1fr)] ${clause.changed ? '-mx-3 rounded-lg bg-chosen px-3' : ''}`}
        >
          <dt className="text-ink-2">
            {clause.title}
            {clause.changed ? <span className="block text-sm font-semibold text-ember">changed</span> : null}
          </dt>
          <dd className="min-w-0 break-words whitespace-pre-line">
            {clause.changed && comparedWith !== null ? (
              <>
                <span className="block font-semibold">{clause.text}</span>
                <span className="block text-sm text-ink-3">
                  version {comparedWith}: <del>{clause.before ?? 'not said'}</del>
                </span>
              </>
            ) : (
              clause.text
            )}
          </dd>
        </div>
      ))}
    </dl>
  );
}
