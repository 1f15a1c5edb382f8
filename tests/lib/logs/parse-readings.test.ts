import fc from 'fast-check';
import { evidence as evidenceSchema, layoutDocument } from '@/shared';
import { buildLayoutIndex, eitherReadings, type LayoutIndex, parseReadings } from '@/lib';
import { buildLayout, buildLayoutInput, type LayoutOptions } from '../../factories/layout';

const indexOf = (options: LayoutOptions) => buildLayoutIndex(buildLayout(options));
/** Bytes at 00000 to 1FFFF. */
const bytes = indexOf({ banks: 2 });
/** Words of 16 bits, the high byte at the even address, 00000 to 3FFFF. */
const wide = indexOf({ banks: 2, bits: 16, byteLanes: 'big-endian' });

function readingsOf(text: string, index: LayoutIndex = bytes) {
  const parsed = parseReadings(index, text);
  if (parsed.evidence !== null) expect(evidenceSchema.safeParse(parsed.evidence).error).toBeUndefined();
  return parsed.evidence?.kind === 'readings' ? parsed.evidence.lines : parsed.evidence;
}

describe('one reading, in the words that machines and technicians use', () => {
  it.each([
    '1A80 W 00 R 20',
    '01A80 00 20',
    '01A80,00,20',
    '01A80: 00 -> 20',
    '$01A80 wrote $00 read $20',
    '0x1A80: expected 0x00, actual 0x20',
    'EXPECTED 00 ACTUAL 20 AT 01A80',
    'read error at 1A80h should be 00h is 20h',
    'ADDR=01A80 S/B=00 WAS=20',
    'pass 3 addr 01A80 good 00 bad 20',
    'ERROR AT LOCATION 1A80 WANT 00 GOT 20',
    '01A80 W00 R20',
    'wrote data 00 read data 20 address 01A80',
  ])('%s', (text) => expect(readingsOf(text)).toEqual([{ address: 0x1a80, written: 0, read: 0x20 }]));

  it('takes read before written where a heading or a word says so', () => {
    const reading = [{ address: 0x1a80, written: 0, read: 0x20 }];
    expect(readingsOf('ADDRESS ACTUAL EXPECTED\n01A80 20 00')).toEqual(reading);
    expect(readingsOf('01A80 got 20 want 00')).toEqual(reading);
  });

  it('takes failing bits in place of values', () => {
    expect(readingsOf('addr 01A80 mask 24')).toEqual([{ address: 0x1a80, mask: 0x24 }]);
    expect(readingsOf('01A80 xor 24')).toEqual([{ address: 0x1a80, mask: 0x24 }]);
  });

  it('knows the column that is the exclusive-or of two others, and passes over a number of the line', () => {
    const lines = '1 01A80 FF DF 20\n2 01A84 FF DF 20\n3 01A88 00 20 20';
    expect(readingsOf(lines)).toEqual([
      { address: 0x1a80, written: 0xff, read: 0xdf },
      { address: 0x1a84, written: 0xff, read: 0xdf },
      { address: 0x1a88, written: 0x00, read: 0x20 },
    ]);
  });

  it('takes values in binary where the board has as many bits as digits', () => {
    expect(readingsOf('01A80 00000000 00100000')).toEqual([{ address: 0x1a80, written: 0, read: 0x20 }]);
  });
});

describe('runs of addresses', () => {
  it.each([
    '01A80 TO 01AFF W 00 R 01',
    '01A80-01AFF W 00 R 01',
    '1A80 – 1AFF W 00 R 01',
    '1A80..1AFF wrote 00 read 01',
  ])('%s', (text) => expect(readingsOf(text)).toEqual([{ address: 0x1a80, to: 0x1aff, written: 0, read: 1 }]));

  it('go in steps, and go on from the line before', () => {
    expect(readingsOf('0035 TO 3FB5 STEP 80 W 00 R 01')).toEqual([
      { address: 0x35, to: 0x3fb5, step: 0x80, written: 0, read: 1 },
    ]);
    expect(readingsOf('00035 W 00 R 01\n000B5 W 00 R 01\n... every 80 hex to 3FB5, 128 lines')).toEqual([
      { address: 0x35, written: 0, read: 1 },
      { address: 0xb5, written: 0, read: 1 },
      { address: 0x135, to: 0x3fb5, step: 0x80, written: 0, read: 1 },
    ]);
  });

  it('are not made of a dash between address and value', () => {
    expect(readingsOf('01A80-00-20')).toEqual([{ address: 0x1a80, written: 0, read: 0x20 }]);
  });
});

