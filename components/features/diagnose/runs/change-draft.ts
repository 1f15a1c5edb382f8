import type { Change } from '@/shared';

/** What was done, as it is being said. */
export interface ChangeDraft {
  readonly kind: 'swap' | 'known-good' | 'untested' | 'reseat' | 'again';
  readonly sockets: readonly [string, string];
  /** The family of a chip that was fitted, where it is not that of its socket. */
  readonly family?: string;
}

/** The things that can be done between two runs, and how many sockets each needs. */
export const changeTabs = [
  { value: 'swap', label: 'Swapped two', sockets: 2, hint: 'Tap both sockets on the sketch, or write their labels.' },
  {
    value: 'known-good',
    label: 'Fitted a good chip',
    sockets: 1,
    hint: 'A chip that was tested, or came from a working board.',
  },
  {
    value: 'untested',
    label: 'Fitted an untested chip',
    sockets: 1,
    hint: 'A chip of which nothing is known: it may be bad itself.',
  },
  { value: 'reseat', label: 'Reseated', sockets: 1, hint: 'Taken out, cleaned, put back in the same socket.' },
  { value: 'again', label: 'Only ran it again', sockets: 0, hint: 'Nothing was touched.' },
] as const satisfies readonly { value: ChangeDraft['kind']; label: string; sockets: 0 | 1 | 2; hint: string }[];

/** Nothing said yet. */
export const noChange: ChangeDraft = { kind: 'swap', sockets: ['', ''] };

const socketsNeeded = ({ kind }: ChangeDraft) => changeTabs.find(({ value }) => value === kind)?.sockets ?? 0;

/** A socket that was tapped goes where one is missing; tapped again it is let go. */
export function pickSocket(draft: ChangeDraft, label: string): ChangeDraft {
  const [one, other] = draft.sockets;
  if (socketsNeeded(draft) === 0) return draft;
  if (socketsNeeded(draft) === 1) return { ...draft, sockets: [one === label ? '' : label, other] };
  if (one === label) return { ...draft, sockets: ['', other] };
  if (other === label) return { ...draft, sockets: [one, ''] };
  return { ...draft, sockets: one === '' ? [label, other] : [one, label] };
}

/** The sockets that are named so far. */
export const chosenSockets = (draft: ChangeDraft): string[] =>
  draft.sockets
    .slice(0, socketsNeeded(draft))
    .map((label) => label.trim())
    .filter((label) => label !== '');

/** Why it is not whole yet; quiet while something is merely missing. Null when it is whole. */
export function changeProblem(
  draft: ChangeDraft,
  isSocket: (label: string) => boolean,
): { text: string; quiet: boolean } | null {
  const chosen = chosenSockets(draft);
  const unknown = chosen.find((label) => !isSocket(label));
  if (unknown !== undefined) return { text: `This board has no socket ${unknown}.`, quiet: false };
  if (chosen.length < socketsNeeded(draft)) return { text: 'A socket is missing.', quiet: true };
  if (chosen.length === 2 && chosen[0] === chosen[1]) {
    return { text: 'A swap needs two different sockets.', quiet: false };
  }
  return null;
}

/** The changes of a whole draft. */
export function changesOf(draft: ChangeDraft): Change[] {
  const [one = '', other = ''] = chosenSockets(draft);
  switch (draft.kind) {
    case 'swap':
      return [{ kind: 'swap', sockets: [one, other] }];
    case 'known-good':
    case 'untested':
      return [
        {
          kind: 'replace',
          socket: one,
          with: draft.kind,
          ...(draft.family === undefined ? {} : { family: draft.family }),
        },
      ];
    case 'reseat':
      return [{ kind: 'reseat', socket: one }];
    case 'again':
      return [];
  }
}
