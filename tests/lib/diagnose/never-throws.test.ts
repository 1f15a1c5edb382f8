import fc from 'fast-check';
import { buildLayoutIndex, diagnose } from '@/lib';
import { diagnosis, layoutDocument, runs as runsSchema, type LayoutDocument } from '@/shared';
import { caseBoards } from '../../factories/cases';
import { runsFor } from '../../factories/evidence';
import { buildLayout } from '../../factories/layout';

const boards: readonly [string, LayoutDocument][] = [
  [
    'two banks of three bits, sparse',
    buildLayout({ banks: 2, bits: 3, sharedParts: false, formats: ['code'], first: 'unknown' }),
  ],
  ['interleaved banks', buildLayout({ banks: 2, bits: 4, interleave: true, formats: ['code', 'log'] })],
  ['four-bit chips, two deep', buildLayout({ banks: 1, bits: 8, chipWidth: 4, deep: 2, formats: ['mask', 'log'] })],
  ['a plain board with rails and multiplexers', layoutDocument.parse(caseBoards.A)],
  ['a picture of three planes', layoutDocument.parse(caseBoards.H)],
];

/** All boards together; ROWCALL_CASES=100000 asks for one hundred thousand, which takes about half an hour. */
const casesEach = Math.ceil(Number(process.env.ROWCALL_CASES ?? 2_000) / boards.length);

describe('an answer to anything that the schema allows', () => {
  it.each(boards)(
    'comes without an error and is itself of the written form: %s',
    (_, document) => {
      const index = buildLayoutIndex(document);
      let at = 0;
      fc.assert(
        fc.property(runsFor(document), (input) => {
          const answer = diagnose(index, runsSchema.parse(input));
          for (const suspect of answer.suspects) expect(suspect.probability).toBeGreaterThanOrEqual(0);
          expect(Number.isFinite(answer.leftOut)).toBe(true);
          // The whole form is checked on every fiftieth, since that costs more than the answer.
          if (at++ % 50 === 0) diagnosis.parse(answer);
        }),
        { seed: 31, numRuns: casesEach },
      );
    },
    7_200_000,
  );
});
