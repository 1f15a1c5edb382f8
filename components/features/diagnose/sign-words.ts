import type { SignKind } from '@/shared';

/** A sign as a technician says it. */
interface SignWords {
  readonly label: string;
  /** What exactly is meant. */
  readonly help: string;
  /** What the socket is asked for, where one helps. */
  readonly socket?: string;
}

/** Every sign in words, in the order in which they are offered. */
export const signWords: Record<SignKind, SignWords> = {
  'changes-each-pass': {
    label: 'Changes with each pass',
    help: 'Other bits or addresses fail each time the test runs.',
  },
  'grows-with-waiting': {
    label: 'Grows with waiting',
    help: 'More fails the longer it waits between writing and reading.',
  },
  'grows-with-warmth': {
    label: 'Comes with warmth',
    help: 'Fails only when it is warm, or more then.',
    socket: 'The chip that was warmed',
  },
  touch: {
    label: 'Comes and goes by touch',
    help: 'Pressing a place, flexing the board or tapping it changes what fails.',
    socket: 'The socket that was pressed',
  },
  hot: {
    label: 'A chip is hot',
    help: 'Much hotter than its neighbours. Mind your fingers: a shorted chip burns.',
    socket: 'The hot chip',
  },
  'writes-do-not-stick': {
    label: 'Writes do not stick',
    help: 'It reads what was there before the writing.',
    socket: 'The socket, if it is one chip',
  },
  dead: { label: 'Dead', help: 'No picture, no sound, nothing runs.' },
};
