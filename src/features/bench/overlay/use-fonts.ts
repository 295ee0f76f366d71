import { useSyncExternalStore } from 'react';

let version = 0;

function subscribe(listener: () => void): () => void {
  const hear = (): void => {
    version += 1;
    listener();
  };
  document.fonts.addEventListener('loadingdone', hear);
  return () => document.fonts.removeEventListener('loadingdone', hear);
}

/** Changes when a font has come in, so that what was measured before is measured again. */
export const useFonts = (): number => useSyncExternalStore(subscribe, () => version);
