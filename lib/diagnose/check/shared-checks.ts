import type { SocketIndex } from '../../brand';
import type { LayoutIndex } from '../../layout/layout-index';
import { listWords } from '../../layout/words';
import type { Part } from '../cause-types';
import { labelOf } from '../timeline';
import { asNextCheck, foundOf, weighSeen, type Candidate } from './candidate';
import { minutes, solderedFactor } from './costs';
import { effort, type Desk } from './desk';
import { largerFirst } from './information';
import { shows } from './likelihoods';
import { railsWords } from './pin-words';
import { placesOf, type State } from './states';

/** Checks of what several lanes share. */
export function sharedChecks(desk: Desk): Candidate[] {
  return [...partProbes(desk), ...shortChecks(desk), ...pullChecks(desk), ...readBack(desk), ...rails(desk)];
}

const mostProbes = 4;

/** Where the supply could be what fails, and was not measured. */
function rails(desk: Desk): Candidate[] {
  const check = railsCheck(desk);
  const likely = asNextCheck(desk.beliefs, check).outcomes[0]?.probability ?? 0;
  return desk.weighed.rails.length > 0 || likely < 0.03 ? [] : [check];
}

/** Each shared part that may be at fault, its outputs with a scope. */
function partProbes(desk: Desk): Candidate[] {
  const { beliefs } = desk;
  const parts = beliefs.answers
    .filter(({ part, share }) => part?.kind === 'shared-part' && share >= 0.02)
    .sort((a, b) => largerFirst(a.share, b.share))
    .slice(0, mostProbes);
  return parts.map(({ part }) => {
    const leading = beliefs.states.find((state) => state.part === part);
    const label = part?.label ?? '';
    const channel =
      leading?.cause.mode === 'channel' && leading.cause.where ? `, first its channel for ${leading.cause.where}` : '';
    const bad = (state: State | null) => {
      if (!state) return shows.draggedPart.other;
      return (state.part === part ? shows.badPart : shows.draggedPart)[state.sort];
    };
    const found = foundOf('output', part?.id ?? '');
    return weighSeen(
      beliefs,
      { action: 'probe', label: `Scope the outputs of ${label}${channel}.`, sockets: [], minutes: minutes.probe },
      [
        {
          sees: 'signal missing or wrong',
          means: `look at ${label}, and at what drags its outputs`,
          given: bad,
          finding: found.bad,
        },
        {
          sees: 'signal right',
          means: 'it is good: look at what it serves',
          given: (state) => 1 - bad(state),
          finding: found.good,
        },
      ],
    );
  });
}

/** Two lines that may be joined: written apart, and measured against each other. */
function shortChecks(desk: Desk): Candidate[] {
  const { beliefs, index } = desk;
  const leading = beliefs.states.find(({ sort }) => sort === 'short');
  if (!leading || (beliefs.answers[leading.answer]?.share ?? 0) < 0.02) return [];
  const lines = [...new Set(leading.reach.map((lane) => index.lineOfLane[lane] as number))];
  const bits = [...new Set(leading.reach.map((lane): number => index.bitOf(lane)))].sort((a, b) => a - b);
  const names = lines.map((line) => index.lineName(line));
  const own = (given: (state: State) => number, other: number) => (state: State | null) =>
    state ? given(state) : other;
  const joined = own(
    (state) =>
      state.part === leading.part ? shows.joined.short : shows.joined[state.sort === 'short' ? 'other' : state.sort],
    shows.joined.other,
  );
  const found = foundOf('joined', leading.part.id);
  const measured = weighSeen(
    beliefs,
    {
      action: 'measure',
      label: `Power off, measure from line ${names[0]} to line ${names[1] ?? '?'} with an ohmmeter. Then look for a solder bridge, and measure again with what drives the lines taken out.`,
      sockets: [],
      minutes: minutes.lineToLine,
    },
    [
      {
        sees: 'joined',
        means: `a short between ${listWords(names)}: solder bridge, trace, or inside what drives them`,
        given: joined,
        finding: found.bad,
      },
      {
        sees: 'apart',
        means: 'not the lines: look at the chips',
        given: (state) => 1 - joined(state),
        finding: found.good,
      },
    ],
  );
  if (bits.length !== 2 || writtenApart(desk, bits)) return [measured];
  const together = own((state) => shows.together[state.sort], shows.together.other);
  const values = bits.map((bit) => valueWords(desk, bit));
  const written = weighSeen(
    beliefs,
    {
      action: 'pattern',
      label: `Write ${listWords(values)} alone and read each back.`,
      sockets: [],
      minutes: minutes.pattern,
    },
    [
      {
        sees: `bits ${listWords(bits.map(String))} always read alike`,
        means: `the lines ${listWords(names)} are joined`,
        given: together,
      },
      {
        sees: 'each bit fails by itself',
        means: 'no short: two chips, or the line of one',
        given: (state) => 1 - together(state),
      },
    ],
  );
  return [written, measured];
}

