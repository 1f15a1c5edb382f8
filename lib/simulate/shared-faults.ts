import type { SharedPart } from '@/shared';
import { randomAddressPair } from './draw-inside';
import { ascending, type FaultFigures, type FaultKind, type PossibleFault } from './fault-kinds';
import type { BoardFault } from './faults';
import { channelsOf, reachOf, type SharedChannel } from './shared-reach';
import { faultShares, pick, pickLevel } from './shares';
import type { Wiring } from './wiring';

type Way = 'data' | 'strobe' | 'address' | 'write' | 'refresh' | 'changing';

/** What breaks when a part of each role fails (common practice, no source). */
const wayOf: Readonly<Record<SharedPart['role'], Way>> = {
  'data-buffer': 'data',
  'shift-register': 'data',
  connector: 'data',
  parity: 'data',
  multiplexer: 'address',
  'strobe-driver': 'strobe',
  decoder: 'strobe',
  'write-driver': 'write',
  'refresh-counter': 'refresh',
  supply: 'changing',
  other: 'changing',
};

const kindOf: Readonly<Record<Way, FaultKind>> = {
  data: 'whole data part',
  strobe: 'strobe or decoder',
  address: 'address line',
  write: 'other shared part',
  refresh: 'other shared part',
  changing: 'other shared part',
};

/** A shared part that the layout lists, as a whole and channel by channel. */
export function sharedPartFaults(wiring: Wiring, figures: FaultFigures, part: SharedPart): PossibleFault[] {
  const lanes = reachOf(wiring, part);
  const way = wayOf[part.role];
  const common = { part: 'shared-part' as const, socket: null, sharedPart: part.label };
  const whole: PossibleFault = {
    ...common,
    kind: kindOf[way],
    lanes,
    prior: figures.sharedWhole,
    draw: drawShared(wiring, { way, lanes, addressBits: part.serves.addressBits ?? [] }),
  };
  const channels = channelsOf(wiring, part).map((channel): PossibleFault => ({
    ...common,
    kind: way === 'data' ? 'channel of a buffer' : kindOf[way],
    lanes: channel.lanes,
    prior: figures.sharedChannel,
    draw:
      channel.addressBit === null
        ? drawShared(wiring, { way, lanes: channel.lanes, addressBits: [] })
        : drawAddress(wiring, channel),
  }));
  return [whole, ...channels];
}

type Draw = PossibleFault['draw'];

function drawShared(
  wiring: Wiring,
  { way, lanes, addressBits }: { way: Way; lanes: readonly number[]; addressBits: readonly number[] },
): Draw {
  return (random, intermittent): BoardFault => {
    const level = pickLevel(faultShares.floats, random);
    switch (way) {
      case 'data':
        return { kind: 'data', lanes, level, intermittent };
      case 'strobe':
        return { kind: 'strobe', lanes, floats: level, intermittent };
      case 'write':
      case 'refresh':
        return { kind: way, lanes, intermittent };
      case 'changing':
        return { kind: 'data', lanes, level: 'changing', intermittent };
      case 'address': {
        const bits = addressBits.length > 0 ? addressBits : randomAddressPair(wiring, 0, random);
        return { kind: 'address', lanes, addressBits: bits, level: random() < 0.5 ? 0 : 1, intermittent };
      }
    }
  };
}

function drawAddress(wiring: Wiring, { lanes, addressBit }: SharedChannel): Draw {
  return (random, intermittent): BoardFault => {
    const level = random() < 0.5 ? 0 : 1;
    const bit = addressBit as number;
    const { row = [], column = [] } = wiring.document.multiplexing ?? {};
    const nth = row.includes(bit) ? row.indexOf(bit) : column.indexOf(bit);
    const outputs = row.flatMap((one, at): [number, number][] =>
      column[at] === undefined ? [] : [[one, column[at] as number]],
    );
    const own = outputs[nth];
    const how = pick(faultShares.addressChannel, random);
    if (how === 'input' || own === undefined)
      return { kind: 'address', lanes, addressBits: [bit], level, intermittent };
    const other = outputs[nth + 1] ?? outputs[nth - 1];
    if (how === 'output' || other === undefined) {
      return { kind: 'address', lanes, addressBits: own, level, intermittent };
    }
    const pairs: [number, number][] = [
      [own[0], other[0]],
      [own[1], other[1]],
    ];
    return { kind: 'address-short', lanes, pairs, intermittent };
  };
}

