'use client';

import { Checkbox } from './checkbox';
import { classNames } from './class-names';
import type { DataView } from './data-view';
import { Select } from './select';

/** A data table on a phone: one card a row, the head line first, the other columns as labelled lines. */
export function DataCards<Row extends object>({ view }: { view: DataView<Row> }) {
  const { shown, sortedRows, rowId, rowLabel, onRowOpen, onSelectedChange, activeId, sort } = view;
  const title = shown.find((column) => column.onCard === 'title') ?? shown[0];
  const lines = shown.filter((column) => column !== title && column.onCard !== 'none');
  const sortable = shown.filter((column) => view.canSort(column.id));
  const optionValue = sort ? `${sort.desc ? '-' : ''}${sort.id}` : '';

  return (
    <div className="flex flex-col gap-2">
      {sortable.length > 0 ? (
        <Select
          aria-label="Sort by"
          value={optionValue}
          placeholder="Sort by …"
          onChange={(event) => {
            const { value } = event.target;
            view.changeSort(value ? { id: value.replace(/^-/, ''), desc: value.startsWith('-') } : null);
          }}
          options={sortable.flatMap((column) => [
            { value: column.id, label: `${column.header}, rising` },
            { value: `-${column.id}`, label: `${column.header}, falling` },
          ])}
        />
      ) : null}
      <ul
        aria-label={view.label}
        className="divide-y divide-rule-2 overflow-hidden rounded-xl border border-rule bg-paper"
      >
        {sortedRows.map((row) => {
          const id = rowId(row);
          const body = view.card ? (
            view.card(row)
          ) : (
            <>
              <div className="text-base font-semibold">{title?.cell(row)}</div>
              <dl className="mt-1.5 grid grid-cols-[auto_minmax(0,1fr)] gap-x-4 gap-y-1">
                {lines.map((column) => (
                  <div key={column.id} className="contents">
                    <dt className="text-sm text-ink-3">{column.header}</dt>
                    <dd
                      className={classNames(
                        'flex min-w-0 flex-col items-end text-right text-base',
                        column.align === 'end' && 'font-mono',
                      )}
                    >
                      {column.cell(row)}
                    </dd>
                  </div>
                ))}
              </dl>
            </>
          );
          return (
            <li
              key={id}
              className={classNames(
                'relative flex gap-3 px-4 py-3 [contain-intrinsic-size:auto_10rem] [content-visibility:auto]',
                activeId === id && 'bg-chosen',
              )}
            >
              {onSelectedChange ? (
                <div className="relative z-10 grid size-11 -my-1 -ml-3 shrink-0 place-items-center">
                  <Checkbox
                    aria-label={`Tick ${rowLabel(row)}`}
                    checked={view.isSelected(id)}
                    onChange={() => view.toggleRow(id)}
                  />
                </div>
              ) : null}
              <div className="min-w-0 flex-1 [&_a]:relative [&_a]:z-10 [&_button]:relative [&_button]:z-10">
                {body}
              </div>
              {onRowOpen ? (
                <button
                  type="button"
                  aria-label={`Open ${rowLabel(row)}`}
                  onClick={() => onRowOpen(row)}
                  className="absolute inset-0 focus-visible:-outline-offset-2"
                />
              ) : null}
            </li>
          );
        })}
      </ul>
    </div>
  );
}
