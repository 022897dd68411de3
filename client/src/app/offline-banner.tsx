import { WifiOff } from 'lucide-react';
import { useSyncExternalStore, type JSX } from 'react';

function subscribe(listener: () => void): () => void {
  window.addEventListener('online', listener);
  window.addEventListener('offline', listener);
  return () => {
    window.removeEventListener('online', listener);
    window.removeEventListener('offline', listener);
  };
}

/** Says that there is no connection, for as long as there is none. */
export function OfflineBanner(): JSX.Element {
  const isOnline = useSyncExternalStore(subscribe, () => navigator.onLine);
  return (
    <div role="status">
      {!isOnline && (
        <p className="flex items-center justify-center gap-2 bg-ink px-4 py-1.5 text-small text-paper">
          <WifiOff aria-hidden className="size-4" />
          No connection. What you see may be old; changes wait until it is back.
        </p>
      )}
    </div>
  );
}
