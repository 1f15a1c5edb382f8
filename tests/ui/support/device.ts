import { act } from '@testing-library/react';

type Device = { width: number; dark: boolean; reducedMotion: boolean };

const plain: Device = { width: 1440, dark: false, reducedMotion: false };
let device = plain;
const listeners = new Set<() => void>();

function holds(query: string): boolean {
  const width = /min-width: (\d+)px/.exec(query);
  if (width) return device.width >= Number(width[1]);
  if (query.includes('prefers-color-scheme: dark')) return device.dark;
  if (query.includes('prefers-reduced-motion')) return device.reducedMotion;
  return false;
}

/** Puts back a wide window in daylight. jsdom has no media queries; this stands in for them. */
export function resetDevice(): void {
  device = plain;
  listeners.clear();
  Object.defineProperty(window, 'matchMedia', {
    configurable: true,
    value: (query: string) => ({
      get matches() {
        return holds(query);
      },
      media: query,
      addEventListener: (_: string, changed: () => void) => listeners.add(changed),
      removeEventListener: (_: string, changed: () => void) => listeners.delete(changed),
      addListener: (changed: () => void) => listeners.add(changed),
      removeListener: (changed: () => void) => listeners.delete(changed),
    }),
  });
}

/** Changes the window or what the person asked of the system, and tells whoever listens. */
export function setDevice(change: Partial<Device>): void {
  act(() => {
    device = { ...device, ...change };
    for (const changed of [...listeners]) changed();
  });
}
