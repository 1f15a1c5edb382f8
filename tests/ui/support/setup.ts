import '@testing-library/jest-dom';
import { TextEncoder } from 'node:util';
import { resetDevice } from './device';

// Browsers have it; jsdom does not.
Object.assign(globalThis, { TextEncoder });

// Typing into forms key by key takes its time on a small machine.
jest.setTimeout(30_000);

beforeEach(() => {
  resetDevice();
  window.localStorage.clear();
});
