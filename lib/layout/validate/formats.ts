import type { LayoutProblem, ReportFormat } from '@/shared';
import { type Lane, lane } from '../../brand';
import { type CompileResult, compileFormat } from '../../report/compile-format';
import type { CompiledFormat } from '../../report/meaning';
import { listWords } from '../words';
import { type Checked, error, warning } from './problem';

/** Lanes that are tried in all formats together. Beyond it each format is tried on the edges of every bank and bit. */
const mostTrials = 40_000;

function lanesToTry({ index, document }: Checked): Lane[] {
  const all = Array.from(index.lanes, lane);
  if (all.length * document.reportFormats.length <= mostTrials) return all;
  const lastBank = index.bankCount - 1;
  const lastBit = index.bitCount - 1;
  return all.filter((at) => {
    const [bank, bit] = [index.bankOf(at) as number, index.bitOf(at) as number];
    return bank === 0 || bank === lastBank || bit === 0 || bit === lastBit;
  });
}

interface Trial {
  readonly unsaid: readonly Lane[];
  /** Lanes whose text does not lead back to them. */
  readonly lost: readonly { readonly lane: Lane; readonly text: string; readonly reason: string }[];
  /** Lanes that one text stands for. */
  readonly alike: readonly { readonly text: string; readonly lanes: readonly Lane[] }[];
}

function tryLanes(format: CompiledFormat, lanes: readonly Lane[]): Trial {
  const unsaid: Lane[] = [];
  const lost: { lane: Lane; text: string; reason: string }[] = [];
  const byText = new Map<string, Lane[]>();
  for (const at of lanes) {
    const written = format.write([at]);
    if (!written.ok) {
      unsaid.push(at);
      continue;
    }
    const same = byText.get(written.text);
    if (same === undefined) byText.set(written.text, [at]);
    else same.push(at);
    const read = format.read(written.text);
    if (!read.ok) lost.push({ lane: at, text: written.text, reason: read.reason });
    else if (!read.readings.some(({ failing }) => failing.some((bad) => bad.lane === at))) {
      lost.push({ lane: at, text: written.text, reason: 'It is read as another lane.' });
    }
  }
  const alike = [...byText].filter(([, same]) => same.length > 1).map(([text, same]) => ({ text, lanes: same }));
  return { unsaid, lost, alike };
}

/** Whether the fields of a format name the bank and the bit of a lane between them. */
function namesWhole(format: ReportFormat, { index }: Checked): boolean {
  const has = (...fields: string[]) =>
    format.parts.some(
      (part) =>
        'field' in part &&
        (fields.includes(part.field) ||
          part.table.some((entry) => (fields.includes('bank') ? entry.bank !== undefined : entry.bits !== undefined))),
    );
  const bank = index.bankCount === 1 || format.bank !== undefined || has('bank', 'address', 'lane');
  return bank && has('bit', 'mask', 'read', 'lane', 'syndrome');
}

function alikeProblems(
  checked: Checked,
  format: ReportFormat,
  { trial, pointer }: { trial: Trial; pointer: string },
): LayoutProblem[] {
  const { index } = checked;
  const bySocket = format.parts.some((part) => 'field' in part && part.field === 'socket');
  const [first] = trial.alike;
  if (first === undefined || bySocket) return [];
  const shown = `"${first.text}" stands for ${listWords(
    first.lanes.map((at) => index.laneWords(at)),
    3,
  )}`;
  const others = trial.alike.length === 1 ? '' : ` ${trial.alike.length - 1} more texts do likewise.`;
  return namesWhole(format, checked)
    ? [
        error({
          pointer,
          code: 'format-alike',
          message: `${shown}.${others} Put fixed text between the fields, or say how many digits there are.`,
        }),
      ]
    : [warning({ pointer, code: 'format-vague', message: `${shown}, and nothing tells which.${others}` })];
}

function trialProblems(
  checked: Checked,
  format: ReportFormat,
  { compiled, pointer }: { compiled: CompiledFormat; pointer: string },
): LayoutProblem[] {
  const { index } = checked;
  const lanes = lanesToTry(checked);
  const trial = tryLanes(compiled, lanes);
  const problems = trial.lost.map(({ lane: at, text, reason }) =>
    error({
      pointer,
      code: 'format-not-back',
      message: `${index.laneWords(at)} would be shown as "${text}", which does not lead back to it. ${reason}`,
    }),
  );
  if (trial.unsaid.length > 0) {
    const all = trial.unsaid.length === lanes.length;
    const message = all
      ? 'This format cannot say any lane of the board.'
      : `This format cannot say ${listWords(trial.unsaid.map((at) => index.laneWords(at)))}. Is that so on the machine?`;
    problems.push((all ? error : warning)({ pointer, code: 'format-cannot-say', message }));
  }
  return [...problems, ...alikeProblems(checked, format, { trial, pointer })];
}

function orderProblems({ index }: Checked, format: ReportFormat, pointer: string): LayoutProblem[] {
  const banks = format.testOrder?.banks ?? [];
  return banks.flatMap((id, n) =>
    index.bankByName.has(id)
      ? []
      : [
          error({
            pointer: `${pointer}/testOrder/banks/${n}`,
            code: 'unknown-bank',
            message: `There is no bank "${id}".`,
          }),
        ],
  );
}

/** Formats that do not compile, that cannot say a lane, or say two lanes alike. */
export function checkFormats(checked: Checked, compiled: readonly CompileResult[]): LayoutProblem[] {
  const { reportFormats } = checked.document;
  if (reportFormats.length === 0) {
    return [
      warning({
        pointer: '/reportFormats',
        code: 'no-formats',
        message: 'No report format is described, so no code can be typed. Add how the machine words a failure.',
      }),
    ];
  }
  return reportFormats.flatMap((format, at) => {
    const pointer = `/reportFormats/${at}`;
    const result = compiled[at]!;
    const own = result.ok
      ? trialProblems(checked, format, { compiled: result.format, pointer })
      : result.reasons.map((reason) =>
          error({ pointer: pointer + reason.pointer, code: reason.code, message: reason.message }),
        );
    return [...own, ...orderProblems(checked, format, pointer)];
  });
}

/** Compiles every format of a layout once, for all checks that need them. */
export function compileFormats({ document, index }: Checked): CompileResult[] {
  return document.reportFormats.map((format) => compileFormat(format, index));
}
