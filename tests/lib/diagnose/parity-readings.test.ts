import { buildLayoutIndex, diagnose } from '@/lib';
import { runs as runsSchema } from '@/shared';
import { buildLayout } from '../../factories/layout';

const index = buildLayoutIndex(buildLayout({ banks: 2, bits: 8, parity: 1, formats: ['code'] }));
const from = index.document.addressMap.windows[0]?.range.from ?? 0;
const failingOf = (written: number, read: number) =>
  diagnose(
    index,
    runsSchema.parse([{ evidence: [{ kind: 'readings', lines: [{ address: from, written, read }] }] }]),
  ).evidence[0]?.failing.map(({ bit }) => bit);

describe('a reading of a word with a parity bit', () => {
  it('shows the parity bit where the value has a place for it', () => {
    expect(failingOf(0x1ff, 0x0ff)).toEqual([8]);
  });

  it('shows the data bits alone where it has not', () => {
    expect(failingOf(0x00, 0x81)).toEqual([0, 7]);
  });
});
