import type { Random } from '@/lib';
import { beliefsOf, handled, kept, leading, partOf, Reach, seen, sharesOf, type Belief, type Places } from './beliefs';
import type { DrawnCase } from './draw';

/** What can be done. Minutes with their risk: common practice, no source. */
type Action =
  | { readonly does: 'swap'; readonly sockets: readonly [string, string]; readonly minutes: number }
  | { readonly does: 'replace' | 'reseat' | 'measure'; readonly socket: string; readonly minutes: number }
  | { readonly does: 'pull'; readonly sockets: readonly string[]; readonly minutes: number }
  | { readonly does: 'probe'; readonly minutes: number };

const minutes = { swap: 8, replace: 8, reseat: 5, measure: 6.5, pull: 12, probe: 10 };
const found = 0.95;
/** A meter or scope shows a fault where it is (common practice, no source). */
const meterShows = 0.95;
/** What is still unknown after two steps, in minutes a bit: about what a swap gives. */
const minutesPerBit = 15;
const mostSockets = 3;

/** Searches all pairs of actions, one after the other, for the least expected minutes until one part is above 95 %. */
export class TwoStepSearch {
  beliefs: Belief[];
  minutes = 0;
  shown = false;
  private places: Places = new Map();
  private readonly reach: Reach;

  constructor(
    private readonly drawn: DrawnCase,
    private readonly random: Random,
  ) {
    this.reach = new Reach(drawn.board.wiring);
    this.beliefs = seen(beliefsOf(drawn.board), {
      reach: this.reach,
      places: this.places,
      lanes: drawn.board.wiring.lanes,
      failing: drawn.result.lanes,
    });
  }

  /** How sure it is of the part that has the fault: 1 once a measurement has shown it. */
  get share(): number {
    const { from } = this.drawn;
    const own = partOf({ fault: from, nth: 0, shows: 1, cured: false, weight: 1 });
    return this.shown ? 1 : (sharesOf(this.beliefs).get(own) ?? 0);
  }

  step(): void {
    const [best] = this.actions(this.beliefs, this.places)
      .map((action) => ({ action, cost: this.expected(action, this.beliefs, { places: this.places, depth: 2 }) }))
      .sort((a, b) => a.cost - b.cost);
    if (best) this.do(best.action);
  }

  /** Actions at the likeliest sockets, and a look at what is shared. */
  private actions(beliefs: readonly Belief[], places: Places): Action[] {
    const shares = new Map<string, number>();
    for (const { fault, weight } of beliefs) {
      if (fault.socket === null) continue;
      const now = fault.part === 'chip' ? places.get(fault.socket) : fault.socket;
      const at = now === undefined ? fault.socket : now;
      if (at !== null) shares.set(at, (shares.get(at) ?? 0) + weight);
    }
    const sockets = [...shares]
      .sort((a, b) => b[1] - a[1])
      .slice(0, mostSockets)
      .map(([socket]) => socket);
    const holders = [
      ...new Set(
        beliefs.flatMap(({ fault }) =>
          fault.kind === 'chip holds its data line' && fault.socket ? [fault.socket] : [],
        ),
      ),
    ];
    const at = (does: 'replace' | 'reseat' | 'measure') =>
      sockets.map((socket): Action => ({ does, socket, minutes: minutes[does] }));
    return [
      ...sockets.flatMap((socket) =>
        this.partners(socket).map((other): Action => ({
          does: 'swap',
          sockets: [socket, other],
          minutes: minutes.swap,
        })),
      ),
      ...at('replace'),
      ...at('reseat'),
      ...at('measure'),
      ...(holders.length > 1 ? [{ does: 'pull' as const, sockets: holders, minutes: minutes.pull }] : []),
      { does: 'probe', minutes: minutes.probe },
    ];
  }

  /** One chip of the same family for each way in which it differs: other bit, other bank, both. */
  private partners(socket: string): string[] {
    const { sockets } = this.drawn.board.wiring.document;
    const own = sockets.find(({ label }) => label === socket);
    const found = new Map<string, string>();
    for (const other of sockets) {
      if (other.label === socket || other.family !== own?.family) continue;
      const [a, b] = [own.holds[0], other.holds[0]];
      const key = `${a?.bank === b?.bank} ${a?.bit === b?.bit}`;
      if (!found.has(key)) found.set(key, other.label);
    }
    return [...found.values()];
  }

  /** Expected minutes of an action and of what follows it. */
  private expected(
    action: Action,
    beliefs: readonly Belief[],
    { places, depth }: { places: Places; depth: number },
  ): number {
    return (
      action.minutes +
      this.outcomes(action, beliefs, places).reduce(
        (sum, { share, after, where }) => sum + share * this.left(after, where, depth - 1),
        0,
      )
    );
  }

