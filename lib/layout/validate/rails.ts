import type { ChipFamily, LayoutDocument, LayoutProblem } from '@/shared';
import { listWords } from '../words';
import { type Checked, error, warning } from './problem';

type Rail = LayoutDocument['rails'][number];

interface Group {
  readonly family: ChipFamily;
  readonly sockets: readonly string[];
}

const voltWords = (volts: number) => `${volts > 0 ? '+' : volts < 0 ? '−' : ''}${Math.abs(volts)} V`;

/** The families of the sockets that a rail reaches, each once with its sockets. */
function groupsOf({ document, index }: Checked, rail: Pick<Rail, 'sockets'>): Group[] {
  const wanted = rail.sockets === undefined ? null : new Set(rail.sockets);
  const groups = new Map<string, { family: ChipFamily; sockets: string[] }>();
  document.sockets.forEach(({ label }, at) => {
    const family = index.familyOfSocket[at];
    if (family === null || family === undefined || (wanted !== null && !wanted.has(label))) return;
    const group = groups.get(family.id);
    if (group === undefined) groups.set(family.id, { family, sockets: [label] });
    else group.sockets.push(label);
  });
  return [...groups.values()];
}

function pinProblem(rail: Rail, pin: number, { family, sockets }: Group): string | null {
  const known = family.pins.find((candidate) => candidate.pin === pin);
  const where = listWords(sockets, 3);
  if (known === undefined) return `${family.name} (${where}) has no pin ${pin}.`;
  if (known.does !== 'supply' && known.does !== 'ground') {
    return `Pin ${pin} of ${family.name} (${where}) is ${known.name}, which is no supply: ${voltWords(rail.volts)} there would destroy it.`;
  }
  if (known.volts === undefined || Math.abs(known.volts - rail.volts) <= 0.5) return null;
  return `Pin ${pin} of ${family.name} (${where}) wants ${voltWords(known.volts)}, and the rail ${rail.name} gives ${voltWords(rail.volts)}.`;
}

function references({ document, index }: Checked, rail: Rail, at: number): LayoutProblem[] {
  const problems = (rail.sockets ?? []).flatMap((label, n) =>
    index.socketByLabel.has(label)
      ? []
      : [
          error({
            pointer: `/rails/${at}/sockets/${n}`,
            code: 'unknown-socket',
            message: `There is no socket ${label}.`,
          }),
        ],
  );
  if (rail.sharedPart !== undefined && !document.sharedParts.some(({ label }) => label === rail.sharedPart)) {
    problems.push(
      error({
        pointer: `/rails/${at}/sharedPart`,
        code: 'unknown-shared-part',
        message: `There is no shared part ${rail.sharedPart}.`,
      }),
    );
  }
  return problems;
}

/** Supply pins that no rail feeds, where the layout describes rails at all. */
function unfed(checked: Checked): LayoutProblem[] {
  const { document } = checked;
  if (document.rails.length === 0) return [];
  return groupsOf(checked, {}).flatMap(({ family, sockets }) => {
    const reached = document.rails.filter(
      (rail) => rail.sockets === undefined || sockets.every((label) => rail.sockets!.includes(label)),
    );
    const fed = new Set(reached.flatMap(({ pins }) => pins));
    return family.pins
      .filter(({ does, pin }) => does === 'supply' && !fed.has(pin))
      .map(({ pin, name }) =>
        warning({
          pointer: '/rails',
          code: 'supply-without-rail',
          message: `No rail reaches pin ${pin} (${name}) of ${listWords(sockets, 3)}, a ${family.name}. Add the rail, so that it can be measured.`,
        }),
      );
  });
}

/** Supplies that do not fit the chips in the sockets. */
export function checkRails(checked: Checked): LayoutProblem[] {
  const each = checked.document.rails.flatMap((rail, at) => [
    ...references(checked, rail, at),
    ...groupsOf(checked, rail).flatMap((group) =>
      group.family.pins.length === 0
        ? []
        : rail.pins.flatMap((pin, n) => {
            const message = pinProblem(rail, pin, group);
            return message === null
              ? []
              : [error({ pointer: `/rails/${at}/pins/${n}`, code: 'family-supply', message })];
          }),
    ),
  ]);
  return [...each, ...unfed(checked)];
}
