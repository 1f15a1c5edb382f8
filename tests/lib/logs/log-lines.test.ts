import fc from 'fast-check';
import { layoutDocument } from '@/shared';
import {
  addressMapOf,
  buildLayoutIndex,
  type LinePattern,
  openLogImport,
  parseReadings,
  sampleOfLog,
  tallyReadings,
} from '@/lib';
import { ColumnReader } from '@/lib/logs/column-reader';
import { type ColumnPattern } from '@/lib/logs/line-pattern';
import { type LineReader } from '@/lib/logs/line-reader';
import { MouldedReader } from '@/lib/logs/moulded-reader';
import { tallyOfLog } from '@/lib/readings/tally';
import { buildLayout, buildLayoutInput } from '../../factories/layout';

const bytesOf = (text: string) => new TextEncoder().encode(text);
const plain: ColumnPattern = {
  ...{ address: 1, written: 'W', read: 'R' },
  ...{ notation: 'hexadecimal', unit: 'address', shows: 'address' },
};
const two = buildLayoutIndex(buildLayout({ banks: 2 }));

function imported(
  text: string | Uint8Array,
  { pattern = plain, index = two }: { pattern?: LinePattern; index?: typeof two } = {},
) {
  const log = openLogImport(index, pattern);
  log.push(typeof text === 'string' ? bytesOf(text) : text);
  return { evidence: log.finish(), summary: log.summary(), counts: log.counts() };
}

describe('the lines of a log', () => {
  it('are counted and numbered as an editor does, blank ones too', () => {
    const { evidence, summary, counts } = imported('hello\n\n01A80 W 00 R 01\n-----\n01A82 W 00 R 01');
    expect(evidence).toMatchObject({ lines: 5, readings: 2, unread: 1, lanes: [{ first: 3, last: 5 }] });
    expect(counts.blank).toBe(2);
    expect(summary.unreadLines).toEqual([
      { line: 1, text: 'hello', reason: 'There is no address (hexadecimal number, word 1 of the line).' },
    ]);
  });

  it('are listed up to a hundred where they cannot be read, and counted beyond', () => {
    const { evidence, summary } = imported('no reading here\n'.repeat(250));
    expect(evidence.unread).toBe(250);
    expect(summary.unreadLines).toHaveLength(100);
    expect(summary.unreadLines.at(-1)!.line).toBe(100);
  });

  it('may be longer than is kept, and are then unread however the log is cut', () => {
    const long = `01A80 W 00 R 01 ${'x'.repeat(70_000)}\n`;
    const text = bytesOf(`01A82 W 00 R 01\n${long}01A84 W 00 R 01\n`);
    const whole = imported(text);
    expect(whole.evidence).toMatchObject({
      lines: 3,
      readings: 2,
      unread: 1,
      lanes: [{ first: 1, last: 3, words: 2 }],
    });
    expect(whole.summary.unreadLines).toMatchObject([{ line: 2, reason: 'The line is longer than 65536 characters.' }]);
    for (const cut of [20, 1000, 66_000, text.length - 5]) {
      const log = openLogImport(two, plain);
      log.push(text.slice(0, cut));
      log.push(text.slice(cut));
      expect(log.finish()).toEqual(whole.evidence);
    }
  });

  it('end as the first of them ends: LF, CR LF, or CR alone', () => {
    const lines = ['01A80 W 00 R 01', '01A82 W 00 R 01', 'x'];
    const [lf, crlf, cr] = ['\n', '\r\n', '\r'].map((end) => imported(lines.join(end) + end).evidence);
    expect(crlf).toEqual(lf);
    expect(cr).toEqual(lf);
    expect(lf).toMatchObject({ lines: 3, readings: 2, unread: 1 });
  });

  it('may be text of 16-bit units, in either order, cut inside a unit', () => {
    const text = '01A80 W 00 R 01\n01A82 W 00 R 01\n';
    const units = Array.from(text, (letter) => letter.charCodeAt(0));
    const little = Uint8Array.from([0xff, 0xfe, ...units.flatMap((unit) => [unit, 0])]);
    const big = Uint8Array.from([0xfe, 0xff, ...units.flatMap((unit) => [0, unit])]);
    const { evidence } = imported(text);
    for (const bytes of [little, big]) {
      for (const cut of [1, 2, 3, 20]) {
        const log = openLogImport(two, plain);
        log.push(bytes.slice(0, cut));
        log.push(bytes.slice(cut));
        expect(log.finish()).toEqual(evidence);
      }
    }
  });

  it('may hold NUL, control characters and letters beyond ASCII between the numbers', () => {
    const { evidence } = imported('01A80\u0000W\u000100\u001b R 01 µ\n01A82 → W 00 R 01\n');
    expect(evidence).toMatchObject({ lines: 2, readings: 2, unread: 0 });
  });
});

