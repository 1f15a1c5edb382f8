import type { MarchTest } from './march-tests';

/** Cells that hold one bit each. */
export interface Memory {
  /** How many addresses there are, from 0. */
  readonly size: number;
  readonly read: (address: number) => 0 | 1;
  readonly write: (address: number, value: 0 | 1) => void;
}

/** A read that gave another value than the test expects. */
export interface MarchFailure {
  readonly element: number;
  readonly operation: number;
  readonly address: number;
  readonly read: 0 | 1;
}

/**
 * Runs a March test on one-bit cells and lists every failing read in the order in which they happen. `any` is taken
 * as ascending.
 */
export function runMarch(test: MarchTest, memory: Memory): MarchFailure[] {
  const failures: MarchFailure[] = [];
  test.elements.forEach(({ order, operations }, element) => {
    for (let at = 0; at < memory.size; at++) {
      const address = order === 'down' ? memory.size - 1 - at : at;
      operations.forEach(({ does, value }, operation) => {
        if (does === 'write') memory.write(address, value);
        else {
          const read = memory.read(address);
          if (read !== value) failures.push({ element, operation, address, read });
        }
      });
    }
  });
  return failures;
}