  private left(beliefs: readonly Belief[], places: Places, depth: number): number {
    if (leading(beliefs).share >= found) return 0;
    if (depth === 0) {
      const unknown = [...sharesOf(beliefs).values()].reduce((sum, p) => sum - p * Math.log2(p), 0);
      return unknown * minutesPerBit;
    }
    return Math.min(
      ...this.actions(beliefs, places).map((action) => this.expected(action, beliefs, { places, depth })),
    );
  }

  /** What an action can show, with the beliefs after it. A fault that shows is taken to show on all its lanes. */
  private outcomes(action: Action, beliefs: readonly Belief[], places: Places) {
    const where = moved(places, action);
    const groups = new Map<string, Belief[]>();
    const put = (key: string, belief: Belief, share: number) => {
      if (share > 0) groups.set(key, [...(groups.get(key) ?? []), { ...belief, weight: belief.weight * share }]);
    };
    for (const belief of handled(beliefs, handles(action))) {
      if (action.does === 'measure' || action.does === 'probe') {
        const shows = isLookedAt(belief, action) ? meterShows : 0;
        put(`shown ${partOf(belief)}`, belief, shows);
        put('nothing', belief, 1 - shows);
      } else if (action.does === 'pull') {
        put(belief.fault.kind === 'chip holds its data line' ? partOf(belief) : 'none', belief, 1);
      } else {
        const lanes = this.reach.lanes(belief, where);
        if (lanes.length === 1 || belief.shows < 0.9) {
          put(lanes.join(' '), belief, lanes.length === 0 ? 1 : belief.shows);
          put('', belief, lanes.length === 0 ? 0 : 1 - belief.shows);
        } else put(lanes.join(' '), belief, 1);
      }
    }
    const total = beliefs.reduce((sum, { weight }) => sum + weight, 0);
    return [...groups.values()].map((group) => ({
      share: group.reduce((sum, { weight }) => sum + weight, 0) / total,
      after: kept(group),
      where,
    }));
  }

  private do(action: Action): void {
    const { bench, from } = this.drawn;
    this.minutes += action.minutes;
    switch (action.does) {
      case 'measure':
      case 'probe': {
        const looked = isLookedAt({ fault: from, nth: 0, shows: 1, cured: false, weight: 1 }, action);
        if (looked && this.random() < meterShows) this.shown = true;
        this.beliefs = kept(
          this.beliefs.map((belief) => ({
            ...belief,
            weight: belief.weight * (isLookedAt(belief, action) ? 1 - meterShows : 1),
          })),
        );
        return;
      }
      case 'swap':
        bench.swap(...action.sockets);
        return this.rerun(action);
      case 'replace':
        bench.replace(action.socket);
        return this.rerun(action);
      case 'reseat':
        bench.reseat(action.socket);
        return this.rerun(action);
      case 'pull':
        for (const socket of action.sockets) {
          bench.replace(socket);
          this.rerun({ does: 'replace', socket, minutes: 0 });
          if (this.share >= found) return;
        }
    }
  }

  private rerun(action: Action): void {
    const { bench, board } = this.drawn;
    this.places = moved(this.places, action);
    this.beliefs = seen(handled(this.beliefs, handles(action)), {
      reach: this.reach,
      places: this.places,
      lanes: board.wiring.lanes,
      failing: bench.run().lanes,
    });
  }
}

function handles(action: Action): readonly string[] {
  if (action.does === 'swap') return action.sockets;
  return action.does === 'replace' || action.does === 'reseat' ? [action.socket] : [];
}

function isLookedAt({ fault, cured }: Belief, action: Action): boolean {
  if (action.does === 'measure') return fault.part === 'position' && fault.socket === action.socket && !cured;
  return fault.part === 'shared-part' || fault.part === 'short' || fault.part === 'wiring';
}

/** Where chips are after an action. */
function moved(places: Places, action: Action): Places {
  if (action.does !== 'swap' && action.does !== 'replace') return places;
  const after = new Map(places);
  const chipIn = (socket: string) =>
    [...places].find(([, at]) => at === socket)?.[0] ?? (places.has(socket) ? undefined : socket);
  if (action.does !== 'swap') {
    const chip = chipIn(action.socket);
    if (chip !== undefined) after.set(chip, null);
    return after;
  }
  const [one, other] = action.sockets;
  const [a, b] = [chipIn(one), chipIn(other)];
  if (a !== undefined) after.set(a, other);
  if (b !== undefined) after.set(b, one);
  return after;
}
