import type { Sign, Suspect } from '@/shared';
import type { LayoutIndex } from '../layout/layout-index';
import { listWords } from '../layout/words';
import type { RunObservation } from './observe/observations';
import type { RailReading } from './rails';
import type { Verdict } from './verdict';

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

/** "Pin 1 of U13 measures -0.4 V; it should lie between -5.5 V and -4.5 V." */
export function railSentence({ socket, pin, volts, limits }: RailReading): string {
  return `Pin ${pin} of ${socket} measures ${voltsWords(volts)}; it should lie between ${voltsWords(limits[0])} and ${voltsWords(limits[1])}.`;
}
