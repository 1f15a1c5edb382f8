import type { Change } from '@/shared';
import { readField } from './link-text';
import { statement } from './statement';

/**
 * What was done, as a statement: `s.U31.U23` swapped; `x.U31.good` or `x.U31.any` replaced by a known good or an
 * untested chip, with the family as a third field where it is not that of the socket; `t.U31` reseated.
 */
export function writeChange(done: Change): string {
  switch (done.kind) {
    case 'swap':
      return statement('s', ...done.sockets);
    case 'replace': {
      const fitted = done.with === 'untested' ? 'any' : 'good';
      return statement('x', done.socket, fitted, ...(done.family === undefined ? [] : [done.family]));
    }
    case 'reseat':
      return statement('t', done.socket);
  }
}

/** What a statement says was done, before the schema has checked it; null for a letter of something else. */
export function rawChange(letter: string, raw: readonly string[]): unknown {
  const fields = raw.map(readField);
  const [socket, fitted, family] = fields;
  switch (letter) {
    case 's':
      return { kind: 'swap', sockets: fields };
    case 'x':
      return { kind: 'replace', socket, with: fitted === 'any' ? 'untested' : 'known-good', family };
    case 't':
      return { kind: 'reseat', socket };
    default:
      return null;
  }
}
