import type { Change, NextCheck } from '@/shared';

/** The button that says the check was made, and what that changed. Null where it ends in no run. */
export function doneOf({ action, sockets }: NextCheck): { label: string; changes: Change[] } | null {
  const [one, other] = sockets;
  switch (action) {
    case 'swap':
      if (one === undefined || other === undefined) return null;
      return { label: 'I swapped them', changes: [{ kind: 'swap', sockets: [one, other] }] };
    case 'replace':
      if (one === undefined) return null;
      return { label: 'I fitted a good chip', changes: [{ kind: 'replace', socket: one, with: 'known-good' }] };
    case 'reseat':
      if (one === undefined) return null;
      return { label: 'I reseated it', changes: [{ kind: 'reseat', socket: one }] };
    case 'read-again':
      return { label: 'I have another report', changes: [] };
    case 'soak':
      return { label: 'It has run', changes: sockets.map((socket): Change => ({ kind: 'reseat', socket })) };
    case 'measure':
    case 'probe':
    case 'pull-in-turn':
      return null;
  }
}
