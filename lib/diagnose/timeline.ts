import type { Change } from '@/shared';
import type { LayoutIndex } from '../layout/layout-index';
import type { SocketIndex } from '../brand';

/** A chip as an individual: it keeps its identity when it is moved. */
export interface Chip {
  /** chip:U25 for the chip first found in U25; chip:U25#2 for the next one fitted there. */
  readonly id: string;
  /** The socket where it was first seen. */
  readonly cameFrom: SocketIndex;
  /** The run before which it was fitted; 0 for those found on the board. */
  readonly since: number;
  readonly quality: 'found' | 'known-good' | 'untested';
  /** The family that was fitted, where it was said to be another than the socket's. */
  readonly family: string | null;
  /** The socket that holds it in each run, null while it is not on the board. */
  readonly socketInRun: readonly (SocketIndex | null)[];
}

export interface Timeline {
  readonly runCount: number;
  readonly chips: readonly Chip[];
  /** For each socket the runs before which it was handled, ascending, each once. */
  readonly handled: ReadonlyMap<SocketIndex, readonly number[]>;
  /** Changes that could not be followed, in words. */
  readonly problems: readonly { readonly run: number; readonly reason: string }[];
}

/**
 * Follows every chip through swaps and replacements. Changes that name a socket that the board does not
 * have are reported in `problems` and left out.
 */
export function followChips(index: LayoutIndex, changesPerRun: readonly (readonly Change[])[]): Timeline {
  const socketCount = index.document.sockets.length;
  const runCount = changesPerRun.length;
  const problems: { run: number; reason: string }[] = [];
  const handled = new Map<SocketIndex, number[]>();
  const chips: { chip: Omit<Chip, 'socketInRun'>; places: (SocketIndex | null)[] }[] = [];
  const fittedIn = new Map<SocketIndex, number>();
  /** Chip number that each socket holds at the moment. */
  const holds: number[] = [];
  for (let s = 0; s < socketCount; s++) {
    const at = s as SocketIndex;
    chips.push({
      chip: { id: `chip:${labelOf(index, at)}`, cameFrom: at, since: 0, quality: 'found', family: null },
      places: [],
    });
    holds.push(s);
  }

  const find = (run: number, label: string): SocketIndex | null => {
    const socket = index.socketByLabel.get(label);
    if (socket === undefined) {
      problems.push({ run, reason: `This board has no socket ${label}.` });
      return null;
    }
    return socket;
  };
  const handle = (socket: SocketIndex, run: number) => {
    const before = handled.get(socket) ?? [];
    if (before.at(-1) !== run) handled.set(socket, [...before, run]);
  };

  const apply = (change: Change, run: number): void => {
    switch (change.kind) {
      case 'swap': {
        const a = find(run, change.sockets[0]);
        const b = find(run, change.sockets[1]);
        if (a === null || b === null) return;
        if (a === b) {
          problems.push({ run, reason: `A swap needs two different sockets, and both are ${change.sockets[0]}.` });
          return;
        }
        const kept = holds[a] as number;
        holds[a] = holds[b] as number;
        holds[b] = kept;
        handle(a, run);
        handle(b, run);
        return;
      }
      case 'replace': {
        const socket = find(run, change.socket);
        if (socket === null) return;
        const nth = (fittedIn.get(socket) ?? 1) + 1;
        fittedIn.set(socket, nth);
        chips.push({
          chip: {
            id: `chip:${change.socket}#${nth}`,
            cameFrom: socket,
            since: run,
            quality: change.with,
            family: change.family ?? null,
          },
          places: new Array<SocketIndex | null>(run).fill(null),
        });
        holds[socket] = chips.length - 1;
        handle(socket, run);
        return;
      }
      case 'reseat': {
        const socket = find(run, change.socket);
        if (socket !== null) handle(socket, run);
      }
    }
  };

  for (let run = 0; run < runCount; run++) {
    for (const change of changesPerRun[run] ?? []) apply(change, run);
    for (const { places } of chips) places.push(null);
    for (let s = 0; s < socketCount; s++) {
      const held = chips[holds[s] as number];
      if (held) held.places[run] = s as SocketIndex;
    }
  }
  return { runCount, chips: chips.map(({ chip, places }) => ({ ...chip, socketInRun: places })), handled, problems };
}

/** The label of a socket as printed on the board. */
export function labelOf(index: LayoutIndex, socket: SocketIndex): string {
  return index.document.sockets[socket]?.label ?? `#${socket}`;
}
