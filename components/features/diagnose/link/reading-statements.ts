import type { Evidence, LaneTally, LogEvidence, Reading, Readings } from '@/shared';
import { escapeField, readField } from './link-text';
import { dashed, decimal, fromDecimal, fromTagged, hex, tagged, whole, type Statement } from './statement';

type Alias = Extract<Evidence, { kind: 'alias' }>;

/**
 * `r.-.4C1AwFFrF7.4C1Bm8`: readings, one line a field after the switches. All numbers in hexadecimal: the address, then
 * t the last address of a run, s its step, w written, r read, m mask; `-page-3` after them: a register and its value.
 * Switches: w addresses count words, v a value is a whole word, p all else passed, `t` and a number the seconds that
 * were waited; `-` for none of them.
 */
export const readingsStatement: Statement<Readings> = {
  write: ({ lines, unit, shows, rest, waited }) => {
    const switches = [
      unit === 'word' ? 'w' : '',
      shows === 'word' ? 'v' : '',
      rest === 'passed' ? 'p' : '',
      waited === undefined ? '' : `t${decimal(waited)}`,
    ].join('');
    return ['r', switches === '' ? '-' : switches, ...lines.map(writeLine)].join('.');
  },
  read: ([switches = '', ...lines]) => {
    const [, unit, shows, rest, waited] = /^-?(w?)(v?)(p?)(?:t(.+))?$/.exec(switches) ?? [];
    if (unit === undefined) return null;
    return {
      kind: 'readings',
      lines: lines.map(readLine),
      unit: unit === '' ? 'address' : 'word',
      shows: shows === '' ? 'address' : 'word',
      rest: rest === '' ? 'unknown' : 'passed',
      waited: waited === undefined ? undefined : fromDecimal(waited),
    };
  },
};

function writeLine({ address, to, step, written, read, mask, register }: Reading): string {
  const own = hex(address) + tagged({ t: to, s: step, w: written, r: read, m: mask });
  return register === undefined ? own : `${own}-${escapeField(register.name)}-${hex(register.value)}`;
}

function readLine(line: string): unknown {
  const [own = '', name, value] = line.split('-');
  const found = fromTagged(own);
  if (found === null) return null;
  const { '': address, t: to, s: step, w: written, r: read, m: mask } = found;
  const register = name === undefined ? undefined : { name: readField(name), value: `0x${value ?? ''}` };
  return { address, to, step, written, read, mask, register };
}

/** `a.1000-1400.3-5`: two addresses, in hexadecimal, that lead to one cell, and the bits in which they do. */
export const aliasStatement: Statement<Alias> = {
  write: ({ addresses, bits }) =>
    ['a', addresses.map(hex).join('-'), ...(bits === undefined ? [] : [bits.join('-')])].join('.'),
  read: ([addresses = '', bits]) => ({
    kind: 'alias',
    addresses: addresses.split('-').map((each) => `0x${each}`),
    bits: bits === undefined ? undefined : bits.split('-').map(whole),
  }),
};

/**
 * `f.-.night_2E_log.g1000h1000.l-C-5-…`: a log drawn together. The switch (p: all else passed), its name, its lines, and
 * then one field each: `l` what was said of a lane, `v` a pair of written and read, `o` what a lane was seen to read
 * rightly. Numbers in hexadecimal, each after its letter; what is 0 is left out.
 */
export const logStatement: Statement<LogEvidence> = {
  write: ({ name, rest, lines, readings, unread, outside, values, lanes, right }) =>
    [
      'f',
      rest === 'passed' ? 'p' : '-',
      escapeField(name),
      short({ g: lines, h: readings, i: unread, j: outside }),
      ...lanes.map(writeTally),
      ...values.map(
        ({ bank, written, read, count }) =>
          `v-${escapeField(bank)}-${tagged({ w: written, r: read })}${short({ n: count })}`,
      ),
      ...right.map(({ bank, bit, zeros, ones }) => `o-${escapeField(bank)}-${bit}-${short({ z: zeros, o: ones })}`),
    ].join('.'),
  read: ([rest, name = '', counts = '', ...parts]) => {
    const all = fromTagged(counts);
    const read = parts.map((part) => dashed(part));
    const of = (letter: string) => read.filter(([own]) => own === letter);
    if (all === null || read.some(([own]) => own === undefined || !['l', 'v', 'o'].includes(own))) return null;
    return {
      kind: 'log',
      name: readField(name),
      rest: rest === 'p' ? 'passed' : 'unknown',
      ...counted(all, { lines: 'g', readings: 'h', unread: 'i', outside: 'j' }),
      lanes: of('l').map(readTally),
      values: of('v').map(([, bank, text = '']) => {
        const found = fromTagged(text) ?? {};
        return { bank, written: found.w, read: found.r, ...counted(found, { count: 'n' }) };
      }),
      right: of('o').map(([, bank, bit, text = '']) => ({
        bank,
        bit: whole(bit),
        ...counted(fromTagged(text) ?? {}, { zeros: 'z', ones: 'o' }),
      })),
    };
  },
};

const tallyLetters = {
  readsOne: 'o',
  readsZero: 'z',
  alone: 's',
  words: 'w',
  rows: 'r',
  columns: 'k',
  ones: 'p',
  zeros: 'm',
  first: 'g',
  last: 'h',
} as const satisfies Partial<Record<keyof LaneTally, string>>;

function writeTally(tally: LaneTally): string {
  const counts = Object.fromEntries(
    Object.entries(tallyLetters).map(([field, letter]) => [letter, tally[field as keyof typeof tallyLetters]]),
  );
  return `l-${escapeField(tally.bank)}-${tally.bit}-${tagged({ x: tally.row, y: tally.column })}${short(counts)}`;
}

function readTally([, bank, bit, text = '']: readonly string[]): unknown {
  const found = fromTagged(text);
  if (found === null) return null;
  return { bank, bit: whole(bit), row: found.x, column: found.y, ...counted(found, tallyLetters) };
}

/** Tagged numbers of which 0 is left out. */
const short = (values: Readonly<Record<string, number>>): string =>
  tagged(Object.fromEntries(Object.entries(values).filter(([, value]) => value !== 0)));

/** The numbers of some fields by their letters; 0 where one is left out. */
const counted = (found: Readonly<Record<string, string>>, letters: Readonly<Record<string, string>>) =>
  Object.fromEntries(Object.entries(letters).map(([field, letter]) => [field, found[letter] ?? 0]));
