'use client';

import {
  columnVisibilityFeature,
  createColumnHelper,
  createSortedRowModel,
  rowSelectionFeature,
  rowSortingFeature,
  tableFeatures,
  useTable,
} from '@tanstack/react-table';
import { Columns3 } from 'lucide-react';
import { useMemo, useState } from 'react';
import { Button } from './button';
import { DataCards } from './data-cards';
import type { DataSort } from './data-column';
import { DataGrid } from './data-grid';
import type { DataTableProps } from './data-view';
import { DropdownMenu, MenuCheck } from './dropdown-menu';
import { Skeleton } from './skeleton';

const features = tableFeatures({
  columnVisibilityFeature,
  rowSelectionFeature,
  rowSortingFeature,
  sortedRowModel: createSortedRowModel(),
});

function compare(a: string | number | null | undefined, b: string | number | null | undefined): number {
  if (typeof a === 'number' && typeof b === 'number') return a - b;
  return String(a).localeCompare(String(b), 'en', { numeric: true, sensitivity: 'base' });
}

/**
 * A list of things with columns: sorting, ticking, choosing columns, keyboard (arrows, Home, End, Enter, Space), a
 * head that stays, cards instead of columns under 640 px.
 */
export function DataTable<Row extends object>(props: DataTableProps<Row>) {
  const { columns, rows, rowId, selected, onSelectedChange, onSortChange, sortedByServer = false } = props;
  const [ownSort, setOwnSort] = useState<DataSort | null>(null);
  const sort = props.sort === undefined ? ownSort : props.sort;
  const [visibility, setVisibility] = useState<Record<string, boolean>>(() =>
    Object.fromEntries(columns.filter((column) => column.startsHidden).map((column) => [column.id, false])),
  );

  const columnDefs = useMemo(() => {
    const helper = createColumnHelper<typeof features, Row>();
    return helper.columns(
      columns.map((column) =>
        helper.accessor((row: Row) => column.sortValue?.(row) ?? undefined, {
          id: column.id,
          header: column.header,
          enableSorting: Boolean(column.sortValue) || column.sortable === true,
          enableHiding: column.hideable !== false,
          sortUndefined: 'last',
          sortDescFirst: false,
          sortFn: (a, b, id) => compare(a.getValue<string | number>(id), b.getValue<string | number>(id)),
        }),
      ),
    );
  }, [columns]);

  const data = useMemo(() => [...rows], [rows]);
  const sorting = useMemo(() => (sort ? [sort] : []), [sort]);
  const rowSelection = useMemo(
    () => Object.fromEntries((selected ?? []).map((id) => [id, true as const])),
    [selected],
  );

  const changeSort = (next: DataSort | null) => {
    if (props.sort === undefined) setOwnSort(next);
    onSortChange?.(next);
  };

  const table = useTable({
    features,
    columns: columnDefs,
    data,
    getRowId: rowId,
    manualSorting: sortedByServer,
    enableSortingRemoval: true,
    enableMultiSort: false,
    enableRowSelection: Boolean(onSelectedChange),
    state: { sorting, rowSelection, columnVisibility: visibility },
    onSortingChange: (update) => {
      changeSort((typeof update === 'function' ? update(sorting) : update)[0] ?? null);
    },
    onRowSelectionChange: (update) => {
      const next = typeof update === 'function' ? update(rowSelection) : update;
      onSelectedChange?.(Object.keys(next).filter((id) => next[id]));
    },
    onColumnVisibilityChange: setVisibility,
  });

  const shown = columns.filter((column) => table.getColumn(column.id)?.getIsVisible() !== false);
  const sortedRows = table.getRowModel().rows.map((row) => row.original);
  const canHide = props.columnMenu !== false && columns.some((column) => column.hideable !== false);

  const view = {
    ...props,
    shown,
    sortedRows,
    sort,
    changeSort,
    toggleSort: (id: string) => table.getColumn(id)?.toggleSorting(),
    canSort: (id: string) => table.getColumn(id)?.getCanSort() ?? false,
    isSelected: (id: string) => rowSelection[id] === true,
    toggleRow: (id: string) => table.getRow(id).toggleSelected(),
    allSelected: table.getIsAllRowsSelected(),
    someSelected: table.getIsSomeRowsSelected(),
    toggleAll: () => table.toggleAllRowsSelected(),
  };

  return (
    <div className="flex min-w-0 flex-col gap-3">
      {props.toolbar || canHide ? (
        <div className="flex flex-wrap items-center gap-2">
          <div className="flex min-w-0 flex-1 flex-wrap items-center gap-2">{props.toolbar}</div>
          {canHide ? (
            <div className="max-sm:hidden">
              <DropdownMenu
                label="Columns"
                trigger={
                  <Button size="sm" icon={<Columns3 aria-hidden />}>
                    Columns
                  </Button>
                }
              >
                {columns.map((column) => (
                  <MenuCheck
                    key={column.id}
                    disabled={column.hideable === false}
                    checked={shown.includes(column)}
                    onCheckedChange={(on) => table.getColumn(column.id)?.toggleVisibility(on)}
                  >
                    {column.header}
                  </MenuCheck>
                ))}
              </DropdownMenu>
            </div>
          ) : null}
        </div>
      ) : null}
      {props.loading ? (
        <LoadingRows columns={shown.length} />
      ) : sortedRows.length === 0 && props.empty ? (
        props.empty
      ) : (
        <>
          <div className="max-sm:hidden">
            <DataGrid view={view} />
          </div>
          <div className="sm:hidden">
            <DataCards view={view} />
          </div>
        </>
      )}
    </div>
  );
}

function LoadingRows({ columns }: { columns: number }) {
  return (
    <div role="status" aria-label="Loading" className="rounded-xl border border-rule bg-paper">
      {Array.from({ length: 8 }, (_, row) => (
        <div key={row} className="flex gap-4 border-b border-rule-2 px-4 py-3.5 last:border-b-0">
          {Array.from({ length: Math.min(columns, 6) }, (_, column) => (
            <Skeleton key={column} className={column === 0 ? 'h-4 w-28' : 'h-4 flex-1 max-sm:hidden'} />
          ))}
        </div>
      ))}
    </div>
  );
}
