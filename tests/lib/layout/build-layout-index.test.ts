import { buildLayout } from '@/tests/factories/layout';
import { buildLayoutIndex } from '@/lib/layout/build-layout-index';
import { bankIndex, bitIndex } from '@/lib/brand';

const socketsOf = (index: ReturnType<typeof buildLayoutIndex>, lane: number) =>
  Array.from(
    index.laneSockets.slice(index.laneSocketStart[lane], index.laneSocketStart[lane + 1]),
    (s) => index.document.sockets[s]!.label,
  );
const lanesOf = (index: ReturnType<typeof buildLayoutIndex>, label: string) => {
  const socket = index.socketByLabel.get(label)!;
  return Array.from(index.socketLanes.slice(index.socketLaneStart[socket], index.socketLaneStart[socket + 1]));
};

describe('the index of a layout', () => {
  it('leads from a lane to the one socket that holds it, and back', () => {
    const index = buildLayoutIndex(buildLayout({ banks: 2, bits: 8 }));
    const lane = index.laneOf(bankIndex(1), bitIndex(3));
    expect(socketsOf(index, lane)).toEqual(['U21']);
    expect(lanesOf(index, 'U21')).toEqual([lane]);
    expect([index.bankOf(lane), index.bitOf(lane)]).toEqual([1, 3]);
    expect(index.laneWords(lane)).toBe('bit 3 of bank B');
  });

  it('gives a four-bit chip its four lanes, each once', () => {
    const index = buildLayoutIndex(buildLayout({ banks: 2, bits: 8, chipWidth: 4 }));
    expect(lanesOf(index, 'U11')).toEqual([4, 5, 6, 7]);
    expect(lanesOf(index, 'U12')).toEqual([8, 9, 10, 11]);
  });

  it('gives a lane both chips of a bank that is two chips deep', () => {
    const index = buildLayoutIndex(buildLayout({ banks: 1, bits: 8, deep: 2 }));
    expect(socketsOf(index, 2)).toEqual(['U12', 'U20']);
  });

  it('names the only check bit as the parity bit', () => {
    const index = buildLayoutIndex(buildLayout({ banks: 2, bits: 8, parity: 1 }));
    expect(index.laneWords(index.laneOf(bankIndex(0), bitIndex(8)))).toBe('the parity bit of bank A');
    expect(index.isCheckBit[8]).toBe(1);
  });

  it('puts the same bit of banks on one line, unless the banks have lines of their own', () => {
    const one = buildLayoutIndex(buildLayout({ banks: 2, bits: 8 }));
    expect(one.lineOfLane[3]).toBe(one.lineOfLane[11]);
    expect(one.lineName(one.lineOfLane[3]!)).toBe('D3');
    const own = buildLayoutIndex(buildLayout({ banks: 2, bits: 8, ownLines: true }));
    expect(own.lineOfLane[3]).not.toBe(own.lineOfLane[11]);
    expect(own.lineName(own.lineOfLane[11]!)).toBe('lines B D3');
  });

  it('leaves out what refers to nothing, without throwing', () => {
    const document = buildLayout({ banks: 2, bits: 8 });
    document.sockets[0]!.holds = [
      { pin: 0, bank: 'nowhere', bit: 0, at: 0 },
      { pin: 0, bank: 'A', bit: 71, at: 0 },
    ];
    document.sockets[1]!.family = 'unheard-of';
    document.memory.banks[1]!.bits = [0, 1, 70];
    const index = buildLayoutIndex(document);
    expect(lanesOf(index, 'U10')).toEqual([]);
    expect(index.familyOfSocket[1]).toBeNull();
    expect(Array.from(index.lanes)).toEqual([0, 1, 2, 3, 4, 5, 6, 7, 8, 9]);
  });

  it('finds the family of every built-in chip', () => {
    const index = buildLayoutIndex(buildLayout({ chipWidth: 8 }));
    expect(index.familyOfSocket.every((family) => family?.width === 8)).toBe(true);
  });
});
