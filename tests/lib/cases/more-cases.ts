import type { BenchCase } from './bench-case';
import { countingCases } from './more-cases-counting';
import { handCases } from './more-cases-handling';
import { lineCases } from './more-cases-lines';
import { screenCases } from './more-cases-picture';
import { placeCases } from './more-cases-places';
import { sharedCases } from './more-cases-shared';
import { supplyCases } from './more-cases-supply';

/** Further cases of the kinds that the trade meets, on invented boards, with the reading that practice gives them. */
export const moreCases: readonly BenchCase[] = [
  ...countingCases,
  ...placeCases,
  ...lineCases,
  ...sharedCases,
  ...supplyCases,
  ...screenCases,
  ...handCases,
];
