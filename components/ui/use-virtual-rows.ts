import { useVirtualizer, type Virtualizer } from '@tanstack/react-virtual';
import type { RefObject } from 'react';

/** Height of a row of a virtual table in px: one line of text. */
export const ROW_HEIGHT = 45;

/** Which rows of a long table are in sight of the scrolling box. */
export function useVirtualRows(
  count: number,
  scroller: RefObject<HTMLDivElement | null>,
  enabled: boolean,
): Virtualizer<HTMLDivElement, Element> {
  // The virtualizer hands out new functions by design; memoizing them would freeze the rows.
  'use no memo';
  return useVirtualizer({
    count,
    getScrollElement: () => scroller.current,
    estimateSize: () => ROW_HEIGHT,
    overscan: 12,
    enabled,
  });
}
