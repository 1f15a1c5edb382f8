import type { Run } from '@/shared';
import type { Lane } from '../../brand';
import type { LayoutIndex } from '../../layout/layout-index';
import { segmentsOf } from '../../layout/segments';
import { commonOnes } from '../../place/address-bits';
import type { LaneSeen } from '../../readings/lane-seen';
import type { Tried } from '../shapes';
import type { RunObservation } from './observations';
import type { Choice, Piece } from './piece';

interface Chosen {
  readonly piece: Piece;
  readonly choice: Choice;
}

const nothing = new Map<Lane, never>();

/** What one run showed, all its evidence taken together. */
export function observeRun(index: LayoutIndex, run: Run, chosen: readonly Chosen[]): RunObservation {
  const failing = new Set<Lane>();
  const passed = new Set<Lane>();
  const outright = new Set<Lane>();
  let listed = false;
  for (const { piece, choice } of chosen) {
    for (const lane of choice.failing) failing.add(lane);
    for (const lane of choice.passed) (piece.passesOutright ? outright : passed).add(lane);
    const lists = piece.after === 'lists-lanes' || piece.after === 'lists-banks';
    if (run.complete && lists) listed = true;
  }
  if (listed) for (const lane of index.lanes) passed.add(lane as Lane);
  // Failing in one code and passed by the silence of another is a failure; only an outright pass speaks against it.
  for (const lane of failing) passed.delete(lane);
  for (const lane of outright) passed.add(lane);
  const tallied = chosen.some(({ choice }) => choice.tally !== null || choice.aliased.length > 0);
  const picked = pickedOf(index, chosen);
  if (!tallied) {
    return {
      failing,
      passed,
      seen: nothing,
      tried: nothing,
      picked,
      failingSegments: nothing,
      rightSegments: nothing,
      values: [],
      aliased: nothing,
      whole: false,
    };
  }
  return { failing, passed, picked, ...details(index, { chosen, failing, passed, outright, listed }) };
}

/**
 * A test that stops at the first failure, in an order that nobody knows, reports one of the failing lanes as if at
 * random, or the word of one of the failing banks. Null where the run says more than such a code.
 */
function pickedOf(index: LayoutIndex, chosen: readonly Chosen[]): RunObservation['picked'] {
  const telling = chosen.filter(({ choice }) => choice.failing.length + choice.passed.length > 0);
  const [only] = telling;
  if (telling.length !== 1 || !only?.piece.unordered) return null;
  const { failing, passed } = only.choice;
  const banks = new Set(failing.map((lane) => index.bankOf(lane)));
  const wholeWord = failing.length > 1 || passed.some((lane) => banks.has(index.bankOf(lane)));
  return wholeWord ? 'bank' : 'lane';
}

interface Parts {
  readonly chosen: readonly Chosen[];
  readonly failing: ReadonlySet<Lane>;
  readonly passed: ReadonlySet<Lane>;
  readonly outright: ReadonlySet<Lane>;
  readonly listed: boolean;
}

function details(index: LayoutIndex, { chosen, failing, passed, outright, listed }: Parts) {
  const seen = new Map<Lane, LaneSeen>();
  const whole = chosen.some(({ choice }) => choice.tally?.whole);
  const byReadings = new Set<Lane>();
  const otherwise = new Set<Lane>(outright);
  const aliased = new Map<Lane, readonly number[]>();
  for (const { piece, choice } of chosen) {
    if (choice.aliased.length > 0) for (const lane of choice.failing) aliased.set(lane, choice.aliased);
    for (const [lane, own] of choice.tally?.lanes ?? []) {
      seen.set(lane, merged(seen.get(lane), own));
      byReadings.add(lane);
    }
    if (choice.tally === null && !piece.passesOutright) for (const lane of choice.passed) otherwise.add(lane);
  }
  return {
    seen,
    whole,
    values: chosen.flatMap(({ choice }) => choice.tally?.values ?? []),
    aliased,
    tried: listed || whole ? nothing : triedOf(seen, { passed, outright, byReadings, otherwise }),
    ...segments(index, seen, { failing, whole: whole || listed }),
  };
}

