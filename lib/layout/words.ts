import type { LayoutDocument } from '@/shared';

type Memory = LayoutDocument['memory'];

/** "bank B"; an id that already says bank, such as "BANK0", is left as it is. */
export function bankWords(id: string): string {
  return /^bank/i.test(id) ? id : `bank ${id}`;
}

/** What the board calls a bit: its name where it has one, else its number. */
export function bitName(memory: Memory, bit: number): string {
  return memory.bitNames?.[bit] ?? String(bit);
}

/** "bit 3", "the parity bit" for the only check bit where it has no name of its own, "check bit 17" for one of several. */
export function bitWords(memory: Memory, bit: number): string {
  const name = memory.bitNames?.[bit];
  if (!memory.checkBits.includes(bit)) return `bit ${name ?? bit}`;
  if (name !== undefined && name !== String(bit)) return `bit ${name}`;
  return memory.checkBits.length === 1 ? 'the parity bit' : `check bit ${bit}`;
}

/** A data line in short: "D3", or the bit's own name. */
export function lineLabel(memory: Memory, bit: number): string {
  const name = bitName(memory, bit);
  return /^\d+$/.test(name) ? `D${name}` : name;
}

/** "A", "A and B", "A, B and C"; more than `most` are cut to the first few and a count. */
export function listWords(items: readonly string[], most = 6): string {
  if (items.length <= 1) return items.join('');
  if (items.length > most) return `${items.slice(0, most).join(', ')} and ${items.length - most} more`;
  return `${items.slice(0, -1).join(', ')} and ${items[items.length - 1]}`;
}

/** Capital first letter, for the start of a sentence. */
export function sentenceCase(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

function oneAfterTheOther(ids: readonly string[]): boolean {
  const codes = ids.map((id) => (/^\d+$/.test(id) ? Number(id) : id.length === 1 ? id.charCodeAt(0) : NaN));
  return codes.every((code, i) => i === 0 || code === codes[i - 1]! + 1);
}

/** "A to D" where the ids follow one another, else "UPPER, LOWER and MID". */
export function rangeWords(ids: readonly string[]): string {
  if (ids.length > 2 && oneAfterTheOther(ids)) return `${ids[0]} to ${ids[ids.length - 1]}`;
  return listWords(ids);
}

/** Numbers in ascending order with runs drawn together: "0 to 7 and 9". */
export function numbersWords(numbers: readonly number[]): string {
  const runs: [number, number][] = [];
  for (const n of numbers) {
    const last = runs[runs.length - 1];
    if (last !== undefined && n === last[1] + 1) last[1] = n;
    else runs.push([n, n]);
  }
  const items = runs.flatMap(([from, to]) =>
    from === to ? [`${from}`] : to === from + 1 ? [`${from}`, `${to}`] : [`${from} to ${to}`],
  );
  return listWords(items);
}

/** An address as this machine writes it, padded to `digits` or to the machine's usual width. */
export function addressWords(map: LayoutDocument['addressMap'], address: number, digits = map.digits): string {
  const radix = map.notation === 'hexadecimal' ? 16 : map.notation === 'octal' ? 8 : 10;
  const widest = Math.max(0, ...map.windows.map((window) => window.range.to));
  const width = digits ?? (radix === 10 ? 1 : widest.toString(radix).length);
  return address.toString(radix).toUpperCase().padStart(width, '0');
}
