import { benchOf, type Bench } from '@/components/features/diagnose/bench';
import type { LayoutDocument } from '@/shared';

/** Makes a board ready, or fails the test. */
export function readyBench(document: LayoutDocument): Bench {
  const bench = benchOf(document);
  if (bench === null) throw new Error('The board of the test is none.');
  return bench;
}