/**
 * What a layout leaves out is there all the same: what selects each bank and what all banks share, unless a listed part
 * or channel reaches the very same lanes; and each data line, which beside a listed driver can still be shorted itself.
 */
export function unlistedFaults(
  wiring: Wiring,
  figures: FaultFigures,
  listed: readonly PossibleFault[],
): PossibleFault[] {
  const known = new Set(listed.map(({ lanes }) => lanes.join(' ')));
  const bankLanes = wiring.banks.map((_, bank) => wiring.lanes.filter((at) => Math.floor(at / wiring.bits) === bank));
  const common = { part: 'shared-part', socket: null, sharedPart: null } as const;
  const selects = [wiring.lanes, ...bankLanes].flatMap((lanes): PossibleFault[] => {
    if (lanes.length < 2 || known.has(lanes.join(' '))) return [];
    known.add(lanes.join(' '));
    const draw = drawShared(wiring, { way: 'strobe', lanes, addressBits: [] });
    return [{ ...common, kind: kindOf.strobe, lanes, prior: figures.sharedWhole, draw }];
  });
  const lines = [...wiring.lanesOfLine.values()].flatMap((lanes): PossibleFault[] => {
    if (lanes.length < 2) return [];
    const prior = known.has(lanes.join(' ')) ? figures.lineItself : figures.sharedChannel;
    const draw = drawShared(wiring, { way: 'data', lanes, addressBits: [] });
    return [{ ...common, kind: 'channel of a buffer', lanes, prior, draw }];
  });
  return [...selects, ...lines];
}

/** Data pins of the chip that carries a lane. */
function pinsBehind(wiring: Wiring, lane: number): number {
  const [port] = wiring.portsOfLane.get(lane) ?? [];
  const position = port === undefined ? undefined : wiring.ports[port]?.position;
  const ports = position === undefined ? [] : (wiring.portsOfPosition[position] ?? []);
  return Math.max(1, new Set(ports.map((each) => wiring.ports[each]?.pin)).size);
}

/** Wiring of one lane beyond its position: what goes wrong beside a chip is divided among its data pins. */
export function wiringFaults(wiring: Wiring, figures: FaultFigures): PossibleFault[] {
  return wiring.lanes.map((lane) => ({
    kind: 'wiring of one lane',
    part: 'wiring',
    socket: null,
    sharedPart: null,
    lanes: [lane],
    prior: figures.elsewhere / pinsBehind(wiring, lane),
    draw: drawShared(wiring, { way: 'data', lanes: [lane], addressBits: [] }),
  }));
}

/** Two neighbouring data lines joined. */
export function shortFaults(wiring: Wiring, figures: FaultFigures): PossibleFault[] {
  return [...wiring.lanesOfLine].flatMap(([line, lanes]): PossibleFault[] => {
    const next = (line + 1) % wiring.bits === 0 ? undefined : wiring.lanesOfLine.get(line + 1);
    if (next === undefined) return [];
    const pairs = lanes.flatMap((lane): [number, number][] => (next.includes(lane + 1) ? [[lane, lane + 1]] : []));
    return [
      {
        kind: 'lines shorted',
        part: 'short',
        socket: null,
        sharedPart: null,
        lanes: ascending([...lanes, ...next]),
        prior: figures.lineShort,
        draw: (_, intermittent) => ({ kind: 'short', pairs, intermittent }),
      },
    ];
  });
}
