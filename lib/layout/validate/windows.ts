import type { AddressWindow, LayoutProblem } from '@/shared';
import { parityOfBits } from '../../place/address-bits';
import { addressWords, bankWords, listWords, numbersWords, sentenceCase } from '../words';
import { type Checked, bitOutOfRange, error, repeats, warning } from './problem';

interface Placed {
  readonly window: AddressWindow;
  readonly pointer: string;
}

function bankList({ index }: Checked, { window, pointer }: Placed): LayoutProblem[] {
  const problems = window.banks.flatMap((id, n) =>
    index.bankByName.has(id)
      ? []
      : [error({ pointer: `${pointer}/banks/${n}`, code: 'unknown-bank', message: `There is no bank "${id}".` })],
  );
  const twice = repeats(window.banks).map(({ at, item }) =>
    error({
      pointer: `${pointer}/banks/${at}`,
      code: 'window-bank-twice',
      message: `${sentenceCase(bankWords(item))} is behind this window twice.`,
    }),
  );
  const wanted = 2 ** window.interleave.length;
  if (window.banks.length === wanted) return [...problems, ...twice];
  const message =
    window.interleave.length === 0
      ? `A window without interleave has one bank behind it, and this one names ${window.banks.length}. Add the address bits that choose between them, or make a window of each.`
      : `${window.interleave.length} interleave ${window.interleave.length === 1 ? 'bit tells' : 'bits tell'} ${wanted} banks apart, and ${window.banks.length} are named.`;
  return [...problems, ...twice, error({ pointer: `${pointer}/banks`, code: 'window-bank-count', message })];
}

function byteLanes({ document, index }: Checked, { window, pointer }: Placed): LayoutProblem[] {
  if (window.lanes === undefined) return [];
  const { checkBits } = document.memory;
  const places = window.lanes.flatMap((bits, step) =>
    bits.map((bit, n) => ({ bit, pointer: `${pointer}/lanes/${step}/${n}` })),
  );
  const carried = new Set(places.map(({ bit }) => bit));
  const missing = [...index.bankByName]
    .filter(([id]) => window.banks.includes(id))
    .flatMap(([, bank]) =>
      Array.from({ length: index.bitCount }, (_, bit) => bit).filter(
        (bit) => index.laneExists[bank * index.bitCount + bit] === 1 && !checkBits.includes(bit) && !carried.has(bit),
      ),
    );
  const left = [...new Set(missing)].sort((a, b) => a - b);
  return [
    ...places.flatMap(({ bit, pointer: at }) =>
      bit >= index.bitCount ? [bitOutOfRange(at, bit, index.bitCount)] : [],
    ),
    ...repeats(places.map(({ bit }) => bit)).map(({ at, item }) =>
      error({
        pointer: places[at]!.pointer,
        code: 'byte-lane-twice',
        message: `Bit ${item} is carried twice. Each bit of the word has one address.`,
      }),
    ),
    ...(left.length === 0
      ? []
      : [
          error({
            pointer: `${pointer}/lanes`,
            code: 'byte-lane-missing',
            message: `No address of the word carries ${left.length === 1 ? 'bit' : 'bits'} ${numbersWords(left)}. Add ${left.length === 1 ? 'it' : 'them'} to a byte lane.`,
          }),
        ]),
  ];
}

/** Whether the interleave tells its banks apart when only the bits that are closed up over change. */
function tellsApart(interleave: AddressWindow['interleave']): boolean {
  const first = interleave.map((bits) => bits[0]!);
  const seen = new Set<number>();
  for (let n = 0; n < 2 ** first.length; n++) {
    const address = first.reduce((sum, bit, at) => sum + ((n >> at) & 1) * 2 ** bit, 0);
    seen.add(interleave.reduce((sum, bits, at) => sum + parityOfBits(address, bits) * 2 ** at, 0));
  }
  return seen.size === 2 ** first.length;
}

function interleaving({ window, pointer }: Placed): LayoutProblem[] {
  const { interleave, range } = window;
  if (interleave.length === 0) return [];
  const at = `${pointer}/interleave`;
  const wrong = (message: string) => [error({ pointer: at, code: 'window-interleave', message })];
  const steps = window.lanes?.length ?? 1;
  const laneBits = Math.log2(steps);
  if (!Number.isInteger(laneBits)) return wrong(`With interleave a word takes 1, 2, 4 or 8 addresses, not ${steps}.`);
  const first = interleave.map((bits) => bits[0]!);
  const low = first.find((bit) => bit < laneBits);
  if (low !== undefined)
    return wrong(`Address bit ${low} chooses the byte of the word, so it cannot choose the bank as well.`);
  if (repeats(first).length > 0)
    return wrong(
      'Two interleave bits begin with the same address bit. Name first a bit that no other one begins with.',
    );
  if (!tellsApart(interleave))
    return wrong('The interleave bits do not tell the banks apart: two addresses would lead to the same word.');
  const block = 2 ** (Math.max(...first) + 1);
  if (range.from % block === 0) return [];
  return wrong(`The window begins in the middle of a round of the banks. Let it begin at a multiple of ${block}.`);
}

