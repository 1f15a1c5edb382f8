import { buildLayoutIndex, priors, type Lane, type LayoutIndex, type SocketIndex } from '@/lib';
import type { Cause, Kind, Part } from '@/lib/diagnose/cause-types';
import type { Verdict, Weighed } from '@/lib/diagnose/verdict';
import { buildLayout } from '../../../factories/layout';

/** Hard, and coming and going: how often each shows. */
const kindsOf = (prior: number, lanes: readonly Lane[]): Kind[] => [
  { intermittent: false, prior: prior * 0.8, miss: 0.02, scopes: [{ lanes }], cured: null },
  { intermittent: true, prior: prior * 0.2, miss: 0.5, scopes: [{ lanes }], cured: null },
];

const causeOf = (mode: Cause['mode'], prior: number, lanes: readonly Lane[]): Cause => ({
  mode,
  where: null,
  kinds: kindsOf(prior, lanes),
});

/** A board of a few one-bit chips, with its causes written down a second time. */
export function smallBench(banks: number, bits: number) {
  const index = buildLayoutIndex(buildLayout({ banks, bits, sharedParts: false, formats: [] }));
  const lanes = [...index.lanes] as Lane[];
  const lineOf = (lane: Lane) => lanes.filter((each) => index.bitOf(each) === index.bitOf(lane));
  const part = (id: string, causes: Cause[], of: Pick<Part, 'kind' | 'socket'>): Part => ({
    ...of,
    id,
    label: id,
    cameFrom: of.kind === 'chip' ? of.socket : null,
    sharedPart: null,
    causes,
  });
  const shared = { kind: 'shared-part', socket: null } as const;
  const parts: Part[] = [];
  index.document.sockets.forEach(({ label }, s) => {
    const lane = index.socketLanes[index.socketLaneStart[s] as number] as Lane;
    const socket = s as SocketIndex;
    const dead = [causeOf('dead', 0.018, [lane]), causeOf('holds-line', 0.002, lineOf(lane))];
    parts.push(part(`chip:${label}`, dead, { kind: 'chip', socket }));
    parts.push(part(`position:${label}`, [causeOf('open', 0.004, [lane])], { kind: 'position', socket }));
  });
  const onBits = (...wanted: number[]) => lanes.filter((lane) => wanted.includes(index.bitOf(lane)));
  const inBank = (bank: number) => lanes.filter((lane) => index.bankOf(lane) === bank);
  for (let bit = 0; bit < bits; bit++)
    parts.push(part(`line:${bit}`, [causeOf('channel', 0.0015, onBits(bit))], shared));
  for (let bank = 0; bank < banks; bank++)
    parts.push(part(`bank:${bank}`, [causeOf('whole', 0.002, inBank(bank))], shared));
  for (let bit = 0; bit + 1 < bits; bit++) {
    const cause = causeOf('short', 0.0005, onBits(bit, bit + 1));
    parts.push(part(`short:${bit}`, [cause], { kind: 'short', socket: null }));
  }
  return { index, parts, lanes };
}

/** What the engine knows after one run, by one fault at a time. */
export function weighedOf(
  { index, parts }: { index: LayoutIndex; parts: Part[] },
  failing: readonly Lane[],
  passed: readonly Lane[],
): { weighed: Weighed; verdict: Verdict } {
  const weights = parts.map((each) =>
    each.causes.map((cause) =>
      cause.kinds.map((kind) => {
        const own = kind.scopes[0]?.lanes ?? [];
        let weight = kind.prior;
        for (const lane of failing) weight *= own.includes(lane) ? 1 - kind.miss : priors.leak;
        for (const lane of passed) if (own.includes(lane)) weight *= kind.miss;
        return weight;
      }),
    ),
  );
  const flat = weights.flat(2);
  const total = flat.reduce((a, b) => a + b, priors.leak ** failing.length);
  const kinds = weights.map((causes) => causes.map((each) => each.map((weight) => weight / total)));
  const run = { failing: new Set(failing), passed: new Set(passed), values: [] };
  const sumOf = (p: number) => (kinds[p] ?? []).flat().reduce((a, b) => a + b, 0);
  const places = index.document.sockets
    .map(({ label }, s) => {
      const chip = sumOf(2 * s);
      const contact = sumOf(2 * s + 1);
      return { socket: label, chip, contact, probability: chip + contact };
    })
    .sort((a, b) => b.probability - a.probability);
  const sharedSum = parts.reduce(
    (sum, each, p) => sum + (each.kind === 'shared-part' || each.kind === 'short' ? sumOf(p) : 0),
    0,
  );
  const outcome = (places[0]?.probability ?? 0) >= 0.5 ? 'place' : sharedSum >= 0.5 ? 'shared' : 'group';
  const findings = {
    index,
    parts,
    posterior: { kinds, logEvidence: 0, leftOut: 0, anyOf: () => 0 },
    runs: [run],
    everFailing: [run.failing],
    said: [],
  };
  const weighed = {
    findings,
    suspects: [],
    places,
    lastRun: 0,
    unreadable: false,
    interpretations: [{ runs: [run], takes: [] }],
    unexplained: [],
    rails: [],
    signs: [],
  };
  const verdict = { outcome, headline: '', sure: 'not sure', probability: null, groups: [], sockets: [] };
  return { weighed: weighed as unknown as Weighed, verdict: verdict as unknown as Verdict };
}
