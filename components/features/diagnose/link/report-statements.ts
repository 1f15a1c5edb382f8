import type { Evidence } from '@/shared';
import { escapeField, readField } from './link-text';
import { fromHex, hex, statement, whole, type Statement } from './statement';

type Of<Kind extends Evidence['kind']> = Extract<Evidence, { kind: Kind }>;
type LaneList = Of<'lanes'>['failing'];

/** `c.lamp.C5`: a code in a format. A dot that somebody typed by hand belongs to the code. */
const plainCode: Statement<Of<'code'>> = {
  write: ({ format, text }) => statement('c', format, text),
  read: ([format = '', ...text]) => ({
    kind: 'code',
    format: readField(format),
    text: text.map(readField).join('.'),
  }),
};

/** `q.first-order.lamp.C5`: a code of which is doubted from where it counts, which end is bit 0, or both. */
export const doubtedCode: Statement<Of<'code'>> = {
  write: ({ format, text, doubts = [] }) =>
    `q.${doubts.length === 0 ? '-' : doubts.join('-')}.${escapeField(format)}.${escapeField(text)}`,
  read: ([doubts = '', ...code]) => ({
    ...(plainCode.read(code) as object),
    doubts: doubts === '-' ? [] : doubts.split('-'),
  }),
};

/** A code, with its doubts where it has any. */
export const codeStatement: Statement<Of<'code'>> = {
  write: (seen) => (seen.doubts === undefined ? plainCode : doubtedCode).write(seen),
  read: plainCode.read,
};

/** `m.C.28`: the failing bits of a bank as a mask in hexadecimal. */
export const maskStatement: Statement<Of<'mask'>> = {
  write: ({ bank, mask }) => statement('m', bank, hex(mask)),
  read: ([bank = '', mask = '']) => ({ kind: 'mask', bank: readField(bank), mask: fromHex(readField(mask)) }),
};

/** `p`: all passed; `p.A.B`: these banks passed; `p.-`: none of them. */
export const passStatement: Statement<Of<'pass'>> = {
  write: ({ banks }) => (banks === undefined ? 'p' : banks.length === 0 ? 'p.-' : statement('p', ...banks)),
  read: (fields) =>
    fields.length === 0 ? { kind: 'pass' } : { kind: 'pass', banks: fields[0] === '-' ? [] : fields.map(readField) },
};

/** `l.rest.C-3-5`: failing lanes, bank and bits. `rest`, `none` or `some` says what passed; `some` lists it after `ok`. */
export const lanesStatement: Statement<Of<'lanes'>> = {
  write: ({ failing, passed }) =>
    typeof passed === 'string'
      ? ['l', passed, ...writeGroups(failing)].join('.')
      : ['l', 'some', ...writeGroups(failing), 'ok', ...writeGroups(passed)].join('.'),
  read: ([passed, ...groups]) => {
    if (passed !== 'some') return { kind: 'lanes', failing: groups.flatMap(readGroup), passed };
    const ok = groups.indexOf('ok');
    const end = ok < 0 ? groups.length : ok;
    return {
      kind: 'lanes',
      failing: groups.slice(0, end).flatMap(readGroup),
      passed: groups.slice(end + 1).flatMap(readGroup),
    };
  },
};

/** Neighbouring lanes of one bank share a group, which keeps their order. */
function writeGroups(lanes: LaneList): string[] {
  const groups: { bank: string; bits: number[] }[] = [];
  for (const { bank, bit } of lanes) {
    const last = groups.at(-1);
    if (last?.bank === bank) last.bits.push(bit);
    else groups.push({ bank, bits: [bit] });
  }
  return groups.map(({ bank, bits }) => [escapeField(bank), ...bits].join('-'));
}

function readGroup(group: string): { bank: string; bit: number }[] {
  const [bank = '', ...bits] = group.split('-');
  return bits.map((bit) => ({ bank: readField(bank), bit: whole(bit) }));
}
