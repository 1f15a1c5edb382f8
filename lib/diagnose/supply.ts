import type { Sign, Suspect } from '@/shared';
import type { LayoutIndex } from '../layout/layout-index';
import { listWords } from '../layout/words';
import type { RunObservation } from './observe/observations';
import { railReading, type RailReading } from './rails';
import { labelOf, type Chip } from './timeline';
import type { Verdict } from './verdict';
import { fitOf } from './wrong-part';

/** A meter that shows a rail out of its limits is right this often (estimate; a probe slips, a lead is broken). */
const meterIsRight = 0.95;

/** "-5 V", with a true minus sign where it is negative. */
export function voltsWords(volts: number): string {
  const rounded = Math.abs(volts) >= 10 ? Math.round(volts * 10) / 10 : Math.round(volts * 100) / 100;
  return `${rounded < 0 ? '\u2212' : ''}${Math.abs(rounded)}\u00a0V`;
}

/**
 * Rails come first: a rail that was measured out of its limits, or many lanes that fail differently in each pass while
 * no rail was measured, stops the ranking of chips. Null where the supply is no question.
 */
export function supplyVerdict(
  index: LayoutIndex,
  known: { rails: readonly RailReading[]; signs: readonly Sign[]; runs: readonly RunObservation[] },
): Verdict | null {
  const bad = badRails(known.rails);
  if (bad.length > 0) {
    const names = [...new Set(bad.map((rail) => rail.name))];
    return {
      outcome: 'supply',
      headline: `Stop. Put the supply right first: ${listWords(names)}. No chip is named yet.`,
      sure: 'strong',
      probability: meterIsRight,
      groups: [],
      sockets: [],
    };
  }
  const changing = known.signs.some(({ sign }) => sign === 'changes-each-pass');
  const failing = Math.max(0, ...known.runs.map((run) => run.failing.size));
  if (!changing || known.rails.length > 0 || failing < Math.max(4, index.lanes.length / 2)) return null;
  return {
    outcome: 'supply',
    headline: 'Measure the supply first: many failures that change from pass to pass are a sign of it.',
    sure: 'not sure',
    probability: null,
    groups: [],
    sockets: [],
  };
}

/** The last measurement of each pin, where it is out of its limits. */
function badRails(rails: readonly RailReading[]): RailReading[] {
  const last = new Map(rails.map((rail) => [`${rail.socket} ${rail.pin}`, rail]));
  return [...last.values()].filter((rail) => !rail.good);
}

/** The rails that were measured out of their limits, as suspects. */
export function railSuspects(index: LayoutIndex, rails: readonly RailReading[]): Suspect[] {
  const byName = new Map<string, RailReading[]>();
  for (const rail of badRails(rails)) byName.set(rail.name, [...(byName.get(rail.name) ?? []), rail]);
  return [...byName].map(([name, readings], i): Suspect => {
    const part = readings.find((reading) => reading.sharedPart !== null)?.sharedPart ?? null;
    return {
      rank: i + 1,
      kind: 'rail',
      id: `rail:${name}`,
      label: `${name} supply`,
      socket: null,
      cameFrom: null,
      sharedPart: part,
      channel: null,
      probability: meterIsRight,
      modes: [{ mode: 'supply', intermittent: false, words: 'out of its limits', prior: 0, probability: meterIsRight }],
      lanes: [],
      reasons: readings.map(railSentence),
      explains: [],
      contradicts: [],
    };
  });
}

/** How often a chip that its socket destroyed drags the rail down that destroyed it (estimate). */
const loadsRail = 0.1;
/** On a board where nothing runs (common practice for the supply, an estimate for reset and clock). */
const deadBoard = { supply: 0.3, resetAndClock: 0.2 };

function besideChips(
  rank: number,
  of: { kind: Suspect['kind']; id: string; label: string; probability: number; words: string },
): Suspect {
  const { kind, id, label, probability, words } = of;
  return {
    rank,
    kind,
    id,
    label,
    socket: null,
    cameFrom: null,
    sharedPart: null,
    channel: null,
    probability,
    modes: [
      { mode: kind === 'rail' ? 'supply' : 'whole', intermittent: false, words, prior: probability, probability },
    ],
    lanes: [],
    reasons: [],
    explains: [],
    contradicts: [],
  };
}

/** What is looked at where nothing runs and nothing names a place. */
export function deadBoardSuspects(): Suspect[] {
  const words = 'looked at first where nothing runs';
  return [
    besideChips(1, { kind: 'rail', id: 'rail:supply', label: 'supply rails', probability: deadBoard.supply, words }),
    besideChips(2, {
      kind: 'shared-part',
      id: 'unlisted:reset',
      label: 'reset and clock',
      probability: deadBoard.resetAndClock,
      words,
    }),
  ];
}

/** The rails that chips which do not belong in their sockets may load, after the suspects that are there already. */
export function loadedRails(index: LayoutIndex, chips: readonly Chip[], before: number): Suspect[] {
  const names = new Map<string, string>();
  for (const chip of chips) {
    if (chip.family === null) continue;
    const fit = fitOf(index, chip);
    if (fit?.verdict !== 'destroyed') continue;
    for (const reason of fit.reasons) {
      if (reason.severity !== 'destroys' || reason.pin === null) continue;
      const rail = railReading(index, { socket: labelOf(index, chip.cameFrom), pin: reason.pin, volts: 0 });
      if (rail) names.set(rail.name, reason.words);
    }
  }
  return [...names].map(([name, words], i) => ({
    ...besideChips(before + i + 1, {
      kind: 'rail',
      id: `rail:${name}`,
      label: `${name} rail, loaded by the chip`,
      probability: loadsRail,
      words: 'loaded by a destroyed chip',
    }),
    reasons: [words],
  }));
}

/** "Pin 1 of U13 measures -0.4 V; it should lie between -5.5 V and -4.5 V." */
export function railSentence({ socket, pin, volts, limits }: RailReading): string {
  return `Pin ${pin} of ${socket} measures ${voltsWords(volts)}; it should lie between ${voltsWords(limits[0])} and ${voltsWords(limits[1])}.`;
}