describe('what a line of a log may say', () => {
  it('is a run of addresses, every one of them a reading', () => {
    const { evidence } = imported('01A80 TO 01AFF W 00 R 01\n00000-1FFFF W FF R FF\n');
    expect(evidence).toMatchObject({
      ...{ lines: 2, readings: 2 },
      lanes: [{ bank: 'A', bit: 0, readsOne: 128, alone: 128, words: 128, columns: 1, first: 1, last: 1 }],
    });
    expect(evidence.right.find(({ bank, bit }) => bank === 'B' && bit === 3)).toEqual({
      ...{ bank: 'B', bit: 3 },
      ...{ zeros: 0, ones: 65_536 },
    });
    expect(imported('0035 TO 3FB5 STEP 80 W 00 R 01\n').evidence.lanes).toMatchObject([{ words: 128 }]);
  });

  it('is a mask of failing bits: the direction then is not known', () => {
    const pattern: LinePattern = { address: 1, mask: 2, notation: 'hexadecimal', unit: 'address', shows: 'address' };
    const { evidence } = imported('01A80 24\n01A81 04\n', { pattern });
    expect(evidence.lanes).toMatchObject([
      { bit: 2, readsOne: 0, readsZero: 0, alone: 1, words: 2 },
      { bit: 5, readsOne: 0, readsZero: 0, alone: 0, words: 1 },
    ]);
    expect(evidence.values).toEqual([]);
  });

  it('is a word that the board shows only a part of at an address', () => {
    const wide = buildLayoutIndex(buildLayout({ banks: 2, bits: 16, byteLanes: 'big-endian' }));
    const whole = imported('00100 W 0000 R 8001\n', { index: wide, pattern: { ...plain, shows: 'word' } });
    expect(whole.evidence.lanes.map(({ bit }) => bit)).toEqual([0, 15]);
    const words = imported('00080 W 0000 R 8001\n', {
      index: wide,
      pattern: { ...plain, unit: 'word', shows: 'word' },
    });
    expect({ ...words.evidence }).toEqual({ ...whole.evidence });
    const high = imported('00100 W 00 R 80\n', { index: wide });
    expect(high.evidence.lanes.map(({ bit }) => bit)).toEqual([15]);
    expect(imported('00100 W 0000 R 0100\n', { index: wide }).summary.unreadLines).toMatchObject([
      { reason: 'A value does not fit: bank A shows 8 bits at an address.' },
    ]);
  });

  it('is a page register, and without it the first page is taken and said so', () => {
    const input = buildLayoutInput({ banks: 2 });
    const windows = ['A', 'B'].map((bank, page) => ({
      range: { from: 0, to: 0xffff },
      register: { name: 'PAGE', value: page },
      banks: [bank],
    }));
    const paged = buildLayoutIndex(layoutDocument.parse({ ...input, addressMap: { windows } }));
    const pattern: LinePattern = { ...plain, address: 'AT', register: { name: 'PAGE', column: 'PAGE' } };
    const told = imported('PAGE 1 AT 1A80 W 00 R 01\nPAGE 2 AT 1A80 W 00 R 01\n', { index: paged, pattern });
    expect(told.evidence).toMatchObject({ readings: 2, outside: 1, lanes: [{ bank: 'B', bit: 0 }] });
    const untold = imported('1A80 W 00 R 01\n', { index: paged });
    expect(untold.evidence.lanes).toMatchObject([{ bank: 'A' }]);
    expect(untold.summary.notes.join()).toContain('several pages');
  });
});

