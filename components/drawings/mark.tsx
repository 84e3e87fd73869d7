/** The mark of the product: one whole of two halves. */
export function Mark({ className = 'size-7', onRail = false }: { className?: string; onRail?: boolean }) {
  return (
    <svg viewBox="0 0 28 28" aria-hidden className={`${className} shrink-0`}>
      <path
        d="M13 2.5C7.5 4.5 4 9.3 4 14.6 4 20 7.8 24.6 13 25.5Z"
        fill={onRail ? 'var(--rail-ink)' : 'var(--ink)'}
      />
      <path
        d="M15 2.5C20.5 4.5 24 9.3 24 14.6 24 20 20.2 24.6 15 25.5Z"
        fill={onRail ? 'var(--rail-ember)' : 'var(--ember)'}
      />
    </svg>
  );
}
