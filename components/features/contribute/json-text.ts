import { findNodeAtLocation, parseTree, printParseErrorCode, type Node, type ParseError } from 'jsonc-parser';

/** A place in a text: characters from its start, and the line from 1. */
export interface TextPlace {
  readonly offset: number;
  readonly length: number;
  readonly line: number;
}

/** A text read as JSON, or where and why it is none. */
export type ReadJson =
  | { readonly ok: true; readonly value: unknown; readonly placeOf: (pointer: string) => TextPlace }
  | { readonly ok: false; readonly reason: string; readonly place: TextPlace };

const reasons: Record<string, string> = {
  InvalidSymbol: 'This word is no JSON: text stands in double quotes.',
  InvalidNumberFormat: 'This is no number. Write an address as text: "0x4000".',
  PropertyNameExpected: 'Here the name of a field is expected, in double quotes. Perhaps there is a comma too many.',
  ValueExpected: 'Here a value is expected. Perhaps there is a comma too many.',
  ColonExpected: 'Here a colon is expected.',
  CommaExpected: 'Here a comma is expected.',
  CloseBraceExpected: 'A closing brace } is missing.',
  CloseBracketExpected: 'A closing bracket ] is missing.',
  EndOfFileExpected: 'Something stands after the end of the document.',
  InvalidCommentToken: 'JSON has no comments.',
  UnexpectedEndOfString: 'This text has no closing quote.',
  InvalidUnicode: 'This \\u is not followed by four hexadecimal digits.',
  InvalidEscapeCharacter: 'A backslash stands before a letter that it has no meaning for.',
  InvalidCharacter: 'There is a control character in the text. Write it as \\n or \\t.',
};

/** Reads a text as JSON, and knows the place of every value in it. Never throws. */
export function readJson(text: string): ReadJson {
  const lineOf = lineCounter(text);
  const place = (offset: number, length: number): TextPlace => ({ offset, length, line: lineOf(offset) });
  const errors: ParseError[] = [];
  let root: Node | undefined;
  let value: unknown;
  try {
    root = parseTree(text, errors, { disallowComments: true, allowTrailingComma: false });
    // Not the tree's own values: a field named __proto__ would be lost in them.
    if (errors.length === 0 && root !== undefined) value = JSON.parse(text);
  } catch {
    // The reader goes down into the document level by level, and the stack ends.
    return { ok: false, reason: 'The document is nested too deeply.', place: place(0, 0) };
  }
  const [first] = errors;
  if (first !== undefined) {
    const reason = reasons[printParseErrorCode(first.error)] ?? 'This is no JSON.';
    return { ok: false, reason, place: place(first.offset, first.length) };
  }
  if (root === undefined) return { ok: false, reason: 'There is no document yet.', place: place(0, 0) };
  const tree = root;
  return {
    ok: true,
    value,
    placeOf: (pointer) => {
      const node = nearest(tree, pointer);
      return place(node.offset, node.length);
    },
  };
}

/** The value at a JSON pointer, or the nearest one around it: a field that is missing has no place of its own. */
function nearest(root: Node, pointer: string): Node {
  const steps = pointer
    .split('/')
    .slice(1)
    .map((step) => step.replaceAll('~1', '/').replaceAll('~0', '~'));
  let node = root;
  for (const step of steps) {
    const next = findNodeAtLocation(node, [node.type === 'array' ? Number(step) : step]);
    if (next === undefined) break;
    node = next;
  }
  return node;
}

/** Counts lines once, so that hundreds of problems can be placed. */
function lineCounter(text: string): (offset: number) => number {
  const starts = [0];
  for (let at = text.indexOf('\n'); at >= 0; at = text.indexOf('\n', at + 1)) starts.push(at + 1);
  return (offset) => {
    let [low, high] = [0, starts.length - 1];
    while (low < high) {
      const middle = Math.ceil((low + high) / 2);
      if ((starts[middle] ?? 0) <= offset) low = middle;
      else high = middle - 1;
    }
    return low + 1;
  };
}
