import { useSyncExternalStore } from 'react';

function subscribe(listener: () => void): () => void {
  window.addEventListener('online', listener);
  window.addEventListener('offline', listener);
  return () => {
    window.removeEventListener('online', listener);
    window.removeEventListener('offline', listener);
  };
}

/** Says that the network is gone, for as long as it is. */
export function OfflineNotice() {
  const online = useSyncExternalStore(subscribe, () => navigator.onLine);
  return (
    <div role="status">
      {!online && (
        <p className="bg-ink px-4 py-2 text-sm text-paper">
          No network. What you see may be old, and nothing can be saved until it is back.
        </p>
      )}
    </div>
  );
}