describe('what a text says of the rest', () => {
  const restOf = (text: string) => {
    const { evidence } = parseReadings(bytes, text);
    return evidence?.kind === 'readings' ? evidence.rest : evidence?.kind;
  };

  it.each(['01A80 W 00 R 01, rest clean', '01A80 W 00 R 01\nall else passed', '01A80 W 00 R 01\nno other errors'])(
    'takes "%s" for the whole memory tested',
    (text) => {
      expect(restOf(text)).toBe('passed');
      expect(parseReadings(bytes, text).unread).toEqual([]);
    },
  );

  it('takes nothing of the rest for granted otherwise', () => {
    expect(restOf('01A80 W 00 R 01')).toBe('unknown');
    expect(restOf('01A80 W 00 R 01\nrest not clean')).toBe('unknown');
  });

  it('knows a text that says that all passed', () => {
    expect(restOf('ALL PASSED')).toBe('pass');
    expect(restOf('3 LONG 5 SHORT')).toBeUndefined();
  });

  it('takes "no even address failed" as every even address read rightly', () => {
    expect(readingsOf('01A81 W 00 R 01\nNO EVEN ADDRESS FAILED')).toEqual([
      { address: 0x1a81, written: 0, read: 1 },
      { address: 0, to: 0x1ffff, step: 2, mask: 0 },
    ]);
  });
});

describe('lines that cannot be read', () => {
  it('come back with their numbers and reasons', () => {
    const { unread, lines } = parseReadings(bytes, '01A80 W 00 R 01\n\nhello\n01A82 W 00 R ZZ\n01A84 W 00 R 101');
    expect(lines).toBe(4);
    expect(unread).toEqual([
      { line: 3, text: 'hello', reason: expect.stringContaining('There is no address') },
      { line: 4, text: '01A82 W 00 R ZZ', reason: expect.stringContaining('There is no value read') },
      { line: 5, text: '01A84 W 00 R 101', reason: '101 does not fit: bank A shows 8 bits at an address.' },
    ]);
  });

  it('name the nearest window where the address leads nowhere', () => {
    const { evidence, unread } = parseReadings(bytes, 'F0000 W 00 R 01');
    expect(evidence).toBeNull();
    expect(unread).toEqual([
      {
        line: 1,
        text: 'F0000 W 00 R 01',
        reason: "F0000 lies outside this board's memory; the nearest window is 10000 to 1FFFF.",
      },
    ]);
  });

  it('may have an order of their own', () => {
    expect(readingsOf('01A80 W 00 R 01\n01A82 W 00 R 01\ngot 03 want 00 at 01A84')).toEqual([
      { address: 0x1a80, written: 0, read: 1 },
      { address: 0x1a82, written: 0, read: 1 },
      { address: 0x1a84, written: 0, read: 3 },
    ]);
  });
});

