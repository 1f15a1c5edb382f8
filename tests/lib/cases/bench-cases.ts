import type { BenchCase } from './bench-case';
import { handlingCases } from './bench-cases-handling';
import { logCases } from './bench-cases-logs';
import { pictureCases } from './bench-cases-picture';

/** Cases of the bench with the reading that a technician gives them. The boards are invented. */
export const benchCases: readonly BenchCase[] = [...logCases, ...pictureCases, ...handlingCases];

export interface CaseEntry {
  readonly title: string;
  readonly of: BenchCase;
  readonly runs: BenchCase['runs'];
}

/** Every way in which the evidence of the cases is entered. */
export const entriesOf = (cases: readonly BenchCase[]): CaseEntry[] =>
  cases.flatMap((each) => [
    { title: `${each.id}: ${each.title}`, of: each, runs: each.runs },
    ...Object.entries(each.alsoAs ?? {}).map(([name, runs]) => ({
      title: `${each.id}, entered as ${name}: ${each.title}`,
      of: each,
      runs,
    })),
  ]);
