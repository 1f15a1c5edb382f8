interface Waiter<Value> {
  readonly resolve: (value: Value | undefined) => void;
  readonly reject: (reason: unknown) => void;
}

/**
 * Looks keys up in batches: one query is on its way at a time, and what is asked meanwhile goes with the next one.
 * So each answer is from a query that began after it was asked for, and many callers at once cost few queries.
 */
export const batchLookups = <Value>(
  load: (keys: readonly string[]) => Promise<ReadonlyMap<string, Value>>,
): ((key: string) => Promise<Value | undefined>) => {
  let waiting = new Map<string, Waiter<Value>[]>();
  let running = false;

  const run = async (): Promise<void> => {
    running = true;
    while (waiting.size > 0) {
      const batch = waiting;
      waiting = new Map();
      try {
        const found = await load([...batch.keys()]);
        for (const [key, waiters] of batch) for (const { resolve } of waiters) resolve(found.get(key));
      } catch (error) {
        for (const waiters of batch.values()) for (const { reject } of waiters) reject(error);
      }
    }
    running = false;
  };

  return (key) =>
    new Promise((resolve, reject) => {
      const waiters = waiting.get(key);
      if (waiters) waiters.push({ resolve, reject });
      else waiting.set(key, [{ resolve, reject }]);
      if (!running) void run();
    });
};