/** From so many readings on, ranges were tested and not single words. */
const rangeFrom = 64;

/** What was tried of the lanes that passed in single readings only. */
function triedOf(
  seen: ReadonlyMap<Lane, LaneSeen>,
  sets: {
    passed: ReadonlySet<Lane>;
    outright: ReadonlySet<Lane>;
    byReadings: ReadonlySet<Lane>;
    otherwise: ReadonlySet<Lane>;
  },
): Map<Lane, Tried> {
  const tried = new Map<Lane, Tried>();
  let ones = false;
  let zeros = false;
  let words = 0;
  for (const own of seen.values()) {
    if (own.rightOnes + own.readsZero > 0) ones = true;
    if (own.rightZeros + own.readsOne > 0) zeros = true;
    words = Math.max(words, own.rightZeros + own.rightOnes + own.readsOne + own.readsZero);
  }
  for (const lane of sets.passed) {
    const own = seen.get(lane);
    if (own && sets.byReadings.has(lane) && !sets.otherwise.has(lane)) {
      const { rightZeros, rightOnes } = own;
      tried.set(lane, { words: rightZeros + rightOnes, bothValues: rightZeros > 0 && rightOnes > 0 });
      continue;
    }
    if (!sets.outright.has(lane)) continue;
    // "Nothing failed there" beside single readings is as good as the values that those readings tried. Where whole
    // ranges were read, what spoils both places would have shown with the value that showed it in the other.
    tried.set(lane, { words, bothValues: (ones && zeros) || words >= rangeFrom });
  }
  return tried;
}

function merged(before: LaneSeen | undefined, own: LaneSeen): LaneSeen {
  if (!before) return own;
  if (before.words === 0) return { ...own, ...added(before, own) };
  if (own.words === 0) return { ...before, ...added(before, own) };
  const row = before.row !== null && before.row === own.row ? own.row : null;
  const column = before.column !== null && before.column === own.column ? own.column : null;
  return {
    ...own,
    ...added(before, own),
    words: before.words + own.words,
    outOf: before.outOf === null || own.outOf === null ? null : Math.max(before.outOf, own.outOf),
    rows: row === null ? Math.max(before.rows + own.rows, 2) * Math.sign(before.rows) : 1,
    columns: column === null ? Math.max(before.columns + own.columns, 2) * Math.sign(before.columns) : 1,
    row,
    column,
    ones: commonOnes(before.ones, own.ones),
    zeros: commonOnes(before.zeros, own.zeros),
  };
}

function added(before: LaneSeen, own: LaneSeen) {
  return {
    readsOne: before.readsOne + own.readsOne,
    readsZero: before.readsZero + own.readsZero,
    rightZeros: before.rightZeros + own.rightZeros,
    rightOnes: before.rightOnes + own.rightOnes,
    alone: before.alone + own.alone,
    failingSegments: before.failingSegments | own.failingSegments,
    rightSegments: before.rightSegments | own.rightSegments,
  };
}

/** Which chips behind a failing lane hold a failing word, where the bank is several chips deep. */
function segments(
  index: LayoutIndex,
  seen: ReadonlyMap<Lane, LaneSeen>,
  { failing, whole }: { failing: ReadonlySet<Lane>; whole: boolean },
) {
  const failingSegments = new Map<Lane, number>();
  const rightSegments = new Map<Lane, number>();
  for (const [lane, own] of seen) {
    if (!failing.has(lane) || own.failingSegments === 0) continue;
    const count = segmentsOf(index, lane).length;
    if (count < 2) continue;
    failingSegments.set(lane, own.failingSegments);
    const rest = whole ? 2 ** count - 1 : own.rightSegments;
    rightSegments.set(lane, rest & ~own.failingSegments);
  }
  return { failingSegments, rightSegments };
}
