import type { ReactNode } from 'react';
import { classNames } from './class-names';

export type PlainColumn<Row> = {
  id: string;
  header: ReactNode;
  cell: (row: Row, index: number) => ReactNode;
  align?: 'start' | 'end';
  mono?: boolean;
};

/** A small table that is read, not worked with: no sorting, no ticking. Scrolls sideways when it has to. */
export function PlainTable<Row>({
  label,
  columns,
  rows,
  rowKey,
  footer,
}: {
  label: string;
  columns: readonly PlainColumn<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row, index: number) => string;
  /** Rows of sums: `<tr>` elements. */
  footer?: ReactNode;
}) {
  return (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label={label}>
      <table className="w-full border-collapse text-base">
        <thead>
          <tr className="border-b border-rule">
            {columns.map((column) => (
              <th
                key={column.id}
                scope="col"
                className={classNames(
                  'px-2 py-2 text-sm font-medium text-ink-3 first:pl-0 last:pr-0',
                  column.align === 'end' ? 'text-right' : 'text-left',
                )}
              >
                {column.header}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row, index) => (
            <tr key={rowKey(row, index)} className="border-b border-rule-2 last:border-b-0">
              {columns.map((column) => (
                <td
                  key={column.id}
                  className={classNames(
                    'px-2 py-2 align-baseline first:pl-0 last:pr-0',
                    column.align === 'end' && 'text-right whitespace-nowrap',
                    (column.mono ?? column.align === 'end') && 'font-mono',
                  )}
                >
                  {column.cell(row, index)}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
        {footer ? <tfoot className="border-t border-rule font-semibold">{footer}</tfoot> : null}
      </table>
    </div>
  );
}
