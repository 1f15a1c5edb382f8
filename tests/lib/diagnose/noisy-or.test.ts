import fc from 'fast-check';
import { inferNoisyOr, type HiddenVariable, type NoisyOrModel } from '@/lib/diagnose/noisy-or';

/** Enumerates every combination of states, with nothing shared with the code under test. */
function enumerate(model: NoisyOrModel): { evidence: number; marginals: number[][] } {
  const marginals = model.variables.map((v) => v.states.map(() => 0));
  let evidence = 0;
  const chosen: number[] = [];
  const visit = (v: number, weight: number): void => {
    const variable = model.variables[v];
    if (variable) {
      chosen[v] = -1;
      visit(v + 1, weight * variable.absent);
      variable.states.forEach((state, s) => {
        chosen[v] = s;
        visit(v + 1, weight * state.weight);
      });
      return;
    }
    let likelihood = weight;
    for (let o = 0; o < model.positives; o++) {
      let quiet = 1 - (typeof model.leak === 'number' ? model.leak : (model.leak[o] as number));
      model.variables.forEach((each, i) => {
        const state = each.states[chosen[i] as number];
        if (state?.touches.includes(o)) quiet *= state.miss;
      });
      likelihood *= 1 - quiet;
    }
    evidence += likelihood;
    chosen.forEach((s, i) => {
      if (s >= 0) (marginals[i] as number[])[s] = ((marginals[i] as number[])[s] as number) + likelihood;
    });
  };
  visit(0, 1);
  return { evidence, marginals: marginals.map((m) => m.map((x) => x / evidence)) };
}

const variable = (positives: number): fc.Arbitrary<HiddenVariable> => {
  const touches = fc
    .uniqueArray(fc.integer({ min: 0, max: positives - 1 }), { maxLength: positives })
    .map((t) => t.sort((a, b) => a - b));
  const weight = fc.constantFrom(0.0144, 0.0036, 0.002, 0.0005, 0.00004, 1e-7);
  const miss = fc.constantFrom(0.02, 0.5);
  const state = fc.record({ weight, touches, miss });
  const twoKinds = fc.record({ touches, hard: weight }).map(({ touches: t, hard }) => ({
    absent: 1 - hard * 1.25,
    states: [
      { weight: hard, touches: t, miss: 0.02 },
      { weight: hard / 4, touches: t, miss: 0.5 },
    ],
  }));
  return fc.oneof(
    twoKinds,
    fc.array(state, { minLength: 1, maxLength: 3 }).map((states) => ({ absent: 0.95, states })),
  );
};

const model = fc.integer({ min: 1, max: 7 }).chain((positives) =>
  fc.record({
    variables: fc.array(variable(positives), { minLength: 1, maxLength: 7 }),
    positives: fc.constant(positives),
    leak: fc.constant(0.001),
  }),
);

describe('the posterior of causes, given the lanes that failed', () => {
  it('equals the sum over every combination of causes, to 1e-9', () => {
    fc.assert(
      fc.property(model, (m) => {
        const expected = enumerate(m);
        const answer = inferNoisyOr(m);
        expect(Math.abs(Math.exp(answer.logEvidence) / expected.evidence - 1)).toBeLessThan(1e-9);
        answer.marginals.forEach((own, v) =>
          own.forEach((p, s) =>
            expect(Math.abs(p - ((expected.marginals[v] as number[])[s] as number))).toBeLessThan(1e-9),
          ),
        );
        expect(answer.leftOut).toBeLessThan(1e-9);
      }),
      { seed: 7, numRuns: 10_000 },
    );
  });

  it('keeps its digits where six rare faults are needed at once', () => {
    const six: NoisyOrModel = {
      positives: 6,
      leak: 1e-3,
      variables: Array.from({ length: 6 }, (_, o) => ({
        absent: 0.9999,
        states: [{ weight: 1e-4, touches: [o], miss: 0.02 }],
      })),
    };
    const expected = enumerate(six);
    const answer = inferNoisyOr(six);
    expect(Math.exp(answer.logEvidence) / expected.evidence).toBeCloseTo(1, 10);
  });

  it('takes the widest variables apart where a table of all failing lanes would be too large, and is no further off than it says', () => {
    // 4 banks of 6 bits, all failing: 24 positives. One part for all, one a bank, one a bit, one a lane.
    const lanes = Array.from({ length: 24 }, (_, i) => i);
    const two = (touches: number[], weight: number): HiddenVariable => ({
      absent: 1 - weight,
      states: [
        { weight: weight * 0.8, touches, miss: 0.02 },
        { weight: weight * 0.2, touches, miss: 0.5 },
      ],
    });
    const wide: NoisyOrModel = {
      positives: 24,
      leak: 1e-3,
      variables: [
        two(lanes, 0.002),
        ...[0, 1, 2, 3].map((b) =>
          two(
            lanes.filter((l) => Math.floor(l / 6) === b),
            0.0015,
          ),
        ),
        ...[0, 1, 2, 3, 4, 5].map((b) =>
          two(
            lanes.filter((l) => l % 6 === b),
            0.002,
          ),
        ),
        ...lanes.map((l) => two([l], 0.02)),
      ],
    };
    const answer = inferNoisyOr(wide);
    // Independent: given the states of the wide parts, every lane stands alone.
    const wideStates = wide.variables.slice(0, 11);
    let evidence = 0;
    let whole = 0;
    const quiet = (chosen: number[], lane: number) =>
      chosen.reduce((q, s, v) => {
        const state = wideStates[v]?.states[s];
        return state?.touches.includes(lane) ? q * state.miss : q;
      }, 1 - 1e-3);
    const visit = (v: number, weight: number, chosen: number[]): void => {
      const own = wideStates[v];
      if (own) {
        visit(v + 1, weight * own.absent, [...chosen, -1]);
        own.states.forEach((state, s) => visit(v + 1, weight * state.weight, [...chosen, s]));
        return;
      }
      let likelihood = weight;
      for (const lane of lanes) {
        const q = quiet(chosen, lane);
        likelihood *= 0.98 * (1 - q) + 0.016 * (1 - q * 0.02) + 0.004 * (1 - q * 0.5);
      }
      evidence += likelihood;
      if ((chosen[0] as number) >= 0) whole += likelihood;
    };
    visit(0, 1, []);
    const [first] = answer.marginals;
    const off = Math.abs((first?.[0] ?? 0) + (first?.[1] ?? 0) - whole / evidence);
    expect(off).toBeLessThanOrEqual(answer.leftOut + 1e-12);
    expect(answer.leftOut).toBeLessThan(1e-5);
  });
});
