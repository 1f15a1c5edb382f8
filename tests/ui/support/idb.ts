import type * as idb from 'idb-keyval';

/** What the device keeps, in place of the browser's database. Use with `jest.mock('idb-keyval', …)`. */
export const keptOnDevice = new Map<IDBValidKey, unknown>();

/** What stands in for idb-keyval. */
export function idbDouble(): Partial<typeof idb> {
  return {
    createStore: () => () => Promise.reject(new Error('The double has no database.')),
    get: (async (key: IDBValidKey) => keptOnDevice.get(key)) as typeof idb.get,
    set: async (key, value) => void keptOnDevice.set(key, value),
    del: async (key) => void keptOnDevice.delete(key),
    entries: (async () => [...keptOnDevice]) as typeof idb.entries,
  };
}
