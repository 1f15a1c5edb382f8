import fc from 'fast-check';
import { evidence as evidenceSchema, type LogEvidence } from '@/shared';
import { buildLayoutIndex, type LinePattern, openLogImport } from '@/lib';
import { type LayoutOptions, buildLayout } from '../../factories/layout';
import { type LoggedReading, slowTally } from './slow-reference';

const bytesOf = (text: string) => new TextEncoder().encode(text);

const plain: LinePattern = {
  ...{ address: 1, written: 'W', read: 'R' },
  ...{ notation: 'hexadecimal', unit: 'address', shows: 'address' },
};

const boards: LayoutOptions[] = [
  { banks: 2 },
  { banks: 4, interleave: true },
  { banks: 2, bits: 16, byteLanes: 'big-endian' },
  { banks: 2, bits: 32, byteLanes: 'little-endian', interleave: true },
  { banks: 2, chipWidth: 4, parity: 1 },
  { banks: 1, deep: 2 },
  { banks: 3, chipWidth: 8 },
  { banks: 2, bits: 64, parity: 8 },
];

/** Bits that one address of a board shows. */
const shownBits = ({ bits = 8, byteLanes }: LayoutOptions) => (byteLanes === undefined ? bits : 8);

function written(reading: LoggedReading, { radix, width }: { radix: number; width: number }): string {
  const number = (value: number | bigint) => value.toString(radix).toUpperCase().padStart(width, '0');
  return `${number(reading.address)} W ${number(reading.written)} R ${number(reading.read)}`;
}

function imported(
  options: LayoutOptions,
  text: string | Uint8Array,
  settings: { pattern?: LinePattern; cuts?: readonly number[] } = {},
) {
  const index = buildLayoutIndex(buildLayout(options));
  const log = openLogImport(index, settings.pattern ?? plain, { name: 'bench.log' });
  const bytes = typeof text === 'string' ? bytesOf(text) : text;
  let from = 0;
  for (const cut of [...(settings.cuts ?? [])].sort((a, b) => a - b)) {
    const to = Math.min(bytes.length, cut);
    log.push(bytes.slice(from, to));
    from = to;
  }
  log.push(bytes.slice(from));
  return { evidence: log.finish(), summary: log.summary() };
}

function comparable(evidence: LogEvidence) {
  return {
    outside: evidence.outside,
    values: new Set(evidence.values.map(({ bank, written: w, read, count }) => `${bank} ${w} ${read}: ${count}`)),
    lanes: new Map(evidence.lanes.map((lane) => [`${lane.bank} ${lane.bit}`, lane])),
    right: new Map(evidence.right.map((lane) => [`${lane.bank} ${lane.bit}`, lane])),
  };
}

const readingOf = (options: LayoutOptions) => {
  const words = options.chipWidth === 8 ? 32_768 : 65_536;
  const steps = Math.ceil((options.bits ?? 8) / 8);
  const end = words * (options.deep ?? 1) * (options.banks ?? 4) * (options.byteLanes === undefined ? 1 : steps);
  const value = fc.bigInt({ min: 0n, max: 2n ** BigInt(shownBits(options)) - 1n });
  return fc
    .record({
      address: fc.oneof(fc.integer({ min: 0, max: end + 3 }), fc.integer({ min: 0, max: 7 })),
      written: value,
      mask: fc.oneof(fc.constant(0n), fc.constant(1n), value),
    })
    .map(({ mask, ...rest }): LoggedReading => ({ ...rest, read: rest.written ^ mask }));
};

describe.each(boards.map((options) => [JSON.stringify(options), options] as const))(
  'a log on a board of %s',
  (_, options) => {
    const document = buildLayout(options);

    it('is tallied as the slow and plain reference tallies it, wherever its bytes are cut', () => {
      const logs = fc.record({
        readings: fc.array(readingOf(options), { maxLength: 40 }),
        radix: fc.constantFrom(16, 8, 10),
        // Numbers with leading zeros make lines of one form, which are read in another way.
        width: fc.constantFrom(0, 6),
        end: fc.constantFrom('\n', '\r\n', '\r'),
        cuts: fc.array(fc.nat(900), { maxLength: 6 }),
      });
      fc.assert(
        fc.property(logs, ({ readings, radix, width, end, cuts }) => {
          const text = readings.map((reading) => written(reading, { radix, width }) + end).join('');
          // A decimal number of more than 53 bits is not read.
          fc.pre(radix !== 10 || shownBits(options) <= 32);
          const notation = radix === 16 ? 'hexadecimal' : radix === 8 ? 'octal' : 'decimal';
          const { evidence } = imported(options, text, { pattern: { ...plain, notation } as LinePattern, cuts });
          expect(comparable(evidence)).toEqual(slowTally(document, readings));
          expect([evidence.lines, evidence.readings, evidence.unread]).toEqual([readings.length, readings.length, 0]);
          expect(evidenceSchema.safeParse(evidence).error).toBeUndefined();
        }),
        { numRuns: 80 },
      );
    });
  },
);

it('takes a log of random bytes without a word, and counts each of its lines once', () => {
  fc.assert(
    fc.property(fc.uint8Array({ maxLength: 3000 }), fc.array(fc.nat(3000), { maxLength: 5 }), (bytes, cuts) => {
      const { evidence, summary } = imported({ banks: 2 }, bytes, { cuts });
      expect(evidence.lines).toBe(evidence.readings + evidence.unread + summary.counts.blank);
      expect(evidence).toEqual(imported({ banks: 2 }, bytes).evidence);
      expect(evidenceSchema.safeParse(evidence).error).toBeUndefined();
    }),
    { numRuns: 150 },
  );
});
