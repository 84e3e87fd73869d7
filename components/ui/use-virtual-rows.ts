import {
  elementScroll,
  observeElementOffset,
  observeElementRect,
  Virtualizer,
} from '@tanstack/react-virtual';
import { useEffect, useMemo, useReducer, useState, type RefObject } from 'react';

/** Height of a row of a virtual table in px: one line of text. */
export const ROW_HEIGHT = 45;

export type VirtualRows = {
  /** Indices to draw: those in sight and some around them. */
  indices: number[];
  /** Where the first drawn row starts, and how tall all rows are together, in px. */
  top: number;
  totalHeight: number;
  scrollTo: (index: number) => void;
};

/**
 * Which rows of a long table are in sight of the scrolling box. A new virtualizer is made when the number of rows
 * changes, instead of changing one in the middle of a drawing. Null when the table is not virtual.
 */
export function useVirtualRows(
  count: number,
  scroller: RefObject<HTMLDivElement | null>,
  enabled: boolean,
): VirtualRows | null {
  const [version, redraw] = useReducer((drawn: number) => drawn + 1, 0);
  const [initialRect] = useState({ width: 1024, height: 480 });
  const virtualizer = useMemo(
    () =>
      new Virtualizer<HTMLDivElement, Element>({
        count,
        getScrollElement: () => scroller.current,
        estimateSize: () => ROW_HEIGHT,
        overscan: 12,
        enabled,
        initialRect,
        observeElementRect,
        observeElementOffset,
        scrollToFn: elementScroll,
        onChange: redraw,
      }),
    [count, scroller, enabled, initialRect],
  );

  useEffect(() => {
    const unmount = virtualizer._didMount();
    virtualizer._willUpdate();
    return unmount;
  }, [virtualizer]);

  return useMemo(() => {
    if (!enabled) return null;
    const items = virtualizer.getVirtualItems();
    return {
      // The version is what tells that the same virtualizer has moved on.
      version,
      indices: items.map((item) => item.index),
      top: items[0]?.start ?? 0,
      totalHeight: virtualizer.getTotalSize(),
      scrollTo: (index: number) => virtualizer.scrollToIndex(index),
    };
  }, [enabled, virtualizer, version]);
}
