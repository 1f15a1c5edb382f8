import { sum } from 'd3-array';
import type { Diagnosis, LaneName, Place, Sign, Signature, Suspect, SuspectGroup } from '@/shared';
import type { Lane } from '../brand';
import { bankWords, listWords, sentenceCase } from '../layout/words';
import { lanesWords, saidAsOne } from './lane-words';
import type { Interpretation } from './observe/observations';
import type { RailReading } from './rails';
import { needEachOther, type Member } from './together';
import type { Findings } from './suspects';

/** What the evidence as a whole comes to. */
export interface Verdict {
  readonly outcome: Diagnosis['outcome'];
  readonly headline: string;
  readonly sure: Diagnosis['sure'];
  readonly probability: number | null;
  readonly groups: readonly SuspectGroup[];
  /** The handling itself is looked at first, before any part. */
  readonly refit?: true;
  /** Sockets that the headline tells to handle. */
  readonly sockets: readonly string[];
}

export interface Weighed {
  readonly findings: Findings;
  readonly signatures: readonly Signature[];
  readonly signs: readonly Sign[];
  readonly rails: readonly RailReading[];
  /** Sockets that now hold a chip which they break. */
  readonly breaking: readonly string[];
  readonly suspects: readonly Suspect[];
  readonly places: readonly Place[];
  /** The last run that showed anything, null where none did. */
  readonly lastRun: number | null;
  /** Something was entered, and none of it could be read. */
  readonly unreadable: boolean;
  /** The ways to understand the evidence; more than one where a convention is unknown. */
  readonly interpretations: readonly Interpretation[];
  /** Failing lanes that nothing in the model explains well. */
  readonly unexplained: readonly Lane[];
}

/** A place or shared part leads when it is likelier than all others together. */
const leads = 0.5;
/** Members of a group hold together this share of the probability; none is far below the first. */
const groupHolds = 0.95;
const mostMembers = 24;
const leastBesideFirst = 0.25;

/** The words for a probability. `capped` where the evidence cannot prove more, such as a fault that went away. */
export function sureWords(probability: number, { capped }: { capped: boolean }): Diagnosis['sure'] {
  if (capped || probability < 0.7) return 'not sure';
  if (probability >= 0.99) return 'sure';
  return probability >= 0.9 ? 'strong' : 'likely';
}

/** True where the last run passed though an earlier one failed. */
export function wentAway({ findings, lastRun }: Weighed): boolean {
  if (lastRun === null) return false;
  return (
    findings.runs[lastRun]?.failing.size === 0 && findings.runs.slice(0, lastRun).some((run) => run.failing.size > 0)
  );
}

/** Decides what to say first: a place, a group, a shared part, or that there is nothing to say. */
export function decide(weighed: Weighed): Verdict {
  const { findings, lastRun, places, suspects, unexplained } = weighed;
  if (weighed.breaking.length > 0 && lastRun !== findings.runs.length - 1) return wrongPartVerdict(weighed.breaking);
  const nothing = { probability: null, groups: [], sockets: [] };
  if (lastRun === null) {
    const headline = weighed.unreadable
      ? 'The report cannot be read.'
      : weighed.signs.length > 0
        ? 'No chip can be named: nothing names a place yet.'
        : 'Enter what the board reported.';
    return { outcome: 'no-evidence', headline, sure: 'no reading', ...nothing };
  }
  const failing = new Set(findings.runs.flatMap((run) => [...run.failing]));
  if (failing.size === 0) {
    return { outcome: 'not-shown', headline: 'No chip to pull: nothing failed.', sure: 'no reading', ...nothing };
  }
  if (unexplained.length === failing.size) {
    const headline = 'Nothing known explains this. Run the test again.';
    return { outcome: 'unexplained', headline, sure: 'not sure', ...nothing };
  }
  const shared = suspects.filter((suspect) => suspect.kind === 'shared-part' || suspect.kind === 'short');
  const sharedSum = Math.min(
    1,
    sum(shared, (suspect) => suspect.probability),
  );
  const fitting = fittingVerdict(weighed);
  if (fitting) return fitting;
  const leading = places.filter((place) => place.probability >= leads);
  if (leading.length > 0) return placeVerdict(weighed, leading);
  // Many shared parts with a little each do not outweigh one place that is likelier than any of them.
  const outweighs = (shared[0]?.probability ?? 0) >= (places[0]?.probability ?? 0);
  if (sharedSum >= leads && outweighs) return sharedVerdict(shared, sharedSum);
  return groupVerdict(weighed, shared);
}

/** A chip that does not belong in its socket, before anything was tested with it. */
function wrongPartVerdict(sockets: readonly string[]): Verdict {
  return {
    outcome: 'place',
    headline: wrongPartHeadline(listWords(sockets)),
    sure: 'strong',
    probability: null,
    groups: [],
    sockets,
  };
}