it('reads a line of one form with the last exactly as it reads any other', () => {
  const digit = fc.constantFrom(...'0123456789ABCDEFG -;');
  const pieces = fc.tuple(
    fc.constantFrom('1A80', '1A8', '01A80', '0x1A', 'W', '1A80-1A90', '1A80 TO 1A90'),
    fc.constantFrom(' W ', ' w:', ' R ', ' ', '-', ' ROW '),
    fc.array(digit, { minLength: 1, maxLength: 3 }).map((digits) => digits.join('')),
    fc.constantFrom(' R ', ' W ', ' ', ' XR '),
    fc.constantFrom('00', 'FF', '7', 'ZZ', '123456789', 'AAh'),
    fc.constantFrom('', ' 12', 'F', '\t', ' W 11 R 22'),
  );
  const patterns: ColumnPattern[] = [
    plain,
    { ...plain, written: 2, read: 3 },
    { ...plain, written: 3, read: 5 },
    { ...plain, notation: 'octal' },
    { ...plain, mask: 6 },
    { address: 'R', mask: 'W', notation: 'hexadecimal', unit: 'address', shows: 'address' },
  ];
  const said = (reader: LineReader, bytes: Uint8Array) => {
    const found: unknown[] = [];
    for (let at = 0; at < bytes.length; at = reader.next) {
      const outcome = reader.line(bytes, at);
      const { address, to, step, register, has, values, next } = reader;
      const shown = [0, 3, 6].map((slot) => ((has >> (slot / 3 + 1)) & 1) === 1 && values.slice(slot, slot + 3).join());
      found.push(
        outcome === 1
          ? { outcome, address, to, step, register, has, shown, next }
          : { outcome, next, reason: outcome === 2 && reader.reason() },
      );
    }
    return found;
  };
  fc.assert(
    fc.property(fc.constantFrom(...patterns), fc.array(pieces, { maxLength: 30 }), (pattern, lines) => {
      // Each line twice, so that there is a form to fit.
      const text = lines.map((line) => `${line.join('')}\n${line.join('')}\n`).join('');
      expect(said(new MouldedReader(pattern), bytesOf(text))).toEqual(said(new ColumnReader(pattern), bytesOf(text)));
    }),
    {
      numRuns: 500,
      examples: [
        [
          { ...plain, written: 3, read: 5 },
          [
            ['1A80 TO 1A90', ' w:', '00-', ' ', '00', ''],
            ['1A80 TO 1A90', ' w:', '00', ' R ', '00', ''],
          ],
        ],
      ],
    },
  );
});

it('comes to the same tally as the same readings typed', () => {
  const value = fc.integer({ min: 0, max: 255 });
  const lines = fc.array(fc.record({ address: fc.integer({ min: 0, max: 0x1ffff }), written: value, read: value }), {
    minLength: 1,
    maxLength: 60,
  });
  const map = addressMapOf(two);
  fc.assert(
    fc.property(lines, (readings) => {
      const text = readings
        .map((line) => `${line.address.toString(16)} W ${line.written.toString(16)} R ${line.read.toString(16)}`)
        .join('\n');
      const { evidence } = parseReadings(two, text, { pattern: plain });
      if (evidence?.kind !== 'readings') throw new Error('These are readings.');
      const typed = tallyReadings(map, evidence).ways[0]!.tally;
      const logged = tallyOfLog(map, imported(text).evidence);
      const counts = (tally: typeof typed) =>
        [...tally.lanes]
          .map(
            ([
              lane,
              { readsOne, readsZero, rightZeros, rightOnes, alone, words, rows, columns, row, column, ones, zeros },
            ]) => ({
              ...{ lane, readsOne, readsZero, rightZeros, rightOnes, alone, words, rows, columns, row, column },
              ...(words === 0 ? {} : { ones, zeros }),
            }),
          )
          .sort((a, b) => a.lane - b.lane);
      expect(counts(logged)).toEqual(counts(typed));
      const pairs = ({ values }: typeof typed) =>
        values.map(({ bank, written, read, count }) => `${bank} ${written} ${read} ${count}`).sort();
      expect(pairs(logged)).toEqual(pairs(typed));
    }),
    { numRuns: 100 },
  );
});

