import { act } from '@testing-library/react';
import { useSyncExternalStore } from 'react';
import type * as router from 'expo-router';

type Params = Record<string, string | undefined>;

let history: Params[] = [{}];
const listeners = new Set<() => void>();
const tell = () => listeners.forEach((changed) => changed());
const params = () => history[history.length - 1] as Params;

/** The address of the workspace under test, and how to go back in it. */
export const address = {
  start: (at: Params) => {
    history = [at];
  },
  get params() {
    return params();
  },
  get depth() {
    return history.length;
  },
  back: () =>
    act(() => {
      history = history.slice(0, -1);
      tell();
    }),
};

const push = (to: { params?: Params }) => {
  history = [...history, to.params ?? {}];
  tell();
};
const setParams = (change: Params) => {
  history = [...history.slice(0, -1), { ...params(), ...change }];
  tell();
};
const subscribe = (changed: () => void) => {
  listeners.add(changed);
  return () => void listeners.delete(changed);
};
const useRouter = () => live;
const live = { push, setParams } as unknown as ReturnType<typeof router.useRouter>;

/** What stands in for expo-router where the address itself is under test: pushes and replacements are followed. */
export function liveRouter(): Partial<typeof router> {
  const real = jest.requireActual<typeof router>('expo-router');
  return {
    ...real,
    useLocalSearchParams: (() => useSyncExternalStore(subscribe, params)) as typeof router.useLocalSearchParams,
    useRouter,
  };
}
