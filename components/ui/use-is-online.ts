import { useSyncExternalStore } from 'react';

function watch(tell: () => void) {
  window.addEventListener('online', tell);
  window.addEventListener('offline', tell);
  return () => {
    window.removeEventListener('online', tell);
    window.removeEventListener('offline', tell);
  };
}

/** Whether the browser has a connection at all; it may still not reach the server. */
export function useIsOnline(): boolean {
  return useSyncExternalStore(watch, () => navigator.onLine);
}
