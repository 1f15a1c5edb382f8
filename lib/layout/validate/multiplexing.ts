import type { LayoutProblem } from '@/shared';
import { numbersWords } from '../words';
import { type Checked, error, repeats, warning } from './problem';

/** Row and column bits that do not match the size of the chips. */
export function checkMultiplexing({ document, index }: Checked): LayoutProblem[] {
  const { multiplexing } = document;
  if (multiplexing === undefined) return [];
  const dynamic = index.familyOfSocket.filter((family) => family?.kind === 'dynamic');
  const pointer = '/multiplexing';
  if (dynamic.length === 0) {
    const known = index.familyOfSocket.some((family) => family !== null);
    return known
      ? [
          warning({
            pointer,
            code: 'multiplexing-static',
            message: 'No chip of this board has a row and a column: they are static.',
          }),
        ]
      : [];
  }
  const needed = Math.ceil(Math.log2(Math.max(...dynamic.map((family) => family!.words))));
  const bits = [...multiplexing.row, ...multiplexing.column];
  const placeOf = (at: number) =>
    at < multiplexing.row.length ? `${pointer}/row/${at}` : `${pointer}/column/${at - multiplexing.row.length}`;
  const problems = repeats(bits).map(({ at, first, item }) =>
    error({
      pointer: placeOf(at),
      code: 'multiplexing-twice',
      message: `Bit ${item} already reaches the chip at ${placeOf(first)}.`,
    }),
  );
  bits.forEach((bit, at) => {
    if (bit < needed) return;
    problems.push(
      error({
        pointer: placeOf(at),
        code: 'multiplexing-size',
        message: `The chips have ${needed} address bits, 0 to ${needed - 1}, so there is no bit ${bit}.`,
      }),
    );
  });
  const missing = Array.from({ length: needed }, (_, bit) => bit).filter((bit) => !bits.includes(bit));
  if (missing.length > 0) {
    const message = `${missing.length === 1 ? 'Bit' : 'Bits'} ${numbersWords(missing)} of the word number ${missing.length === 1 ? 'reaches' : 'reach'} neither the row nor the column.`;
    problems.push(error({ pointer, code: 'multiplexing-size', message }));
  }
  return problems;
}
