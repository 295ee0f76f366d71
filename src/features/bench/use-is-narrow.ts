import { useSyncExternalStore } from 'react';

/** Where there is no room for rail, tape and ladder side by side. */
const QUERY = '(max-width: 62rem)';

export function useIsNarrow(): boolean {
  return useSyncExternalStore(
    (listener) => {
      const query = window.matchMedia(QUERY);
      query.addEventListener('change', listener);
      return () => query.removeEventListener('change', listener);
    },
    () => window.matchMedia(QUERY).matches,
  );
}
