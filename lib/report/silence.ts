import type { ReportFormat } from '@/shared';
import { type Lane, lane } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import type { RawReading } from './outcome';

/**
 * The lanes in the order in which the machine tests them, those tested as one together in a group. Empty where the
 * layout does not say the order, or speaks only of banks that do not exist. Banks that the order leaves out are not
 * tested.
 */
export function testSequence(format: Pick<ReportFormat, 'testOrder'>, index: LayoutIndex): Lane[][] {
  const { testOrder } = format;
  if (testOrder === undefined) return [];
  const named = testOrder.banks ?? index.document.memory.banks.map((bank) => bank.id);
  const banks = [...new Set(named)].flatMap((id) => index.bankByName.get(id) ?? []);
  const ascending = Array.from({ length: index.bitCount }, (_, bit) => bit);
  const bits = testOrder.bits === 'descending' ? ascending.reverse() : ascending;
  const lanesOf = (bank: number, of: readonly number[]) =>
    of
      .map((bit) => bank * index.bitCount + bit)
      .filter((at) => index.laneExists[at] === 1)
      .map(lane);
  const groups =
    testOrder.bits === 'together'
      ? banks.map((bank) => lanesOf(bank, bits))
      : testOrder.outer === 'bank'
        ? banks.flatMap((bank) => bits.map((bit) => lanesOf(bank, [bit])))
        : bits.flatMap((bit) => banks.map((bank) => lanesOf(bank, [bit])));
  return groups.filter((group) => group.length > 0);
}

/** What the silence of a machine that stops at the first failure means. */
export interface Silence {
  /** The lanes that a reading shows to have passed. */
  readonly passed: (reading: RawReading) => readonly Lane[];
}

function earliestGroup(reading: RawReading, groupOf: ReadonlyMap<Lane, number>): number {
  return Math.min(...reading.failing.map(({ lane: bad }) => groupOf.get(bad) ?? Infinity));
}

/** Prepares the meaning of silence of one format. Lists are judged as a whole by whoever has the whole list. */
export function buildSilence(format: ReportFormat, index: LayoutIndex): Silence {
  const groups = format.after === 'stops' ? testSequence(format, index) : [];
  if (groups.length === 0) return { passed: ({ shown }) => shown };
  const together = format.testOrder?.bits === 'together';
  const groupOf = new Map(groups.flatMap((group, at) => group.map((member) => [member, at] as const)));
  const before: Lane[][] = [[]];
  const lanesBefore = (at: number) => {
    for (let next = before.length; next <= at; next++) before[next] = [...before[next - 1]!, ...groups[next - 1]!];
    return before[at]!;
  };
  const passed = (reading: RawReading): readonly Lane[] => {
    const first = earliestGroup(reading, groupOf);
    if (first === Infinity) return reading.shown;
    const bad = new Set(reading.failing.map((failing) => failing.lane));
    const beside = reading.showsWord
      ? reading.shown
      : together
        ? groups[first]!.filter((member) => !bad.has(member))
        : [];
    const earlier = lanesBefore(first);
    return beside.length === 0
      ? earlier
      : [...earlier, ...beside.filter((member) => (groupOf.get(member) ?? Infinity) >= first)];
  };
  return { passed };
}