it('counts different failing words as "at least" where the memory is too large to keep each of them', () => {
  const input = buildLayoutInput({ banks: 1 });
  const words = 2 ** 32;
  const huge = buildLayoutIndex(
    layoutDocument.parse({
      ...input,
      memory: { dataBits: 8, banks: [{ id: 'A', words }] },
      addressMap: { windows: [{ range: { from: 0, to: words - 1 }, banks: ['A'] }] },
      multiplexing: { row: [0, 1, 2, 3], column: [4, 5, 6, 7] },
    }),
  );
  const text = [...Array(5000).keys()].map((n) => `${(0x10000001 + n * 0x10000).toString(16)} W 00 R 01\n`).join('');
  const { evidence, summary } = imported(text, { index: huge });
  const [lane] = evidence.lanes;
  expect(lane!.words).toBeGreaterThan(4950);
  expect(lane!.words).toBeLessThanOrEqual(5000);
  expect(lane).toMatchObject({ rows: 1, row: 1, columns: 1, column: 0, readsOne: 5000 });
  expect(lane!.ones % 2).toBe(1);
  expect(summary.lanes[0]!.atLeast).toBe(true);
  expect(summary.notes.join()).toContain('at least');
});

it('counts every pair of values exactly for each lane, however many pairs there are', () => {
  const wide = buildLayoutIndex(buildLayout({ banks: 1, bits: 16 }));
  const lines = [...Array(40_000).keys()].map((n) => {
    const value = (n * 40_503) % 65_536;
    return `${(n % 65_536).toString(16)} W ${value.toString(16)} R ${(value ^ 4).toString(16)}\n`;
  });
  const { evidence } = imported(lines.join(''), { index: wide });
  expect(evidence.lanes).toHaveLength(1);
  expect(evidence.lanes[0]).toMatchObject({ bit: 2, alone: 40_000, words: 40_000 });
  expect(evidence.lanes[0]!.readsOne + evidence.lanes[0]!.readsZero).toBe(40_000);
  expect(evidence.right.every(({ zeros, ones }) => zeros + ones === 40_000)).toBe(true);
  expect(evidence.values).toHaveLength(256);
});

describe('the sample of a log', () => {
  it('is of the lines that report, not of those that greet', () => {
    const greeting = [...Array(300).keys()].map((n) => `Testing block ${n}`);
    const reports = [...Array(40).keys()].map((n) => `ERR ${(0x1000 + n).toString(16)} WR 00 RD 01`);
    const sample = sampleOfLog([...greeting, 'ADDR WR RD', ...reports].join('\n'));
    expect(sample[0]).toBe('ADDR WR RD');
    expect(sample.filter((line) => line.startsWith('ERR'))).toHaveLength(40);
    expect(sample.length).toBeLessThanOrEqual(64);
    expect(parseReadings(two, sample.join('\n')).pattern).toMatchObject({ written: 'WR', read: 'RD' });
  });

  it('is short whatever the log is', () => {
    expect(sampleOfLog('')).toEqual([]);
    expect(sampleOfLog('x\n'.repeat(10_000)).length).toBeLessThanOrEqual(64);
    expect(sampleOfLog('1 2 3\n'.repeat(10_000)).length).toBeLessThanOrEqual(64);
  });
});
