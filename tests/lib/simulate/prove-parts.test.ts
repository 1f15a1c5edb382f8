import { buildLayoutIndex, priors, validateLayout, type PossibleFault } from '@/lib';
import { smallProofBoards } from '@/server/scripts/prove/boards';
import { generateBoard, generatedSizes, nameOf } from '@/server/scripts/prove/generated';
import { entityOf, referencePosterior } from '@/server/scripts/prove/posterior-reference';
import { smallestSet } from '@/server/scripts/prove/score';
import { calibrationError } from '@/server/scripts/prove/tally';

describe('the generated boards of the proof', () => {
  it('have 8 to 256 sockets, chips of 1, 4 and 8 bits, parity and interleave', () => {
    const sockets = generatedSizes.map((size) => generateBoard(size).sockets.length);
    expect(Math.min(...sockets)).toBe(8);
    expect(Math.max(...sockets)).toBe(256);
    expect(new Set(generatedSizes.map(({ width }) => width))).toEqual(new Set([1, 4, 8]));
    expect(generatedSizes.some(({ parity }) => parity > 0) && generatedSizes.some(({ interleave }) => interleave)).toBe(
      true,
    );
  });

  it.each(generatedSizes.map((size) => [nameOf(size), size] as const))('%s: has no error', (_, size) => {
    const problems = validateLayout(generateBoard(size)).filter(({ severity }) => severity === 'error');
    expect(problems).toEqual([]);
    expect(buildLayoutIndex(generateBoard(size)).lanes.length).toBe(size.banks * (size.bits + size.parity));
  });
});

/** Every combination of five faults written out, each absent, always there, or coming and going. */
function enumerated(possible: readonly PossibleFault[], lanes: readonly number[], failing: readonly number[]) {
  const kinds = [
    { share: 1 - priors.intermittentShare, shows: priors.detectionHard },
    { share: priors.intermittentShare, shows: priors.detectionIntermittent },
  ];
  let total = 0;
  const found = new Map<string, number>();
  for (let combination = 0; combination < 3 ** possible.length; combination++) {
    const states = possible.map((_, at) => Math.floor(combination / 3 ** at) % 3);
    let weight = 1;
    possible.forEach(({ prior }, at) => {
      const kind = kinds[(states[at] as number) - 1];
      weight *= kind ? prior * kind.share : 1 - prior;
    });
    for (const lane of lanes) {
      const well = possible.reduce((product, fault, at) => {
        const kind = kinds[(states[at] as number) - 1];
        return kind && fault.lanes.includes(lane) ? product * (1 - kind.shows) : product;
      }, 1 - priors.leak);
      weight *= failing.includes(lane) ? 1 - well : well;
    }
    total += weight;
    const there = new Set(possible.filter((_, at) => states[at] !== 0).map(entityOf));
    for (const entity of there) found.set(entity, (found.get(entity) ?? 0) + weight);
  }
  return new Map([...found].map(([entity, weight]) => [entity, weight / total]));
}

describe('the sum that the proof is compared with', () => {
  const board = smallProofBoards().find(({ wiring }) => wiring.labels.length === 8 && wiring.banks.length === 2);
  if (!board) throw new RangeError('no small board');
  const { lanes } = board.wiring;
  const some = board.possible.filter(
    (fault) => fault.kind === 'chip holds its data line' || fault.kind === 'lines shorted' || fault.part === 'position',
  );

  it.each([[[0]], [[0, 4]], [[1, 2, 5]], [[0, 1, 4, 5]]])(
    'equals all combinations written out for lanes %j',
    (failing) => {
      const possible = some.filter((fault) => fault.lanes.some((lane) => failing.includes(lane))).slice(0, 8);
      const expected = enumerated(possible, lanes, failing);
      for (const { key, probability } of referencePosterior(possible, priors, { lanes, failing })) {
        expect(Math.abs(probability - (expected.get(key) ?? 0))).toBeLessThan(1e-9);
      }
    },
  );
});

describe('the measures of the proof', () => {
  it('find no error where what is stated comes true as often, and all of it where it never does', () => {
    const stated = (probability: number, right: number, of: number) =>
      Array.from({ length: of }, (_, n) => ({ probability, right: n < right }));
    expect(calibrationError([...stated(0.8, 8, 10), ...stated(0.3, 3, 10)])).toBeCloseTo(0, 9);
    expect(calibrationError(stated(0.9, 0, 4))).toBeCloseTo(0.9, 9);
    expect(calibrationError([...stated(0.5, 5, 10), ...stated(1, 5, 10)])).toBeCloseTo(0.25, 9);
    expect(calibrationError([])).toBeNull();
  });

  it('take the fewest that hold 95 % of the probability', () => {
    const ranked = [0.6, 0.3, 0.06, 0.04].map((probability, n) => ({ key: String(n), probability }));
    expect(smallestSet(ranked)).toEqual(['0', '1', '2']);
    expect(smallestSet(ranked, 0.5)).toEqual(['0']);
  });
});
