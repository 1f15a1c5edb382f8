import type { Choice, Piece } from './piece';

/** More ways than this are not followed further. */
const most = 256;

interface Path {
  readonly choices: Choice[];
  /** The answer that each open question was given. */
  readonly taken: Map<string, string>;
}

/**
 * One choice for each piece, such that pieces with the same open question take the same answer to it. Where no answer
 * suits them all, each piece is taken by itself, by its first choice.
 */
export function consistentChoices(pieces: readonly Piece[]): Choice[][] {
  let paths: Path[] = [{ choices: [], taken: new Map() }];
  for (const piece of pieces) {
    const [only] = piece.choices;
    if (piece.choices.length === 1 && only) {
      for (const path of paths) path.choices.push(only);
      continue;
    }
    paths = paths.flatMap((path) => piece.choices.flatMap((choice) => extended(path, piece, choice)));
    if (paths.length === 0) return [pieces.map((each) => each.choices[0] as Choice)];
    if (paths.length > most) paths = paths.slice(0, most);
  }
  return paths.map((path) => path.choices);
}

function extended(path: Path, { question }: Piece, choice: Choice): Path[] {
  if (question === null) return [{ choices: [...path.choices, choice], taken: path.taken }];
  const answer = choice.takes.join('|');
  const before = path.taken.get(question);
  if (before !== undefined && before !== answer) return [];
  const taken = before === undefined ? new Map(path.taken).set(question, answer) : path.taken;
  return [{ choices: [...path.choices, choice], taken }];
}