describe('octal or hexadecimal', () => {
  const octalOrHex = 'AT 013052 WANT 000000 GOT 000400';

  it('keeps both where both fit, and says so', () => {
    const { evidence, candidates, notes } = parseReadings(wide, octalOrHex);
    expect(candidates.slice(0, 2).map((pattern) => 'notation' in pattern && pattern.notation)).toEqual([
      'octal',
      'hexadecimal',
    ]);
    expect(notes.join(' ')).toContain('Open: the log is hexadecimal.');
    expect(evidence).toMatchObject({
      kind: 'either',
      ways: [
        { takes: 'the log is octal', evidence: { shows: 'word', lines: [{ address: 0o13052, read: 0o400 }] } },
        { takes: 'the log is hexadecimal', evidence: { shows: 'word', lines: [{ address: 0x13052, read: 0x400 }] } },
      ],
    });
  });

  it('takes what is said to be true', () => {
    const pattern = {
      address: 'AT',
      written: 'WANT',
      read: 'GOT',
      notation: 'octal',
      unit: 'word',
      shows: 'word',
    } as const;
    const { evidence } = parseReadings(wide, octalOrHex, { pattern });
    expect(evidence).toEqual({
      ...{ kind: 'readings', unit: 'word', shows: 'word', rest: 'unknown' },
      lines: [{ address: 0o13052, written: 0, read: 0o400 }],
    });
    const hexadecimal = { ...pattern, notation: 'hexadecimal' } as const;
    expect(eitherReadings(wide, octalOrHex, [pattern, hexadecimal])).toMatchObject({ kind: 'either' });
    expect(eitherReadings(wide, octalOrHex, [pattern, pattern])).toMatchObject({ kind: 'readings' });
  });

  it('is settled by a digit, and by many addresses without an 8', () => {
    expect(readingsOf('AT 01305A WANT 0000 GOT 0400', wide)).toMatchObject([{ address: 0x1305a, read: 0x400 }]);
    const many = [...Array(24).keys()].map(
      (n) => `AT ${(n * 458).toString(8).padStart(6, '0')} WANT 000000 GOT 000400`,
    );
    expect(readingsOf(many.join('\n'), wide)).toHaveLength(24);
    expect(parseReadings(wide, many.join('\n')).pattern).toMatchObject({ notation: 'octal' });
  });

  it('follows the notation of the board', () => {
    const input = buildLayoutInput({ banks: 2 });
    const octal = buildLayoutIndex(
      layoutDocument.parse({ ...input, addressMap: { ...input.addressMap, notation: 'octal' } }),
    );
    expect(readingsOf('015200 000 040', octal)).toEqual([{ address: 0o15200, written: 0, read: 0o40 }]);
  });
});

it('takes the register of a paged memory from the line', () => {
  const input = buildLayoutInput({ banks: 2 });
  const windows = ['A', 'B'].map((bank, page) => ({
    range: { from: 0, to: 0xffff },
    register: { name: 'PAGE', value: page },
    banks: [bank],
  }));
  const paged = buildLayoutIndex(layoutDocument.parse({ ...input, addressMap: { windows } }));
  expect(readingsOf('page 1 addr 1A80 w 00 r 20', paged)).toEqual([
    { address: 0x1a80, written: 0, read: 0x20, register: { name: 'PAGE', value: 1 } },
  ]);
});

it('hands more readings than one piece of evidence holds over as a log', () => {
  const text = [...Array(1500).keys()].map((n) => `${(0x1000 + n).toString(16)} W 00 R 20`).join('\n');
  const { evidence, notes } = parseReadings(bytes, text);
  expect(evidence).toMatchObject({
    kind: 'log',
    lines: 1500,
    readings: 1500,
    lanes: [{ bank: 'A', bit: 5, words: 1500 }],
  });
  expect(notes.join(' ')).toContain('1500');
});

it('never throws, and gives only evidence that the schema allows', () => {
  const words = fc.constantFrom(
    '1A80',
    '00',
    'FF',
    'W',
    'R',
    'at',
    'TO',
    '-',
    '..',
    'mask',
    '0x',
    'h',
    ':',
    '\n',
    'every',
    'PAGE',
  );
  const texts = fc.oneof(
    fc.string({ maxLength: 200 }),
    fc.array(words, { maxLength: 40 }).map((parts) => parts.join(' ')),
  );
  fc.assert(
    fc.property(texts, fc.constantFrom(bytes, wide), (text, index) => {
      const { evidence } = parseReadings(index, text);
      if (evidence !== null) expect(evidenceSchema.safeParse(evidence).error).toBeUndefined();
    }),
    { numRuns: 400 },
  );
});