/** Some reading already shows the two bits written differently. */
function writtenApart({ beliefs }: Desk, bits: readonly number[]): boolean {
  const differ = (value: number) => new Set(bits.map((bit) => Math.floor(value / 2 ** bit) % 2)).size > 1;
  return beliefs.findings.runs.some((run) => run.values.some(({ written }) => differ(written)));
}

/** A value with just this bit, as the board writes numbers. */
function valueWords({ index }: Desk, bit: number): string {
  const radix = { hexadecimal: 16, octal: 8, decimal: 10 }[index.document.addressMap.notation];
  const width = radix === 10 ? 1 : ((1n << BigInt(index.bitCount)) - 1n).toString(radix).length;
  return (1n << BigInt(bit)).toString(radix).toUpperCase().padStart(width, '0');
}

/** More chips than this are not pulled in turn. */
const mostPulled = 9;

/** Chips that may hold a line or a strobe, taken out one after the other. */
function pullChecks(desk: Desk): Candidate[] {
  const { beliefs, index } = desk;
  const shares = new Map<SocketIndex, number>();
  for (const { sort, part, share } of beliefs.states) {
    if (sort !== 'holder' || part.socket === null) continue;
    shares.set(part.socket, (shares.get(part.socket) ?? 0) + share);
  }
  const order = [...shares].filter(([, share]) => share >= 0.01).sort((a, b) => largerFirst(a[1], b[1]) || a[0] - b[0]);
  const held = order.reduce((total, [, share]) => total + share, 0);
  if (order.length < 2 || order.length > mostPulled || held < 0.05) return [];
  const sockets = order.map(([socket]) => socket);
  const labels = sockets.map((socket) => labelOf(index, socket));
  const ids = sockets.map((socket) => holderIn(beliefs, socket));
  const strobe = beliefs.states.find(({ sort }) => sort === 'holder')?.cause.mode === 'holds-strobe';
  const what = strobe ? 'strobe' : 'line';
  // Pulled until one helps, or to the end.
  const pulls = order.reduce((total, [, share], n) => total + share * (n + 1), (1 - held) * order.length);
  const freed = (socket: SocketIndex) => (state: State | null) =>
    state?.sort === 'holder' && state.part.socket === socket
      ? shows.freed * (1 - state.kind.miss ** Math.max(1, state.lanes.length))
      : shows.freedByChance / sockets.length;
  const none = (state: State | null) => Math.max(0, 1 - sockets.reduce((sum, socket) => sum + freed(socket)(state), 0));
  return [
    weighSeen(
      beliefs,
      {
        action: 'pull-in-turn',
        label: `Power off, take out ${listWords(labels)} one at a time, and run again each time.`,
        sockets: labels,
        minutes: (minutes.pullStart + minutes.pullEach * pulls) * (effort(index, sockets) > 1 ? solderedFactor : 1),
      },
      [
        ...sockets.map((socket, n) => ({
          sees: `the others come back with ${labels[n]} out`,
          means: `the chip of ${labels[n]} holds the ${what}`,
          given: freed(socket),
          finding: foundOf('pull', ids[n] ?? '').bad,
        })),
        {
          sees: 'no change with any of them out',
          means: otherWords(desk),
          given: none,
          finding: foundOf('pull', ids.join(' ')).good,
        },
      ],
    ),
  ];
}