const wrongPartHeadline = (sockets: string) =>
  `Power off. The chip just fitted in ${sockets} is not made for this socket: treat it as destroyed.`;

function placeVerdict(weighed: Weighed, leading: readonly Place[]): Verdict {
  const capped = wentAway(weighed);
  const [first] = leading as [Place];
  const labels = leading.map((place) => place.socket);
  const probability = Math.min(...leading.map((place) => place.probability));
  return {
    outcome: 'place',
    headline: leading.length === 1 ? onePlace(weighed, first) : `Pull ${listWords(labels)}.`,
    sure: sureWords(probability, { capped }),
    probability,
    groups: [],
    sockets: labels,
  };
}

function onePlace({ suspects }: Weighed, place: Place): string {
  if (place.contact > place.chip) return `Look at socket ${place.socket} first: contacts, solder, trace.`;
  const chip = suspects.find((suspect) => suspect.kind === 'chip' && suspect.socket === place.socket);
  if (chip?.modes[0]?.mode === 'wrong-part') return wrongPartHeadline(place.socket);
  if (chip?.cameFrom) return `Pull the chip now in ${place.socket}: it came from ${chip.cameFrom}.`;
  if (chip?.id.includes('#')) return `Pull the chip just fitted in ${place.socket}.`;
  return `Pull ${place.socket} first.`;
}

/** A look at what was just handled costs so little that it comes first from here on. */
const worthALook = 0.3;

/** A new failure right after chips were handled: the handling itself is looked at first. */
function fittingVerdict({ suspects, findings, lastRun }: Weighed): Verdict | null {
  const fitted = suspects.flatMap((suspect) => {
    const probability = suspect.modes
      .filter((mode) => mode.mode === 'fitting')
      .reduce((sum, mode) => sum + mode.probability, 0);
    return suspect.kind === 'position' && suspect.socket && probability >= 0.15
      ? [{ socket: suspect.socket, probability }]
      : [];
  });
  const total = Math.min(
    1,
    sum(fitted, (each) => each.probability),
  );
  if (total < worthALook || lastRun === null || findings.runs[lastRun]?.failing.size === 0) return null;
  const sockets = fitted.map((each) => each.socket);
  return {
    outcome: 'place',
    headline: `Power off. Look how ${listWords(sockets)} ${sockets.length === 1 ? 'is' : 'are'} fitted: a bent leg, or a chip turned round.`,
    sure: sureWords(total, { capped: true }),
    probability: total,
    groups: [],
    refit: true,
    sockets,
  };
}

function sharedVerdict(shared: readonly Suspect[], total: number): Verdict {
  const members = membersOf(
    shared.map((suspect) => ({ id: suspect.id, label: suspect.label, share: suspect.probability })),
    total,
  );
  const [first] = shared as [Suspect];
  const names = members.map((member) => shared.find((suspect) => suspect.id === member.id)?.sharedPart ?? member.label);
  const one = first.probability >= leads * total;
  return {
    outcome: 'shared',
    headline:
      one && first.kind === 'short'
        ? `Do not pull a chip yet. Look for a ${first.label}.`
        : `Do not pull a chip yet. Look at ${one ? `${names[0]} first` : listWords(names, 4)}.`,
    sure: sureWords(one ? first.probability : total, { capped: false }),
    probability: one ? first.probability : total,
    groups:
      members.length > 1
        ? [
            {
              members,
              probability: total,
              why: 'What failed has no chip in common, but one of these serves it all.',
              check:
                'Measure the supply at a socket, then follow the signals of these parts with a scope, the likeliest first.',
            },
          ]
        : [],
    sockets: [],
  };
}

function membersOf(candidates: readonly Member[], total: number): Member[] {
  const sorted = [...candidates].sort((a, b) => b.share - a.share);
  const most = sorted[0]?.share ?? 0;
  const members: Member[] = [];
  let held = 0;
  for (const each of sorted) {
    const tied = each.share > (members.at(-1)?.share ?? Infinity) * 0.99;
    if (members.length >= mostMembers || each.share < most * leastBesideFirst || (held >= groupHolds * total && !tied))
      break;
    members.push(each);
    held += each.share;
  }
  return members;
}

