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

/** Prepares the meaning of silence of one format. Lists are judged as a whole by whoever has the whole list. */
export function buildSilence(format: ReportFormat, index: LayoutIndex): Silence {
  const groups = format.after === 'stops' ? testSequence(format, index) : [];
  if (groups.length === 0) return { passed: ({ shown }) => shown };
  const order = new TestOrder(groups, format.testOrder?.bits === 'together', index.laneCount);
  return { passed: (reading) => order.passed(reading) };
}

/** Lanes by the group in which they are tested. */
class TestOrder {
  private readonly groupOf: Int32Array;
  /** Lanes of all groups before each one; worked out when first asked for. */
  private readonly before: (readonly Lane[])[] = [[]];

  constructor(
    private readonly groups: readonly (readonly Lane[])[],
    private readonly together: boolean,
    laneCount: number,
  ) {
    this.groupOf = new Int32Array(laneCount).fill(groups.length);
    groups.forEach((group, at) => {
      for (const member of group) this.groupOf[member] = at;
    });
  }

  private lanesBefore(at: number): readonly Lane[] {
    for (let next = this.before.length; next <= at; next++) {
      this.before[next] = [...this.before[next - 1]!, ...this.groups[next - 1]!];
    }
    return this.before[at]!;
  }

  passed({ failing, shown, showsWord }: RawReading): readonly Lane[] {
    let first = this.groups.length;
    for (const { lane: bad } of failing) first = Math.min(first, this.groupOf[bad]!);
    if (first === this.groups.length) return shown;
    const earlier = this.lanesBefore(first);
    const beside = showsWord ? shown : this.together ? this.groups[first]! : [];
    const also = beside.filter(
      (member) => this.groupOf[member]! >= first && !failing.some(({ lane: bad }) => bad === member),
    );
    return also.length === 0 ? earlier : [...earlier, ...also];
  }
}
