import { useSyncExternalStore } from 'react';

/** Whether a CSS media query holds now. On the server, and for the first paint, it is `onServer`. */
export function useMediaQuery(query: string, onServer = false): boolean {
  return useSyncExternalStore(
    (changed) => {
      const list = window.matchMedia(query);
      list.addEventListener('change', changed);
      return () => list.removeEventListener('change', changed);
    },
    () => window.matchMedia(query).matches,
    () => onServer,
  );
}
