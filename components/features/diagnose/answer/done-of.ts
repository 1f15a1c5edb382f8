import type { Change, NextCheck } from '@/shared';
import { readingsTab, signTab, supplyTab } from '../entry/entry-tabs';
import { writeSign, writeSupply } from '../entry/small-drafts';

/** The button that says a check was made, and what follows. */
export type Done =
  | {
      readonly label: string;
      /** What it changed; a new run begins with it. */
      readonly changes: Change[];
    }
  | {
      readonly label: string;
      /** What was seen is entered into the run in hand: in which tab, and what of it is known already. */
      readonly enter: { readonly tab: string; readonly text: string };
    };

/** What follows when a check was made. Null where nothing can be entered. */
export function doneOf({ action, sockets }: Pick<NextCheck, 'action' | 'sockets'>): Done | null {
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
    case 'test-whole':
      return { label: 'I tested all of it', changes: [] };
    case 'soak':
      return { label: 'It has run', changes: sockets.map((socket): Change => ({ kind: 'reseat', socket })) };
    case 'rails': {
      const text = writeSupply({ socket: one ?? '', pin: '', volts: '' });
      return { label: 'Enter the volts', enter: { tab: supplyTab, text } };
    }
    case 'pattern':
      return { label: 'Enter what was read', enter: { tab: readingsTab, text: '' } };
    case 'feel':
      return { label: 'One is hot', enter: { tab: signTab, text: writeSign({ sign: 'hot', socket: '' }) } };
    case 'measure':
    case 'probe':
    case 'pull-in-turn':
    case 'stack':
    case 'ask':
      return null;
  }
}
