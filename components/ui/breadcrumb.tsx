import Link from 'next/link';
import { Fragment } from 'react';

/** The way down to this page; the last one is the page itself. */
export function Breadcrumb({ items }: { items: readonly { label: string; href?: string }[] }) {
  return (
    <nav aria-label="Where you are">
      <ol className="flex flex-wrap items-center gap-x-1.5 text-sm text-ink-3">
        {items.map((item, index) => (
          <Fragment key={`${item.href ?? ''}${item.label}`}>
            {index > 0 ? <li aria-hidden>/</li> : null}
            <li>
              {item.href ? (
                <Link href={item.href} className="underline-offset-3 hover:text-ink hover:underline">
                  {item.label}
                </Link>
              ) : (
                <span aria-current="page" className="text-ink-2">
                  {item.label}
                </span>
              )}
            </li>
          </Fragment>
        ))}
      </ol>
    </nav>
  );
}