/** The id of the chip that lies in a socket. */
function holderIn({ states }: Desk['beliefs'], socket: SocketIndex): string {
  return states.find(({ sort, part }) => sort === 'holder' && part.socket === socket)?.part.id ?? '';
}

/** What is left when no chip holds the line. */
function otherWords({ beliefs }: Desk): string {
  const left = beliefs.answers
    .filter(({ part }) => part?.kind === 'shared-part')
    .sort((a, b) => largerFirst(a.share, b.share))
    .slice(0, 2);
  return left.length === 0
    ? 'look at the line and what drives it'
    : `look at ${left.map(({ part }) => part?.label).join(' and ')}`;
}

/** Behind a wrong picture: is the memory wrong too, or only what draws it? */
function readBack(desk: Desk): Candidate[] {
  const { beliefs, index, runs } = desk;
  const marks = runs.flatMap((run) => run.evidence.flatMap((each) => (each.kind === 'picture' ? each.marks : [])));
  const planes = [...new Set(marks.flatMap((mark) => mark.planes ?? []))];
  const video = (part: Part | null) =>
    index.document.sharedParts.some((each) => each.role === 'shift-register' && each.label === part?.sharedPart);
  if (marks.length === 0 || !beliefs.answers.some(({ part }) => video(part))) return [];
  const wrong = (state: State | null) => {
    if (!state) return shows.memoryWrong.other;
    return video(state.part) ? shows.memoryWrongBehindVideo : shows.memoryWrong[state.sort];
  };
  const names = beliefs.answers.flatMap(({ part }) => (part?.sharedPart && video(part) ? [part.sharedPart] : []));
  return [
    weighSeen(
      beliefs,
      {
        action: 'pattern',
        label: `Write the ${planes.length > 0 ? `${listWords(planes)} ` : ''}bytes of the wrong dots with the processor, and read them back.`,
        sockets: [],
        minutes: minutes.pattern,
      },
      [
        {
          sees: 'they read back right',
          means: `the picture side: look at ${listWords(names)} and what follows it`,
          given: (state) => 1 - wrong(state),
        },
        { sees: 'they read back wrong', means: 'the memory side: the chips and their line', given: wrong },
      ],
    ),
  ];
}

/** The supply at a socket. */
export function railsCheck(desk: Desk): Candidate {
  const { beliefs, index } = desk;
  const out = (state: State | null) => {
    if (!state) return shows.railOut.other;
    const { part, reach, sort } = state;
    const role = index.document.sharedParts.find((each) => each.label === part.sharedPart)?.role;
    if (role === 'supply') return shows.railOut.supply;
    return sort === 'shared' && reach.length === index.lanes.length ? shows.railOutForAll : shows.railOut[sort];
  };
  const socket = (placesOf(beliefs)[0]?.socket ?? 0) as SocketIndex;
  return weighSeen(
    beliefs,
    { action: 'rails', label: railsLabel(index, socket), sockets: [labelOf(index, socket)], minutes: minutes.rails },
    [
      { sees: 'a rail out of its limits', means: 'put the supply right before any chip is moved', given: out },
      { sees: 'all rails right', means: 'look at what is shared next', given: (state) => 1 - out(state) },
    ],
  );
}

/** "Measure -5 V at pin 1, +12 V at pin 8 and +5 V at pin 9 of U10 before any chip is moved." */
export function railsLabel(index: LayoutIndex, socket: SocketIndex): string {
  const rails = railsWords(index, socket) ?? 'the supply';
  return `Measure ${rails} of ${labelOf(index, socket)} before any chip is moved.`;
}
