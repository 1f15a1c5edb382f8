import { buildFormat, laneNames } from '@/tests/factories/format';

const lamp = buildFormat({ parts: [{ field: 'bank', notation: 'letter' }, { field: 'bit' }] });
const keysOf = ({ format }: typeof lamp, text: string) =>
  format
    .next(text)
    .keys.map(({ label, enabled }) => (enabled ? label : `(${label})`))
    .join(' ');

describe('the keypad', () => {
  it('has only the keys that the format can take, and the same ones all the time', () => {
    expect(keysOf(lamp, '')).toBe('A B C D (0) (1) (2) (3) (4) (5) (6) (7)');
    expect(keysOf(lamp, 'C')).toBe('(A) (B) (C) (D) 0 1 2 3 4 5 6 7');
    expect(keysOf(lamp, 'C5')).toBe('(A) (B) (C) (D) (0) (1) (2) (3) (4) (5) (6) (7)');
  });

  it('says what it waits for, what is still possible and when the code is whole', () => {
    const begun = lamp.format.next('C');
    expect([begun.expects, begun.complete, begun.reason]).toEqual(['bank A to D, then bit 0 to 7', false, null]);
    expect(laneNames(lamp.index, begun.possible)).toEqual(['C0', 'C1', 'C2', 'C3', 'C4', 'C5', 'C6', 'C7']);
    const whole = lamp.format.next('C5');
    expect([whole.complete, laneNames(lamp.index, whole.possible)]).toEqual([true, ['C5']]);
  });

  it('takes small letters from a keyboard', () => {
    expect(lamp.format.next('c').possible).toHaveLength(8);
    expect(lamp.format.next('c5').complete).toBe(true);
  });

  it('says at once why no code begins so', () => {
    expect(lamp.format.next('E')).toMatchObject({
      complete: false,
      possible: [],
      reason: 'Bank E: this board has banks A to D.',
    });
    expect(lamp.format.next('C9').reason).toBe('Bit 9: this board has bits 0 to 7.');
    expect(lamp.format.next('7').reason).toBe('The code begins with a bank, A to D.');
  });

  it('fills in fixed text by itself', () => {
    const beeps = buildFormat({
      parts: [
        { field: 'bank', notation: 'flashes', first: 1 },
        { text: ' LONG ' },
        { field: 'bit', notation: 'flashes', first: 1 },
        { text: ' SHORT' },
      ],
    });
    expect([beeps.format.next('').fills, beeps.format.next('3').fills, beeps.format.next('3 LONG 5').fills]).toEqual([
      '',
      ' LONG ',
      ' SHORT',
    ]);
    expect(keysOf(beeps, '')).toBe('1 2 3 4 (5) (6) (7) (8)');
  });

  it('gives fixed text a key where only it shows that a number has ended', () => {
    const many = buildFormat(
      { parts: [{ field: 'bank', notation: 'names' }, { text: '-' }, { field: 'bit' }] },
      { banks: 20, bankNames: 'numbers' },
    );
    expect(many.format.next('1').fills).toBe('');
    expect(many.format.next('1').keys.find(({ text }) => text === '-')).toMatchObject({ enabled: true });
    expect(many.format.next('12').fills).toBe('-');
  });

  it('puts in a word of several letters with one key', () => {
    const named = buildFormat(
      { parts: [{ field: 'bank', notation: 'names' }, { text: ' ' }, { field: 'bit' }] },
      {
        banks: 2,
        change: (input) =>
          JSON.parse(JSON.stringify(input).replaceAll('"A"', '"LOWER"').replaceAll('"B"', '"UPPER"')) as typeof input,
      },
    );
    expect(keysOf(named, '')).toBe('LOWER UPPER (0) (1) (2) (3) (4) (5) (6) (7)');
    expect(named.format.next('UPPER').fills).toBe(' ');
  });

  it('narrows a mask by the digits typed so far', () => {
    const mask = buildFormat({
      parts: [
        { field: 'bank', notation: 'letter' },
        { text: ' ' },
        { field: 'mask', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
      ],
    });
    expect(laneNames(mask.index, mask.format.next('A 2').possible)).toEqual(['A0', 'A1', 'A2', 'A3', 'A5']);
    expect(
      mask.format
        .next('A 0')
        .keys.filter(({ enabled }) => !enabled)
        .map(({ label }) => label),
    ).toEqual(['0']);
  });

  it('narrows an address by the digits typed so far', () => {
    const log = buildFormat({
      parts: [
        { field: 'address', notation: 'hexadecimal', digits: { min: 5, max: 5 } },
        { text: ' ' },
        { field: 'mask', notation: 'hexadecimal' },
      ],
    });
    expect(new Set(laneNames(log.index, log.format.next('2').possible).map((name) => name[0]))).toEqual(new Set(['C']));
    expect(
      log.format
        .next('')
        .keys.filter(({ enabled }) => enabled)
        .map(({ label }) => label),
    ).toEqual(['0', '1', '2', '3']);
  });

  it('lets a code be typed that names something beyond the board', () => {
    const known = buildFormat(
      {
        parts: [
          { field: 'address', notation: 'hexadecimal', shift: 16, digits: { min: 1, max: 1 } },
          { field: 'mask', notation: 'hexadecimal' },
        ],
      },
      {
        change: (input) => ({
          ...input,
          addressMap: {
            ...input.addressMap,
            elsewhere: [{ range: { from: 0x90000, to: 0x9ffff }, means: 'memory on a card' }],
          },
        }),
      },
    );
    expect(
      known.format
        .next('')
        .keys.filter(({ enabled }) => enabled)
        .map(({ label }) => label),
    ).toEqual(['0', '1', '2', '3', '9']);
    expect(known.format.next('901')).toMatchObject({ complete: false, possible: [], reason: '9: memory on a card.' });
  });
});
