import { mostCharacters } from '@/lib/report/read';
import { limits } from '@/shared';
import { buildFormat, laneNames, meaning } from '@/tests/factories/format';

const lamp = buildFormat({ parts: [{ field: 'bank', notation: 'letter' }, { field: 'bit' }] });
const beeps = buildFormat(
  {
    parts: [
      { field: 'bank', notation: 'flashes', first: 1 },
      { text: ' LONG ' },
      { field: 'bit', notation: 'flashes', first: 1, table: [{ text: '9', bits: [8] }] },
      { text: ' SHORT' },
    ],
  },
  { parity: 1 },
);
const log = buildFormat(
  {
    parts: [
      { field: 'address', notation: 'hexadecimal' },
      { text: ' W ' },
      { field: 'written', notation: 'hexadecimal' },
      { text: ' R ' },
      { field: 'read', notation: 'hexadecimal' },
    ],
  },
  { banks: 2 },
);

describe('a code', () => {
  it('of a bank and a bit names one lane', () => {
    expect(meaning(lamp, 'C5')).toEqual(['C5']);
  });

  it('counted from 1 names the lane before its number', () => {
    expect(meaning(beeps, '3 LONG 6 SHORT')).toEqual(['C5']);
  });

  it('can be an exception that the table lists', () => {
    expect(meaning(beeps, '3 LONG 9 SHORT')).toEqual(['C8']);
  });

  it('with what was written and read names the bits that differ, and which way each fails', () => {
    const read = log.format.read('152A7 W 0F R 2E');
    expect(read.ok && read.readings[0]!.failing).toEqual([
      { lane: 8 + 0, reads: 'zero' },
      { lane: 8 + 5, reads: 'one' },
    ]);
    expect(read.ok && read.readings[0]!.address).toBe(0x152a7);
  });

  it('of a socket fails every lane that its chip holds', () => {
    const socket = buildFormat({ parts: [{ field: 'socket', notation: 'names' }] }, { chipWidth: 4, banks: 2 });
    expect(meaning(socket, 'U12')).toEqual(['B0 B1 B2 B3']);
  });

  it('of a bank alone is one of its bits, and which is not known', () => {
    const bank = buildFormat({ parts: [{ field: 'bank', notation: 'letter' }] }, { bits: 4 });
    expect(meaning(bank, 'B')).toEqual(['B0', 'B1', 'B2', 'B3']);
  });

  it('of a lane number counts the banks or the bits first', () => {
    const bankFirst = buildFormat({ parts: [{ field: 'lane' }] });
    const bitFirst = buildFormat({ parts: [{ field: 'lane', order: 'bit-first', bitOrder: 'high-first' }] });
    expect([meaning(bankFirst, '11'), meaning(bitFirst, '11')]).toEqual([['B3'], ['D5']]);
  });

  it('in one-hot digits names the bit whose digit is 1', () => {
    const hot = buildFormat({
      parts: [
        { field: 'bank', notation: 'one-hot' },
        { text: ' ' },
        { field: 'bit', notation: 'one-hot', bitOrder: 'high-first' },
      ],
    });
    expect(meaning(hot, '0100 00000001')).toEqual(['C7']);
    expect(meaning(hot, '0110 00000001')).toBe('0110: in this code just one of the digits is 1.');
  });

  it('with a constant written shows each bit by what was read', () => {
    const read = buildFormat({ parts: [{ field: 'read' }], bank: 'B', written: 85 });
    expect([meaning(read, '84'), meaning(read, '213')]).toEqual([['B0'], ['B7']]);
    expect(meaning(read, '85')).toBe('What was read is what was written: nothing failed here.');
  });

  it('with a word address names the whole word', () => {
    const word = buildFormat(
      {
        parts: [
          { text: 'AT ' },
          { field: 'address', notation: 'octal', shift: 1 },
          { text: ' BAD ' },
          { field: 'mask', notation: 'octal', digits: { min: 6, max: 6 } },
        ],
      },
      { banks: 2, bits: 16, byteLanes: 'big-endian' },
    );
    expect(meaning(word, 'AT 013052 BAD 000400')).toEqual(['A8']);
  });

  it('with a byte address and a byte mask names bits of that byte', () => {
    const byte = buildFormat(
      {
        parts: [
          { field: 'address', notation: 'hexadecimal' },
          { text: ' ' },
          { field: 'mask', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
        ],
      },
      { banks: 2, bits: 16, byteLanes: 'big-endian' },
    );
    expect([meaning(byte, '00100 01'), meaning(byte, '00101 01')]).toEqual([['A8'], ['A0']]);
  });
});

describe('an impossible code gives the reason', () => {
  it.each([
    ['C9', 'Bit 9: this board has bits 0 to 7.', 1],
    ['E3', 'Bank E: this board has banks A to D.', 0],
    ['C', 'After the bank comes a bit, 0 to 7.', 1],
    ['CX', 'After the bank comes a bit, 0 to 7.', 1],
    ['33', 'The code begins with a bank, A to D.', 0],
    ['C5!!', 'Nothing comes after the bit: "!!" is too much.', 2],
    ['  ', 'Nothing is typed yet.', 0],
  ])('%s', (text, reason, at) => {
    expect(lamp.format.read(text)).toEqual({ ok: false, reason, at });
  });

  it('as the machine counts', () => {
    expect(meaning(beeps, '3 LONG 0 SHORT')).toBe('Bit 0: this board has bits 1 to 8, and 9.');
    expect(meaning(beeps, '5 LONG 1 SHORT')).toBe('Bank 5: this board has banks 1 to 4.');
  });

  it('with the nearest memory for an address that leads nowhere, or with what is there', () => {
    expect(meaning(log, '20000 W 00 R 01')).toBe(
      "20000 is outside this board's memory. The nearest is 10000 to 1FFFF, bank B.",
    );
    const known = buildFormat(
      {
        parts: [
          { field: 'address', notation: 'hexadecimal' },
          { text: ' ' },
          { field: 'mask', notation: 'hexadecimal' },
        ],
      },
      {
        change: (input) => ({
          ...input,
          addressMap: {
            ...input.addressMap,
            elsewhere: [{ range: { from: 0x40000, to: 0x4ffff }, means: 'memory on the second board' }],
          },
        }),
      },
    );
    expect(meaning(known, '41234 01')).toBe('41234: memory on the second board.');
  });

  it('with the words of the table for a text that names no lane', () => {
    const worded = buildFormat({
      parts: [
        { field: 'bank', notation: 'letter', table: [{ text: 'X', means: 'the test itself failed' }] },
        { field: 'bit' },
      ],
    });
    expect(meaning(worded, 'X0')).toBe('X: the test itself failed.');
  });

  it('for a bit that this bank does not have', () => {
    const half = buildFormat(
      { parts: [{ field: 'bank', notation: 'letter' }, { field: 'bit' }] },
      {
        banks: 2,
        change: (input) => ({
          ...input,
          memory: {
            ...input.memory,
            banks: [input.memory.banks[0]!, { ...input.memory.banks[1]!, bits: [0, 1, 2, 3] }],
          },
        }),
      },
    );
    expect(meaning(half, 'B5')).toBe('Bit 5: bank B has bits 0 to 3.');
  });

  it('of its length, at once', () => {
    expect(mostCharacters).toBe(limits.reportText);
    expect(meaning(lamp, 'C'.repeat(10_240))).toBe('This is 10240 characters long; a code has at most 512.');
  });
});

describe('what was meant is read', () => {
  it.each([
    [' c5 ', 'C5', ['spaces left out', 'c read as C']],
    ['C ５', 'C5', ['spaces left out', '５ read as 5']],
    ['CO', 'C0', ['O read as 0']],
    ['Cl', 'C1', ['l read as 1']],
    ['cS', 'C5', ['c read as C', 'S read as 5']],
    ['8O', 'B0', ['8 read as B', 'O read as 0']],
  ])('%s as %s', (text, as, notes) => {
    const read = lamp.format.read(text);
    expect(read.ok && [read.text, [...read.notes].sort()]).toEqual([as, [...notes].sort()]);
  });

  it('with fixed words left out, where nothing else can be meant', () => {
    const read = beeps.format.read('3 long 6');
    expect(read.ok && [read.text, read.notes]).toEqual(['3 LONG 6 SHORT', ['"long" read as "LONG"', '"SHORT" added']]);
  });

  it('but not where two things can be meant', () => {
    const many = buildFormat(
      { parts: [{ field: 'bank', notation: 'names' }, { text: '-' }, { field: 'bit' }] },
      { banks: 20, bits: 16, bankNames: 'numbers' },
    );
    expect(meaning(many, '111')).toBe('This can be read as "11-1" or "1-11". Type it as the machine shows it.');
    expect(meaning(many, '1-11')).toEqual(['111']);
  });

  it('and a code that the machine itself writes alike for two lanes means both', () => {
    const glued = buildFormat(
      { parts: [{ field: 'bank', notation: 'names' }, { field: 'bit' }] },
      { banks: 20, bits: 16, bankNames: 'numbers' },
    );
    const read = glued.format.read('111');
    expect(
      read.ok &&
        read.readings.map(
          ({ failing }) =>
            laneNames(
              glued.index,
              failing.map(({ lane }) => lane),
            )[0],
        ),
    ).toEqual(['111', '111']);
    expect(read.ok && read.readings.map(({ takes }) => takes)).toEqual([['read as 11, 1'], ['read as 1, 11']]);
  });
});

describe('a convention that the layout does not know', () => {
  const open = buildFormat(
    {
      parts: [
        { field: 'bank', notation: 'letter' },
        { field: 'bit', first: 'unknown', bitOrder: 'unknown' },
      ],
    },
    { banks: 2 },
  );

  it('leaves every reading, each with what it takes', () => {
    const read = open.format.read('A3');
    expect(
      read.ok &&
        read.readings.map(({ failing, takes }) => [
          laneNames(
            open.index,
            failing.map(({ lane }) => lane),
          )[0],
          takes,
        ]),
    ).toEqual([
      ['A3', ['bits counted from 0', 'bit 0 is the lowest']],
      ['A2', ['bits counted from 1', 'bit 0 is the lowest']],
      ['A4', ['bits counted from 0', 'bit 0 is the highest']],
      ['A5', ['bits counted from 1', 'bit 0 is the highest']],
    ]);
  });

  it('is settled by a number that only one of them allows', () => {
    const read = open.format.read('A8');
    expect(read.ok && read.readings.map(({ takes }) => takes[0])).toEqual([
      'bits counted from 1',
      'bits counted from 1',
    ]);
    expect(meaning(open, 'A9')).toBe('Bit 9: this board has bits 0 to 7 or 1 to 8.');
  });

  it('does not matter where both answers mean the same', () => {
    const mask = buildFormat({
      parts: [
        { field: 'bank', notation: 'letter' },
        { text: ' ' },
        { field: 'mask', notation: 'hexadecimal', bitOrder: 'unknown' },
      ],
    });
    const read = mask.format.read('A 81');
    expect(read.ok && read.readings.map(({ takes }) => takes)).toEqual([[]]);
    expect(meaning(mask, 'A 01')).toEqual(['A0', 'A7']);
  });

  it('of a register leaves a bank for each value', () => {
    const paged = buildFormat(
      {
        parts: [
          { field: 'address', notation: 'hexadecimal' },
          { text: ' ' },
          { field: 'mask', notation: 'hexadecimal' },
        ],
      },
      {
        banks: 2,
        change: (input) => ({
          ...input,
          addressMap: {
            windows: ['A', 'B'].map((bank, value) => ({
              range: { from: 0, to: 0xffff },
              register: { name: 'page', value },
              banks: [bank],
            })),
          },
        }),
      },
    );
    const read = paged.format.read('1234 04');
    expect(read.ok && read.readings.map(({ failing, takes }) => [failing[0]!.lane, takes])).toEqual([
      [2, ['page = 0']],
      [10, ['page = 1']],
    ]);
  });
});

describe('a doubt', () => {
  it('about a count leaves both readings', () => {
    expect(meaning(beeps, '3 LONG 5 OR 6 SHORT')).toEqual(['C4', 'C5']);
    const read = beeps.format.read('3 long 5 or 6 short');
    expect(read.ok && [read.text, read.readings.map(({ takes }) => takes)]).toEqual([
      '3 LONG 5 SHORT or 3 LONG 6 SHORT',
      [['"5" is right'], ['"6" is right']],
    ]);
  });

  it('that holds something impossible says which', () => {
    expect(meaning(beeps, '3 LONG 8 OR 10 SHORT')).toBe('With "10": Bit 10: this board has bits 1 to 8, and 9.');
  });
});
