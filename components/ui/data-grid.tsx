'use client';

import { ArrowDown, ArrowUp, ChevronsUpDown } from 'lucide-react';
import { useRef, useState, type KeyboardEvent, type MouseEvent } from 'react';
import { Checkbox } from './checkbox';
import { classNames } from './class-names';
import type { DataColumn, DataSort } from './data-column';
import type { DataView } from './data-view';
import { ROW_HEIGHT, useVirtualRows } from './use-virtual-rows';

const INTERACTIVE = 'a, button, input, select, textarea, label, [role="menuitem"]';

function ariaSort(sort: DataSort | null | undefined, id: string): 'ascending' | 'descending' | 'none' {
  if (sort?.id !== id) return 'none';
  return sort.desc ? 'descending' : 'ascending';
}

/** The columns of a data table on a wide screen: rows are grids of one template, so head and body line up when virtual. */
export function DataGrid<Row extends object>({ view }: { view: DataView<Row> }) {
  const { shown, sortedRows, rowId, rowLabel, onRowOpen, onSelectedChange, activeId, virtual, height } = view;
  const scroller = useRef<HTMLDivElement>(null);
  const [focused, setFocused] = useState(0);
  const template = [
    onSelectedChange ? '2.75rem' : null,
    ...shown.map((column) => column.width ?? 'minmax(6rem, 1fr)'),
  ]
    .filter(Boolean)
    .join(' ');

  const windowed = useVirtualRows(sortedRows.length, scroller, Boolean(virtual));

  const focusRow = (index: number) => {
    const next = Math.max(0, Math.min(sortedRows.length - 1, index));
    setFocused(next);
    windowed?.scrollTo(next);
    // A row out of sight is drawn only after the scroll: look for it for a few frames.
    const seek = (frames: number) => {
      const element = scroller.current?.querySelector<HTMLElement>(`[data-index="${next}"]`);
      if (element) element.focus({ preventScroll: windowed !== null });
      else if (frames > 0) requestAnimationFrame(() => seek(frames - 1));
    };
    requestAnimationFrame(() => seek(20));
  };

  const onKeyDown = (event: KeyboardEvent, index: number, row: Row) => {
    if (event.target !== event.currentTarget) return;
    const moves: Record<string, number> = {
      ArrowDown: index + 1,
      ArrowUp: index - 1,
      PageDown: index + 10,
      PageUp: index - 10,
      Home: 0,
      End: sortedRows.length - 1,
    };
    const move = moves[event.key];
    if (move !== undefined) focusRow(move);
    else if (event.key === 'Enter' && onRowOpen) onRowOpen(row);
    else if (event.key === ' ' && onSelectedChange) view.toggleRow(rowId(row));
    else return;
    event.preventDefault();
  };

  const indices = windowed?.indices ?? sortedRows.map((_, index) => index);
  const current = Math.min(focused, sortedRows.length - 1);
  // With virtual rows the one that holds the tab stop may be out of sight: then the first in sight takes it.
  const tabStop = indices.includes(current) ? current : indices[0];

  return (
    <div
      ref={scroller}
      className={classNames(
        'relative overflow-x-auto rounded-xl border border-rule bg-paper',
        height && 'overflow-y-auto',
      )}
      style={height ? { height } : undefined}
    >
      <div role="grid" aria-label={view.label} aria-rowcount={sortedRows.length + 1} className="min-w-fit">
        <div role="rowgroup" className="sticky top-0 z-10 bg-paper">
          <div
            role="row"
            aria-rowindex={1}
            className="grid border-b border-rule"
            style={{ gridTemplateColumns: template }}
          >
            {onSelectedChange ? (
              <div role="columnheader" className="grid place-items-center">
                <Checkbox
                  aria-label="Tick all rows"
                  checked={view.allSelected}
                  indeterminate={view.someSelected && !view.allSelected}
                  onChange={view.toggleAll}
                />
              </div>
            ) : null}
            {shown.map((column) => (
              <HeadCell
                key={column.id}
                column={column}
                sort={view.sort}
                onToggle={view.canSort(column.id) ? () => view.toggleSort(column.id) : undefined}
              />
            ))}
          </div>
        </div>
        <div
          role="rowgroup"
          className="relative"
          style={windowed ? { height: windowed.totalHeight } : undefined}
        >
          <div style={windowed ? { transform: `translateY(${windowed.top}px)` } : undefined}>
            {indices.map((index) => {
              const row = sortedRows[index];
              if (!row) return null;
              const id = rowId(row);
              return (
                <div
                  key={id}
                  role="row"
                  data-index={index}
                  aria-rowindex={index + 2}
                  aria-label={rowLabel(row)}
                  aria-selected={onSelectedChange ? view.isSelected(id) : activeId === id}
                  tabIndex={index === tabStop ? 0 : -1}
                  onFocus={() => setFocused(index)}
                  onKeyDown={(event) => onKeyDown(event, index, row)}
                  onClick={(event: MouseEvent<HTMLElement>) => {
                    const control = (event.target as HTMLElement).closest(INTERACTIVE);
                    if (!control || !event.currentTarget.contains(control)) onRowOpen?.(row);
                  }}
                  className={classNames(
                    'grid border-b border-rule-2 last:border-b-0 focus-visible:-outline-offset-2',
                    onRowOpen && 'cursor-pointer hover:bg-hover',
                    activeId === id
                      ? 'bg-chosen shadow-[inset_3px_0_0_var(--ember)]'
                      : view.isSelected(id) && 'bg-hover',
                  )}
                  style={{ gridTemplateColumns: template, ...(virtual ? { height: ROW_HEIGHT } : {}) }}
                >
                  {onSelectedChange ? (
                    <div role="gridcell" className="grid place-items-center">
                      <Checkbox
                        aria-label={`Tick ${rowLabel(row)}`}
                        checked={view.isSelected(id)}
                        onChange={() => view.toggleRow(id)}
                      />
                    </div>
                  ) : null}
                  {shown.map((column) => (
                    <div
                      key={column.id}
                      role="gridcell"
                      className={classNames(
                        'flex min-w-0 flex-col justify-center px-3 py-2.5 first:pl-4 last:pr-4',
                        column.align === 'end' && 'items-end text-right font-mono',
                        virtual && 'truncate whitespace-nowrap',
                      )}
                    >
                      {column.cell(row)}
                    </div>
                  ))}
                </div>
              );
            })}
          </div>
        </div>
      </div>
    </div>
  );
}

function HeadCell<Row>({
  column,
  sort,
  onToggle,
}: {
  column: DataColumn<Row>;
  sort: DataSort | null | undefined;
  onToggle?: () => void;
}) {
  const state = ariaSort(sort, column.id);
  const Icon = state === 'ascending' ? ArrowUp : state === 'descending' ? ArrowDown : ChevronsUpDown;
  return (
    <div
      role="columnheader"
      aria-sort={onToggle ? state : undefined}
      className={classNames(
        'flex items-end px-3 text-sm text-ink-3 first:pl-4 last:pr-4',
        column.align === 'end' && 'justify-end text-right',
      )}
    >
      {onToggle ? (
        <button
          type="button"
          onClick={onToggle}
          className={classNames(
            'group flex min-h-10 items-center gap-1 rounded-sm font-medium hover:text-ink focus-visible:-outline-offset-2',
            state !== 'none' && 'text-ink',
          )}
        >
          {column.header}
          <Icon
            aria-hidden
            className={classNames('size-3.5', state === 'none' && 'opacity-50 group-hover:opacity-100')}
          />
        </button>
      ) : (
        <span className="flex min-h-10 items-center font-medium">{column.header}</span>
      )}
    </div>
  );
}
