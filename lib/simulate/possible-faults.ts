import { drawChipFault, drawContactFault, randomAddressPair } from './draw-inside';
import { ascending, type FaultFigures, type FaultKind, type PossibleFault } from './fault-kinds';
import type { BoardFault } from './faults';
import type { Random } from './self-test';
import { sharedPartFaults, shortFaults, unlistedFaults, wiringFaults } from './shared-faults';
import { faultShares, pickLevel } from './shares';
import type { Wiring } from './wiring';

/** Every part in every mode that can fail on a board, with its prior. */
export function possibleFaults(wiring: Wiring, figures: FaultFigures): PossibleFault[] {
  const listed = wiring.document.sharedParts.flatMap((part) => sharedPartFaults(wiring, figures, part));
  return [
    ...wiring.labels.flatMap((label) => chipFaults(wiring, figures, { chip: `chip:${label}`, socket: label })),
    ...wiring.labels.flatMap((label, position) => positionFaults(wiring, figures, { label, position })),
    ...listed,
    ...unlistedFaults(wiring, figures, listed),
    ...shortFaults(wiring, figures),
    ...wiringFaults(wiring, figures),
  ].filter(({ lanes }) => lanes.length > 0);
}

function pinsOf(wiring: Wiring, position: number): Map<number, number[]> {
  const pins = new Map<number, number[]>();
  for (const at of wiring.portsOfPosition[position] ?? []) {
    const { pin, lane } = wiring.ports[at]!;
    pins.set(pin, [...(pins.get(pin) ?? []), lane]);
  }
  return pins;
}

/** What can fail in one chip that sits in a socket at first. */
export function chipFaults(
  wiring: Wiring,
  figures: FaultFigures,
  { chip, socket }: { chip: string; socket: string },
): PossibleFault[] {
  const position = wiring.positionOf.get(socket) ?? -1;
  const pins = pinsOf(wiring, position);
  const own = ascending([...pins.values()].flat());
  const several = pins.size > 1;
  const bank = (lane: number) => Math.floor(lane / wiring.bits);
  const banks = new Set(own.map(bank));
  const common = { part: 'chip' as const, socket, sharedPart: null };
  const share = several ? figures.oneDataPinShare : 0;
  const inside = { wiring, position, chip };
  const [onlyPin] = pins.keys();
  return [
    {
      ...common,
      kind: 'chip dead',
      lanes: own,
      prior: figures.chipDead * (1 - share),
      draw: (random, intermittent) => ({
        ...drawChipFault({ ...inside, random, pin: several ? null : (onlyPin ?? 0), whole: true }),
        intermittent,
      }),
    },
    ...[...pins].flatMap(([pin, lanes]): PossibleFault[] => [
      {
        ...common,
        kind: 'chip dead in one bit',
        lanes: ascending(lanes),
        prior: (figures.chipDead * share) / pins.size,
        draw: (random, intermittent) => ({ ...drawChipFault({ ...inside, random, pin, whole: false }), intermittent }),
      },
      {
        ...common,
        kind: 'chip holds its data line',
        lanes: ascending(lanes.flatMap((lane) => wiring.lanesOfLine.get(wiring.lineOfLane.get(lane) ?? -1) ?? [])),
        prior: figures.chipHoldsLine / pins.size,
        draw: (random, intermittent) => ({
          kind: 'holds-line',
          chip,
          pin,
          level: pickLevel(faultShares.heldLevel, random),
          intermittent,
        }),
      },
    ]),
    {
      ...common,
      kind: 'chip holds its strobe',
      lanes: wiring.lanes.filter((lane) => banks.has(bank(lane))),
      prior: figures.chipHoldsStrobe,
      draw: (random, intermittent) => ({
        kind: 'holds-strobe',
        chip,
        floats: pickLevel(faultShares.floats, random),
        intermittent,
      }),
    },
    {
      ...common,
      kind: 'chip holds an address line',
      lanes: wiring.lanes,
      prior: figures.chipHoldsAddress,
      draw: (random, intermittent) => ({
        kind: 'holds-address',
        chip,
        addressBits: randomAddressPair(wiring, position, random),
        level: random() < 0.5 ? 0 : 1,
        intermittent,
      }),
    },
  ];
}

function positionFaults(
  wiring: Wiring,
  figures: FaultFigures,
  { label, position }: { label: string; position: number },
): PossibleFault[] {
  const pins = pinsOf(wiring, position);
  const share = pins.size > 1 ? figures.oneDataPinShare : 0;
  const common = { part: 'position' as const, socket: label, sharedPart: null };
  const at = { wiring, position, socket: label };
  return [
    {
      ...common,
      kind: 'position open',
      lanes: ascending([...pins.values()].flat()),
      prior: figures.positionOpen * (1 - share),
      draw: (random, intermittent) => ({ ...drawContactFault({ ...at, random, pin: null }), intermittent }),
    },
    ...(share === 0 ? [] : [...pins]).map(([pin, lanes]): PossibleFault => ({
      ...common,
      kind: 'position open in one bit',
      lanes: ascending(lanes),
      prior: (figures.positionOpen * share) / pins.size,
      draw: (random, intermittent) => ({ ...drawContactFault({ ...at, random, pin }), intermittent }),
    })),
  ];
}

/** One fault drawn by the priors, or null where the list is empty. */
export function drawFault(
  possible: readonly PossibleFault[],
  figures: FaultFigures,
  random: Random,
): { from: PossibleFault; fault: BoardFault } | null {
  const total = possible.reduce((sum, { prior }) => sum + prior, 0);
  let left = random() * total;
  const from = possible.find(({ prior }) => (left -= prior) < 0) ?? possible[possible.length - 1];
  return from === undefined ? null : { from, fault: from.draw(random, random() < figures.intermittentShare) };
}

/** Each possible fault drawn by itself, so that none, one or several are there. */
export function drawEach(
  possible: readonly PossibleFault[],
  figures: FaultFigures,
  random: Random,
): { from: PossibleFault; fault: BoardFault }[] {
  return possible.flatMap((from) =>
    random() < from.prior ? [{ from, fault: from.draw(random, random() < figures.intermittentShare) }] : [],
  );
}

/** One of a kind, each with the chance of its prior; null where the board has none of it. */
export function drawOfKind(
  possible: readonly PossibleFault[],
  kind: FaultKind,
  options: { figures: FaultFigures; random: Random },
): { from: PossibleFault; fault: BoardFault } | null {
  return drawFault(
    possible.filter((each) => each.kind === kind),
    options.figures,
    options.random,
  );
}
