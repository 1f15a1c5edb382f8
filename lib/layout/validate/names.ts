import type { LayoutProblem } from '@/shared';
import { type Checked, type Finding, bitOutOfRange, error, repeats, warning } from './problem';

function labels({ document }: Checked): LayoutProblem[] {
  const all = [
    ...document.sockets.map((socket, at) => ({ label: socket.label, pointer: `/sockets/${at}/label` })),
    ...document.sharedParts.map((part, at) => ({ label: part.label, pointer: `/sharedParts/${at}/label` })),
  ];
  return repeats(all.map(({ label }) => label)).map(({ at, first, item }) =>
    error({
      pointer: all[at]!.pointer,
      code: 'label-twice',
      message: `The label ${item} is already used at ${all[first]!.pointer}. Every socket and shared part has a label of its own.`,
    }),
  );
}

function ids({ document }: Checked): LayoutProblem[] {
  const lists: [string, string, readonly string[]][] = [
    ['/memory/banks', 'bank', document.memory.banks.map(({ id }) => id)],
    ['/families', 'chip family', document.families.map(({ id }) => id)],
    ['/reportFormats', 'report format', document.reportFormats.map(({ id }) => id)],
  ];
  return lists.flatMap(([pointer, what, names]) =>
    repeats(names).map(({ at, item }) =>
      error({
        pointer: `${pointer}/${at}/id`,
        code: 'id-twice',
        message: `Another ${what} already has the id "${item}". Give this one another.`,
      }),
    ),
  );
}

function bitList(bits: readonly number[], pointer: string, bitCount: number): LayoutProblem[] {
  return [
    ...bits.flatMap((bit, at) => (bit >= bitCount ? [bitOutOfRange(`${pointer}/${at}`, bit, bitCount)] : [])),
    ...repeats(bits).map(({ at, item }) =>
      warning({ pointer: `${pointer}/${at}`, code: 'bit-twice', message: `Bit ${item} is listed twice.` }),
    ),
  ];
}

function bitNames({ document }: Checked): LayoutProblem[] {
  const { bitNames: names, dataBits } = document.memory;
  if (names === undefined) return [];
  const wrongCount: Finding = {
    pointer: '/memory/bitNames',
    code: 'bit-names-count',
    message: `There are ${names.length} names for ${dataBits} bits. Give each bit a name, from bit 0 up.`,
  };
  return [
    ...(names.length === dataBits ? [] : [error(wrongCount)]),
    ...repeats(names).map(({ at, item }) =>
      error({
        pointer: `/memory/bitNames/${at}`,
        code: 'bit-name-twice',
        message: `Two bits have the name "${item}".`,
      }),
    ),
  ];
}

/** Names used twice, and bits that the word does not have. */
export function checkNames(checked: Checked): LayoutProblem[] {
  const { memory } = checked.document;
  return [
    ...ids(checked),
    ...labels(checked),
    ...bitNames(checked),
    ...bitList(memory.checkBits, '/memory/checkBits', memory.dataBits),
    ...memory.banks.flatMap((bank, at) => bitList(bank.bits ?? [], `/memory/banks/${at}/bits`, memory.dataBits)),
  ];
}
