import { useSyncExternalStore } from 'react';

/**
 * How the running application stands to the newest one.
 * waiting: a newer one is on the device and waits. replaced: another tab has taken it over, this one runs the old one.
 */
export type AppVersion = 'current' | 'waiting' | 'replaced';

/** Least time in ms between two questions whether there is a new version. */
const askPause = 30 * 60_000;

const workspaceLock = 'rowcall.workspace-open';

let version: AppVersion = 'current';
let registration: ServiceWorkerRegistration | undefined;
let taking = false;
const listeners = new Set<() => void>();

const subscribe = (changed: () => void) => {
  listeners.add(changed);
  return () => void listeners.delete(changed);
};

function become(next: AppVersion): void {
  version = next;
  for (const changed of listeners) changed();
}

/** How this page stands to the newest version of the application. */
export function useAppVersion(): AppVersion {
  return useSyncExternalStore(
    subscribe,
    () => version,
    () => 'current',
  );
}

/** Whether a path is that of a workspace. */
export const isWorkspace = (path: string): boolean => path.endsWith('/diagnose');

/** Tells the other tabs that a workspace is open here, until the returned function is called. */
export function holdWorkspace(): () => void {
  let release = () => {};
  const released = new Promise<void>((resolve) => {
    release = resolve;
  });
  navigator.locks?.request(workspaceLock, { mode: 'shared' }, () => released).catch(() => undefined);
  return release;
}

/** True at the start of a page while no workspace is open in any tab, and before anybody has touched anything. */
async function mayTakeOverUnasked(): Promise<boolean> {
  if (isWorkspace(window.location.pathname) || navigator.userActivation?.hasBeenActive) return false;
  const { held = [] } = (await navigator.locks?.query()) ?? {};
  return !held.some(({ name }) => name === workspaceLock);
}

/** Takes the newest version over and loads the page again. The address stays, and with it an open look-up. */
export function takeOver(): void {
  taking = true;
  const worker = registration?.waiting;
  // Where none waits, another tab has let it in already.
  if (worker) worker.postMessage({ type: 'SKIP_WAITING' });
  else window.location.reload();
}

/**
 * Keeps the application on the device, and watches for new versions. A version that waits from before is taken over
 * at once where that disturbs nobody. Where workers are not allowed everything goes on without.
 */
export async function keepOnDevice(): Promise<void> {
  const workers = navigator.serviceWorker as ServiceWorkerContainer | undefined;
  if (workers === undefined) return;
  let ruled = workers.controller !== null;
  workers.addEventListener('controllerchange', () => {
    if (taking) window.location.reload();
    else if (ruled) become('replaced');
    ruled = true;
  });
  try {
    registration = await workers.getRegistration();
    if (registration?.waiting && (await mayTakeOverUnasked())) takeOver();
    await whenLoaded();
    registration = await workers.register('/sw.js');
    watch(registration);
  } catch {
    // A private window, or storage that is full: the application needs the network then.
  }
}

function watch(watched: ServiceWorkerRegistration): void {
  const note = () => {
    // The first worker of a device replaces nothing.
    if (watched.waiting && watched.active && version === 'current') become('waiting');
  };
  note();
  watched.addEventListener('updatefound', () => watched.installing?.addEventListener('statechange', note));
  let asked = Date.now();
  const ask = () => {
    if (document.visibilityState !== 'visible' || Date.now() - asked < askPause) return;
    asked = Date.now();
    watched.update().catch(() => undefined);
  };
  document.addEventListener('visibilitychange', ask);
  window.addEventListener('online', ask);
}

/** Storing the whole application must not compete with the page that is being shown. */
function whenLoaded(): Promise<void> {
  if (document.readyState === 'complete') return Promise.resolve();
  return new Promise((resolve) => window.addEventListener('load', () => resolve(), { once: true }));
}
