import type { LayoutProblem, SharedPart } from '@/shared';
import type { LayoutIndex } from '../layout-index';
import { numbersWords } from '../words';
import { type Checked, bitOutOfRange, error } from './problem';

function references({ document, index }: Checked, part: SharedPart, pointer: string): LayoutProblem[] {
  const { bits = [], banks = [], sockets = [], addressBits = [] } = part.serves;
  const most = Math.ceil(Math.log2(Math.max(...document.memory.banks.map(({ words }) => words))));
  return [
    ...bits.flatMap((bit, n) =>
      bit >= index.bitCount ? [bitOutOfRange(`${pointer}/bits/${n}`, bit, index.bitCount)] : [],
    ),
    ...banks.flatMap((bank, n) =>
      index.bankByName.has(bank)
        ? []
        : [error({ pointer: `${pointer}/banks/${n}`, code: 'unknown-bank', message: `There is no bank "${bank}".` })],
    ),
    ...sockets.flatMap((label, n) =>
      index.socketByLabel.has(label)
        ? []
        : [
            error({
              pointer: `${pointer}/sockets/${n}`,
              code: 'unknown-socket',
              message: `There is no socket ${label}.`,
            }),
          ],
    ),
    ...addressBits.flatMap((bit, n) =>
      bit < most
        ? []
        : [
            error({
              pointer: `${pointer}/addressBits/${n}`,
              code: 'address-bit-out-of-range',
              message: `The word number has the bits ${numbersWords(Array.from({ length: most }, (_, at) => at))}, so there is no bit ${bit}.`,
            }),
          ],
    ),
  ];
}

function servesAny(index: LayoutIndex, { serves }: SharedPart): boolean {
  if (serves.addressBits?.length === 0) return false;
  const banks =
    serves.banks === undefined ? null : new Set<number>(serves.banks.flatMap((id) => index.bankByName.get(id) ?? []));
  const bits = serves.bits === undefined ? null : new Set(serves.bits);
  const fits = (lane: number) =>
    (banks?.has(Math.floor(lane / index.bitCount)) ?? true) && (bits?.has(lane % index.bitCount) ?? true);
  if (serves.sockets === undefined) return index.lanes.some(fits);
  return serves.sockets.some((label) => {
    const at = index.socketByLabel.get(label);
    return (
      at !== undefined &&
      index.socketLanes.subarray(index.socketLaneStart[at], index.socketLaneStart[at + 1]).some(fits)
    );
  });
}

/** Shared parts that serve nothing, or something that does not exist. */
export function checkSharedParts(checked: Checked): LayoutProblem[] {
  return checked.document.sharedParts.flatMap((part, at) => {
    const pointer = `/sharedParts/${at}/serves`;
    const problems = references(checked, part, pointer);
    if (servesAny(checked.index, part)) return problems;
    const message = `${part.label} serves no lane: its bits, banks and sockets have none in common. Leave a list out where it means all.`;
    return [...problems, error({ pointer, code: 'part-serves-nothing', message })];
  });
}