function groupVerdict(weighed: Weighed, shared: readonly Suspect[]): Verdict {
  const { places, suspects, findings } = weighed;
  const together = needEachOther(places, findings);
  const candidates = [
    ...(together ? [together.member] : []),
    ...places
      .filter((place) => !together?.sockets.includes(place.socket))
      .map((place) => ({
        id: suspects.find((suspect) => suspect.socket === place.socket)?.id ?? `place:${place.socket}`,
        label: place.socket,
        share: place.probability,
      })),
    ...shared.map((suspect) => ({
      id: suspect.id,
      label: suspect.sharedPart ?? suspect.label,
      share: suspect.probability,
    })),
  ];
  const total = sum(candidates, (each) => each.share);
  const members = membersOf(candidates, total);
  if (members.every((member) => shared.some((suspect) => suspect.id === member.id))) {
    return sharedVerdict(
      shared,
      sum(shared, (suspect) => suspect.probability),
    );
  }
  const probability = Math.min(
    1,
    sum(members, (member) => member.share),
  );
  const sockets = places
    .filter(
      (place) => members.some((member) => member.label === place.socket) || together?.sockets.includes(place.socket),
    )
    .map((place) => place.socket);
  const holders = suspects.filter((suspect) => suspect.kind === 'chip' && suspect.modes[0]?.mode === 'holds-line');
  const held =
    holders.length > 1 &&
    sockets.length > 1 &&
    members.every((m) => shared.some((s) => s.id === m.id) || holders.some((h) => h.socket === m.label));
  const names = members.map((member) => member.label);
  const open = openMeaning(weighed);
  const why = open
    ? open.words
    : held
      ? `${sentenceCase(lanesWords(findings.index, allFailing(findings)))} ${saidAsOne(findings.index, allFailing(findings)) ? 'fails' : 'fail'}. One chip that never lets go of the line does that, and so does what drives the line: the code cannot tell them apart.`
      : 'The evidence fits these about equally well.';
  const check = open
    ? open.check
    : wentAway(weighed)
      ? 'Clean the legs and contacts, then let the test run for hours, cold and warm. Swap them back if it does not return.'
      : held
        ? `Power off, take out ${listWords(sockets)} one at a time, and run again each time. If the bit comes back in the other banks, the chip that is out held the line. If it never does, look at the line and its driver.`
        : sockets.length > 1
          ? `Swap one of ${listWords(sockets)} with a chip of another bit and run again: if the code changes, it was that chip.`
          : null;
  const oneOf = listWords(names, 4).replace(/ and (?=[^,]*$)/, ' or ');
  return {
    outcome: 'group',
    headline:
      held && !open
        ? heldHeadline(weighed, members, sockets)
        : wentAway(weighed)
          ? `Not repaired yet: suspect ${oneOf}.`
          : `One of ${oneOf}.`,
    sure: 'not sure',
    probability,
    groups: [{ members, probability, why, check }],
    sockets,
  };
}

function heldHeadline({ findings }: Weighed, members: readonly Member[], sockets: readonly string[]): string {
  const drivers = members.map((member) => member.label).filter((label) => !sockets.includes(label));
  const chips = `one of ${sockets.length} chips that holds the line`;
  const line = sentenceCase(lanesWords(findings.index, allFailing(findings)));
  return `${line}: ${[...drivers.slice(0, 2), chips].join(', or ')}.`;
}

/** More meanings than this are told together. */
const mostMeanings = 4;

/** What the evidence can mean where it can mean more than one thing, null where it cannot. */
export function openMeaning({ interpretations, findings }: Weighed): { words: string; check: string } | null {
  if (interpretations.length < 2) return null;
  const lanesOf = (runs: (typeof interpretations)[number]['runs']) => new Set(runs.flatMap((run) => [...run.failing]));
  const counting = interpretations.some(({ takes }) => takes.some((each) => /counted from|highest|lowest/.test(each)));
  if (interpretations.length > mostMeanings) {
    const all = new Set(interpretations.flatMap(({ runs }) => [...lanesOf(runs)]));
    const words = `The report leaves open which lane failed, within ${lanesWords(findings.index, all)}.`;
    return { words, check: 'Look for another report of this machine that says more, or read it again.' };
  }
  const meanings = interpretations.map(
    ({ takes, runs }) => `${takes.join(', ')}: ${lanesWords(findings.index, lanesOf(runs))}`,
  );
  return counting
    ? {
        words: `It is not known how this machine counts. ${sentenceCase(meanings.join('; '))}.`,
        check:
          'Find out how this machine counts: look for a code that names the first or the last, in the manual or by taking out one chip that is known.',
      }
    : {
        words: `The report can mean more than one thing. ${sentenceCase(meanings.join('; '))}.`,
        check: 'Start the machine again and read the report once more before you touch a chip.',
      };
}

function allFailing(findings: Findings): Lane[] {
  return [...new Set(findings.runs.flatMap((run) => [...run.failing]))];
}

/** Bank and bit of lanes, for the answer. */
export function laneNames(findings: Findings, lanes: Iterable<Lane>): LaneName[] {
  const { index } = findings;
  return [...lanes].map((lane) => ({
    bank: index.document.memory.banks[index.bankOf(lane)]?.id ?? bankWords('?'),
    bit: index.bitOf(lane) as number,
  }));
}
