import type { SocketIndex } from '../../brand';
import { labelOf } from '../timeline';
import { foundOf, weighSeen, type Candidate } from './candidate';
import { minutes } from './costs';
import { effort, type Desk } from './desk';
import { shows, type Row } from './likelihoods';
import { partnersFor } from './partners';
import { continuityWords } from './pin-words';
import { rerun } from './rerun';
import type { Place, State } from './states';

/** What can be done at one place: its chip moved, replaced, reseated, topped, touched; its legs measured. */
export function placeChecks(desk: Desk, place: Place): Candidate[] {
  const swap = swapCheck(desk, place.socket);
  const stack = stackCheck(desk, place.socket);
  return [
    ...(swap ? [swap] : []),
    replaceCheck(desk, place.socket),
    reseatCheck(desk, place.socket),
    ...(stack ? [stack] : []),
    measureCheck(desk, place.socket),
    feelCheck(desk, place.socket),
    pinCheck(desk, place.socket),
  ];
}

/** A swap with the neighbour, or with a chip of another bank where that tells more; null where no chip is fit for it. */
function swapCheck(desk: Desk, socket: SocketIndex): Candidate | null {
  const { beside, across } = partnersFor(desk.beliefs, socket);
  const made = [beside, across].flatMap((partner) => (partner === null ? [] : [swapWith(desk, socket, partner)]));
  const [first, second] = made;
  if (!first) return null;
  return second && second.bits / second.minutes > (1.02 * first.bits) / first.minutes ? second : first;
}

/** Two chips change places. */
export function swapWith(desk: Desk, socket: SocketIndex, partner: SocketIndex): Candidate {
  const { index } = desk;
  const sockets = [labelOf(index, socket), labelOf(index, partner)];
  return rerun(
    desk,
    {
      action: 'swap',
      label: `Power off, swap ${sockets[0]} with ${sockets[1]}, run again.`,
      sockets,
      minutes: minutes.swap * effort(index, [socket, partner]),
    },
    {
      moves: new Map([
        [socket, partner],
        [partner, socket],
      ]),
      handled: [socket, partner],
    },
  );
}

/** A known good chip in place of the one there. */
export function replaceCheck(desk: Desk, socket: SocketIndex, words?: string): Candidate {
  const label = labelOf(desk.index, socket);
  return rerun(
    desk,
    {
      action: 'replace',
      label: words ?? `Power off, fit a known good chip in ${label}, run again.`,
      sockets: [label],
      minutes: minutes.replace * effort(desk.index, [socket]),
    },
    { moves: new Map([[socket, null]]), handled: [socket] },
  );
}

/** Out, cleaned, in again. */
function reseatCheck(desk: Desk, socket: SocketIndex): Candidate {
  const label = labelOf(desk.index, socket);
  const soldered = effort(desk.index, [socket]) > 1;
  return rerun(
    desk,
    {
      action: 'reseat',
      label: soldered
        ? `Power off, go over the solder joints of ${label}, run again.`
        : `Power off, take out ${label}, clean its legs and contacts, put it back, run again.`,
      sockets: [label],
      minutes: minutes.reseat,
    },
    { moves: new Map(), handled: [socket] },
  );
}

/** Likelihoods of a check at one place: by what is at fault where it is at this place, small elsewhere. */
function here(socket: SocketIndex, row: Row, elsewhere: number): (state: State | null) => number {
  return (state) => {
    if (!state) return row.other;
    if (state.part.socket === socket) return row[state.sort];
    return state.part.socket === null ? row[state.sort] : elsewhere;
  };
}

const not = (given: (state: State | null) => number) => (state: State | null) => 1 - given(state);

/** A good chip on top, where the family allows it and the chip there holds no line. */
function stackCheck(desk: Desk, socket: SocketIndex): Candidate | null {
  const { beliefs, index } = desk;
  if (!index.familyOfSocket[socket]?.stackable) return null;
  const own = beliefs.states.filter(({ part }) => part.kind === 'chip' && part.socket === socket);
  if (own[0]?.sort === 'holder') return null;
  const label = labelOf(index, socket);
  const better = here(socket, shows.better, 0.02);
  const found = foundOf('stack', own[0]?.part.id ?? `chip:${label}`);
  return weighSeen(
    beliefs,
    {
      action: 'stack',
      label: `Power off, lay a good chip on top of ${label}, leg on leg, run again.`,
      sockets: [label],
      minutes: minutes.stack,
    },
    [
      { sees: 'better', means: `the chip in ${label} is bad`, given: better, finding: found.bad },
      {
        sees: 'no change',
        means: 'clears nothing: a bad output may still win',
        given: not(better),
        finding: found.good,
      },
    ],
  );
}

/** Continuity to the legs of a place. */
export function measureCheck(desk: Desk, socket: SocketIndex): Candidate {
  const { beliefs, index } = desk;
  const label = labelOf(index, socket);
  const open = here(socket, shows.openLeg, 0.02);
  const found = foundOf('legs', `position:${label}`);
  return weighSeen(
    beliefs,
    { action: 'measure', label: () => continuityWords(beliefs, socket), sockets: [label], minutes: minutes.measure },
    [
      {
        sees: 'open at a leg',
        means: `the contact, its solder or the trace at ${label}`,
        given: open,
        finding: found.bad,
      },
      {
        sees: 'all joined',
        means: 'look further: the chip, the line, what drives it',
        given: not(open),
        finding: found.good,
      },
    ],
  );
}

function feelCheck(desk: Desk, socket: SocketIndex): Candidate {
  const { beliefs, index } = desk;
  const label = labelOf(index, socket);
  const hot = here(socket, shows.hot, 0.01);
  return weighSeen(
    beliefs,
    {
      action: 'feel',
      label: `Feel whether ${label} is much hotter than its neighbours.`,
      sockets: [label],
      minutes: minutes.feel,
    },
    [
      { sees: 'much hotter', means: `the chip in ${label} is bad`, given: hot },
      { sees: 'like the others', means: 'says little: most bad chips stay cool', given: not(hot) },
    ],
  );
}

function pinCheck(desk: Desk, socket: SocketIndex): Candidate {
  const { beliefs, index } = desk;
  const label = labelOf(index, socket);
  const bad = here(socket, shows.badPin, shows.badPin.other);
  const chip = beliefs.states.find(({ part }) => part.kind === 'chip' && part.socket === socket);
  const found = foundOf('pin', chip?.part.id ?? `chip:${label}`);
  return weighSeen(
    beliefs,
    {
      action: 'probe',
      label: `Scope the data pin of ${label} against that of a good chip.`,
      sockets: [label],
      minutes: minutes.probe,
    },
    [
      {
        sees: 'no clean levels',
        means: `the chip in ${label}, or what drags its line`,
        given: bad,
        finding: found.bad,
      },
      { sees: 'like a good one', means: 'look at contacts and shared parts', given: not(bad), finding: found.good },
    ],
  );
}
