import type { ReactNode } from 'react';

/** One column of a data table. */
export type DataColumn<Row> = {
  id: string;
  /** Head of the column; also its name in the menu of columns and on a phone's card. */
  header: string;
  cell: (row: Row) => ReactNode;
  /** Gives the column a sort; the value to compare. Null and undefined come last in both directions. */
  sortValue?: (row: Row) => string | number | null | undefined;
  /** Sortable by the server, where there is no value to compare here. */
  sortable?: boolean;
  /** `end` for figures: right-aligned, in the face of figures. */
  align?: 'start' | 'end';
  /** CSS grid track, e.g. `9rem`, `minmax(12rem, 2fr)`. Default: `minmax(6rem, 1fr)`. */
  width?: string;
  /** May be hidden by the person. Default true. */
  hideable?: boolean;
  /** Hidden until the person asks for it. */
  startsHidden?: boolean;
  /** On a phone's card: the headline, shown with the label in front, or not at all. Default `line`. */
  onCard?: 'title' | 'line' | 'none';
};

export type DataSort = { id: string; desc: boolean };

/** `columns` sorted by name ↔ the form that fits into an address: `name`, `-weight`. */
export function sortToText(sort: DataSort | null): string | null {
  return sort ? `${sort.desc ? '-' : ''}${sort.id}` : null;
}

export function sortFromText(text: string | null | undefined): DataSort | null {
  if (!text || text === '-') return null;
  return text.startsWith('-') ? { id: text.slice(1), desc: true } : { id: text, desc: false };
}
