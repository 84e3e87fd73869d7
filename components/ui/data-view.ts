import type { ReactNode } from 'react';
import type { DataColumn, DataSort } from './data-column';

export type DataTableProps<Row extends object> = {
  /** Says what the table lists. */
  label: string;
  columns: readonly DataColumn<Row>[];
  rows: readonly Row[];
  rowId: (row: Row) => string;
  /** How a row is called by a screen reader, e.g. the animal's code. */
  rowLabel: (row: Row) => string;
  /** The sort is held outside (in the address). Without `onSortChange` the table keeps it by itself. */
  sort?: DataSort | null;
  onSortChange?: (sort: DataSort | null) => void;
  /** The rows come sorted from the server: heads only report the wish. */
  sortedByServer?: boolean;
  /** Ids of ticked rows; giving the change handler shows the boxes. */
  selected?: readonly string[];
  onSelectedChange?: (ids: string[]) => void;
  /** The row whose details stand in the panel. */
  activeId?: string | null;
  onRowOpen?: (row: Row) => void;
  /** Draws only the rows in sight; for more than a few hundred. Needs `height`. */
  virtual?: boolean;
  /** Any CSS height; the body scrolls under the head. */
  height?: string;
  /** Left of the menu of columns: filters, counts, actions on the ticked rows. */
  toolbar?: ReactNode;
  columnMenu?: boolean;
  /** In place of rows when there are none. */
  empty?: ReactNode;
  loading?: boolean;
  /** On a phone the table is a list of cards; give one to draw the card by yourself. */
  card?: (row: Row) => ReactNode;
};

/** What the grid and the cards draw from: the props, and the table's state read out. */
export type DataView<Row extends object> = DataTableProps<Row> & {
  shown: DataColumn<Row>[];
  sortedRows: Row[];
  changeSort: (sort: DataSort | null) => void;
  toggleSort: (id: string) => void;
  canSort: (id: string) => boolean;
  isSelected: (id: string) => boolean;
  toggleRow: (id: string) => void;
  allSelected: boolean;
  someSelected: boolean;
  toggleAll: () => void;
};
