import type { ReportReading } from '@/lib';
import type { Evidence, LaneName, PlainEvidence, Run } from '@/shared';
import type { Bench } from '../bench';
import { doubtedFormat } from '../entry/doubts';
import { laneName } from '../marks';

/**
 * The runs with one answer to an open question taken for true: of a choice the way that it names, of a doubted code the
 * meaning that it gives, of readings the register. Null where the answer changes nothing that was entered.
 */
export function settle(bench: Bench, runs: readonly Run[], answer: string): Run[] | null {
  let changed = false;
  const next = runs.map((run) => ({
    ...run,
    evidence: run.evidence.map((seen): Evidence => {
      const settled = settleOne(bench, seen, answer);
      if (settled === null) return seen;
      changed = true;
      return settled;
    }),
  }));
  return changed ? next : null;
}

function settleOne(bench: Bench, seen: Evidence, answer: string): Evidence | null {
  switch (seen.kind) {
    case 'either':
      return chosenWay(seen.ways, answer);
    case 'code':
      return settleCode(bench, seen, answer);
    case 'readings': {
      const register = registerIn(bench, answer);
      if (register === null || seen.lines.every((line) => line.register !== undefined)) return null;
      return { ...seen, lines: seen.lines.map((line) => (line.register === undefined ? { ...line, register } : line)) };
    }
    default:
      return null;
  }
}

/** The way that the answer names; of two the one that says more of it. */
function chosenWay(ways: readonly { takes: string; evidence: PlainEvidence }[], answer: string): PlainEvidence | null {
  const named = ways.filter(({ takes }) => answer.includes(takes)).sort((a, b) => b.takes.length - a.takes.length);
  const [first, second] = named;
  return first === undefined || first.takes.length === second?.takes.length ? null : first.evidence;
}

function settleCode(bench: Bench, seen: Extract<Evidence, { kind: 'code' }>, answer: string): Evidence | null {
  const format = bench.formats.find(({ definition }) => definition.id === seen.format);
  if (format === undefined) return null;
  const { doubts = [], ...plain } = seen;
  const open = doubts.length === 0 ? format.compiled : doubtedFormat(format.definition, bench.index, doubts);
  const read = open?.read(seen.text);
  if (read === undefined || !read.ok || read.readings.length < 2) return null;
  const meant = read.readings.filter(({ takes }) => takes.length > 0 && takes.every((one) => answer.includes(one)));
  const [only] = meant;
  if (only === undefined || meant.length > 1) return null;
  const own = format.compiled.read(seen.text);
  if (doubts.length > 0 && own.ok && own.readings.length === 1 && same(own.readings[0], only)) return plain;
  // No code of this format says it another way, so that what it means is kept in its place.
  const name = ({ index }: Bench, lanes: ReportReading['passed']): LaneName[] =>
    lanes.map((lane) => laneName(index, lane));
  return {
    kind: 'lanes',
    failing: name(
      bench,
      only.failing.map(({ lane }) => lane),
    ),
    passed: name(bench, only.passed),
  };
}

const lanesOfReading = (reading: ReportReading | undefined) =>
  (reading?.failing ?? [])
    .map(({ lane }) => lane)
    .sort((a, b) => a - b)
    .join();

const same = (a: ReportReading | undefined, b: ReportReading) => lanesOfReading(a) === lanesOfReading(b);

/** The register value that an answer such as "page = 3" names, as the windows of the board have it. */
function registerIn({ document }: Bench, answer: string): { name: string; value: number } | null {
  const known = document.addressMap.windows.flatMap(({ register }) => (register === undefined ? [] : [register]));
  return known.find(({ name, value }) => ` ${answer},`.includes(` ${name} = ${value},`)) ?? null;
}
