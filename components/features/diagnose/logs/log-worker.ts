/** A worker that reads logs; null where the browser has none. */
export function openLogWorker(): Worker | null {
  if (typeof Worker === 'undefined') return null;
  try {
    return new Worker(new URL('./log.worker.ts', import.meta.url));
  } catch {
    return null;
  }
}
