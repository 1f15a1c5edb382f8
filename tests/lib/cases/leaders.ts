import type { Diagnosis, Suspect } from '@/shared';
import type { SuspectName } from './bench-case';

/** One place in the order of an answer. */
export interface Leader {
  readonly id: string;
  readonly label: string;
  readonly socket: string | null;
  /** Probability as the answer states it. */
  readonly share: number;
  /** The suspect that is meant, where there is one: of a place, the likelier of its chip and its contacts. */
  readonly suspect: Suspect | null;
}

const ofSuspect = (suspect: Suspect): Leader => ({
  id: suspect.id,
  label: suspect.label,
  socket: suspect.socket,
  share: suspect.probability,
  suspect,
});

function ofPlace(answer: Diagnosis, { socket, probability }: Diagnosis['places'][number]): Leader {
  const there = answer.suspects.filter((suspect) => suspect.socket === socket);
  const [suspect = null] = there.sort((a, b) => b.probability - a.probability);
  return { id: suspect?.id ?? `place:${socket}`, label: socket, socket, share: probability, suspect };
}

function ofMember(answer: Diagnosis, { id, label, share }: Diagnosis['groups'][number]['members'][number]): Leader {
  const suspect = answer.suspects.find((each) => each.id === id) ?? null;
  const place = id.startsWith('place:') ? id.slice('place:'.length) : null;
  return { id, label, socket: suspect?.socket ?? place, share, suspect };
}

/** Chip and contacts of one place are one leader, so that a place counts once. */
const oncePerPlace = (leaders: readonly Leader[]): Leader[] =>
  leaders.filter(
    ({ id, socket }, at) =>
      leaders.findIndex((other) => other.id === id || (socket !== null && other.socket === socket)) === at,
  );

/** Two that the answer lists as a pair, and that are hardly ever bad without each other, are one leader. */
function pairsAsOne({ pairs }: Diagnosis, order: readonly Leader[]): Leader[] {
  return pairs.reduce<Leader[]>(
    (leading, { parts, labels, probability }) => {
      const both = leading.filter(({ id }) => parts.includes(id));
      if (both.length < 2 || both.some(({ share }) => probability < 0.8 * share)) return leading;
      const one = { id: `pair:${parts.join('+')}`, label: labels.join(' and '), share: probability };
      return leading.flatMap((leader) =>
        leader === both[0] ? [{ ...one, socket: null, suspect: null }] : leader === both[1] ? [] : [leader],
      );
    },
    [...order],
  );
}

const isFitting = ({ modes }: Suspect) => modes[0]?.mode === 'fitting';

/** The answer tells to look how a chip was fitted before anything else. */
const refitFirst = ({ headline, nextChecks }: Diagnosis) =>
  nextChecks[0]?.action === 'reseat' && /bent|folded|fitted/i.test(headline);

/**
 * What an answer puts first, in its own order: the rails of a supply verdict; the places of a place verdict, those
 * that may be badly fitted first where the headline tells to look there; the members of the group; the shared parts and shorts of a shared verdict, its group before the rest. What the answer
 * ranks below follows. Two that only a pair explains count as one. Nothing leads where the answer names nothing.
 */
export function leaders(answer: Diagnosis): Leader[] {
  const all = [...answer.suspects].sort((a, b) => a.rank - b.rank);
  const members = answer.groups.flatMap((group) => group.members).map((member) => ofMember(answer, member));
  switch (answer.outcome) {
    case 'supply':
      return all.filter(({ kind }) => kind === 'rail').map(ofSuspect);
    case 'place': {
      const places = answer.places.map((place) => ofPlace(answer, place));
      if (!refitFirst(answer)) return places;
      const fitted = all.filter(isFitting).map(ofSuspect);
      return oncePerPlace([...fitted, ...places]);
    }
    case 'group':
      return pairsAsOne(answer, oncePerPlace([...members, ...all.map(ofSuspect)]));
    case 'shared': {
      const shared = all.filter(({ kind }) => kind === 'shared-part' || kind === 'short');
      return oncePerPlace([...members, ...shared.map(ofSuspect), ...all.map(ofSuspect)]);
    }
    case 'not-shown':
    case 'unexplained':
    case 'no-evidence':
      return [];
  }
}

/** How many of the leaders the answer itself puts forward: the whole group, or each place that its headline rests on. */
export function leadingCount(answer: Diagnosis, wanted: number): number {
  const members = oncePerPlace(
    answer.groups.flatMap((group) => group.members).map((member) => ofMember(answer, member)),
  );
  const grouped = answer.outcome === 'group' || answer.outcome === 'shared';
  return Math.max(wanted, grouped ? members.length : 0, leaders(answer).length > 0 ? 1 : 0);
}

const plainMinus = (text: string) => text.replaceAll('−', '-');

/** Whether a leader is the one that an expectation names; see SuspectName. */
export function isNamed(leader: Leader, name: SuspectName): boolean {
  const { id, label, socket, suspect } = leader;
  const [kind, rest] = name.includes(':')
    ? [name.slice(0, name.indexOf(':')), name.slice(name.indexOf(':') + 1)]
    : [name];
  const wide = suspect !== null && (suspect.kind === 'shared-part' || suspect.kind === 'short');
  const lanes = suspect?.lanes ?? [];
  const banks = new Set(lanes.map(({ bank }) => bank));
  const bits = new Set(lanes.map(({ bit }) => bit));
  if (rest === undefined) return name === 'all' ? wide && banks.size > 1 && bits.size > 1 : socket === name;
  const parts = rest.split('+');
  switch (kind) {
    case 'short':
      return id.startsWith('short:') && id.endsWith(rest);
    case 'line':
      return (
        suspect?.kind === 'shared-part' && suspect.sharedPart === null && bits.size === 1 && bits.has(Number(rest))
      );
    case 'rail':
      return plainMinus(id) === name || (suspect?.kind === 'rail' && plainMinus(label).includes(rest));
    case 'fitting':
      return suspect !== null && isFitting(suspect) && (rest === 'any' || socket === rest);
    case 'together':
      return parts.length > 1 && parts.every((part) => label.includes(part));
    case 'common':
      return wide && bits.size === parts.length && parts.every((bit) => bits.has(Number(bit)));
    case 'bank':
      return wide && banks.size === 1 && banks.has(rest) && bits.size > 1;
    default:
      return id === name;
  }
}

/** Whether an answer lists what an expectation names, at any rank. */
export const isListed = (answer: Diagnosis, name: SuspectName): boolean =>
  [...answer.suspects.map(ofSuspect), ...leaders(answer)].some((leader) => isNamed(leader, name));

/** All sentences of an answer, one a line. */
export const sentencesOf = (answer: Diagnosis): string =>
  [
    answer.headline,
    ...answer.sentences,
    ...answer.groups.flatMap(({ why, check }) => [why, check ?? '']),
    ...answer.suspects.flatMap(({ label, reasons, modes }) => [label, ...reasons, ...modes.map(({ words }) => words)]),
    ...answer.nextChecks.flatMap(({ label, outcomes }) => [
      label,
      ...outcomes.flatMap(({ sees, means }) => [sees, means]),
    ]),
    ...answer.cautions.map(({ text }) => text),
    ...answer.questions.flatMap(({ ask, settles }) => [ask, settles]),
    ...answer.signatures.map(({ words }) => words),
  ].join('\n');