function size(checked: Checked, { window, pointer }: Placed): LayoutProblem[] {
  const { memory } = checked.document;
  const steps = window.lanes?.length ?? 1;
  const round = steps * 2 ** window.interleave.length;
  const span = window.range.to - window.range.from + 1;
  if (span % round !== 0) {
    const message = `${span} addresses are no whole number of ${round === steps ? 'words' : 'rounds of the banks'} of ${round} addresses. Check the end of the range.`;
    return [error({ pointer: `${pointer}/range`, code: 'window-size', message })];
  }
  const words = span / round;
  return window.banks.flatMap((id, n) => {
    const bank = memory.banks.find((candidate) => candidate.id === id);
    if (bank === undefined || window.firstWord + words <= bank.words) return [];
    const message = `The window shows words ${window.firstWord} to ${window.firstWord + words - 1}, but ${bankWords(id)} has ${bank.words}. Shorten the range, or check the byte lanes and the interleave.`;
    return [error({ pointer: `${pointer}/banks/${n}`, code: 'window-size', message })];
  });
}

/** How two windows get on: both there at once, perhaps at once, or never. */
function together(a: AddressWindow, b: AddressWindow): 'always' | 'perhaps' | 'never' {
  if (a.register === undefined || b.register === undefined) return 'always';
  if (a.register.name !== b.register.name) return 'perhaps';
  return a.register.value === b.register.value ? 'always' : 'never';
}

function overlaps({ document }: Checked, placed: readonly Placed[]): LayoutProblem[] {
  const { addressMap } = document;
  const problems: LayoutProblem[] = [];
  const sorted = [...placed].sort((a, b) => a.window.range.from - b.window.range.from);
  sorted.forEach((one, at) => {
    for (let next = at + 1; next < sorted.length && sorted[next]!.window.range.from <= one.window.range.to; next++) {
      const other = sorted[next]!;
      const state = together(one.window, other.window);
      if (state === 'never') continue;
      const to = Math.min(one.window.range.to, other.window.range.to);
      const span = `${addressWords(addressMap, other.window.range.from)} to ${addressWords(addressMap, to)}`;
      const names = listWords([one, other].map(({ window }) => bankWords(window.banks[0]!)));
      const finding = { pointer: `${other.pointer}/range`, code: 'window-overlap' };
      if (state === 'always')
        problems.push(
          error({
            ...finding,
            message: `Addresses ${span} lead to two windows, ${names}. Give one another range, or the register value under which it is there.`,
          }),
        );
      else
        problems.push(
          warning({
            ...finding,
            message: `Addresses ${span} lead to two windows, ${names}, under different registers. Can both be there at once?`,
          }),
        );
    }
  });
  return problems;
}

function elsewhere({ document }: Checked): LayoutProblem[] {
  const { addressMap } = document;
  return addressMap.elsewhere.flatMap(({ range, means }, at) => {
    const hit = addressMap.windows.find(
      (window) => window.register === undefined && window.range.from <= range.to && window.range.to >= range.from,
    );
    if (hit === undefined) return [];
    const message = `"${means}" is to be at addresses that already lead to ${bankWords(hit.banks[0]!)}.`;
    return [error({ pointer: `/addressMap/elsewhere/${at}/range`, code: 'window-overlap', message })];
  });
}

/** Words of banks that have windows but answer at no address. */
function unreached({ document }: Checked): LayoutProblem[] {
  const { windows } = document.addressMap;
  return document.memory.banks.flatMap((bank, at) => {
    const spans = windows
      .filter(({ banks }) => banks.includes(bank.id))
      .map((window) => {
        const words = Math.floor(
          (window.range.to - window.range.from + 1) / ((window.lanes?.length ?? 1) * 2 ** window.interleave.length),
        );
        return { from: window.firstWord, to: window.firstWord + words - 1 };
      })
      .sort((a, b) => a.from - b.from);
    if (windows.length === 0) return [];
    let reached = -1;
    let gap: [number, number] | null = null;
    for (const { from, to } of spans) {
      if (from > reached + 1) gap ??= [reached + 1, from - 1];
      reached = Math.max(reached, to);
    }
    if (reached < bank.words - 1) gap ??= [reached + 1, bank.words - 1];
    if (gap === null) return [];
    const message = `Words ${gap[0]} to ${gap[1]} of ${bankWords(bank.id)} answer at no address. Add a window, unless the CPU does not see them.`;
    return [warning({ pointer: `/memory/banks/${at}`, code: 'words-without-address', message })];
  });
}

/** Address windows that overlap, or do not match their banks in size, interleave or byte lanes. */
export function checkWindows(checked: Checked): LayoutProblem[] {
  const placed = checked.document.addressMap.windows.map((window, at) => ({
    window,
    pointer: `/addressMap/windows/${at}`,
  }));
  return [
    ...placed.flatMap((one) => [
      ...bankList(checked, one),
      ...byteLanes(checked, one),
      ...interleaving(one),
      ...size(checked, one),
    ]),
    ...overlaps(checked, placed),
    ...elsewhere(checked),
    ...unreached(checked),
  ];
}
