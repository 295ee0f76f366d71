import { useSyncExternalStore } from 'react';
import { PlateMark } from '../components/pictograms';

function subscribe(onChange: () => void): () => void {
  window.addEventListener('online', onChange);
  window.addEventListener('offline', onChange);
  return () => {
    window.removeEventListener('online', onChange);
    window.removeEventListener('offline', onChange);
  };
}

/** Says that the connection is gone, and what that means. */
export function OfflineStrip() {
  const isOnline = useSyncExternalStore(subscribe, () => navigator.onLine);
  return (
    <div role="status">
      {!isOnline && (
        <p className="flex items-center justify-center gap-2 bg-laser px-4 py-1.5 text-sm font-semibold text-ink">
          <PlateMark />
          No connection. What you see may be old; nothing can be changed until it is back.
        </p>
      )}
    </div>
  );
}
