import type { ChipFamily, Held, LayoutProblem, Socket } from '@/shared';
import { builtInFamilies } from '../../chips/families';
import { listWords } from '../words';
import { type Checked, error, repeats, warning } from './problem';

function heldLength({ document, index }: Checked, held: Held): number | null {
  const bank = index.bankByName.get(held.bank);
  if (bank === undefined) return null;
  return held.words === undefined ? document.memory.banks[bank]!.words : held.words.to - held.words.from + 1;
}

/** Words inside the chip that one data pin stands for twice. */
function pinTwice(
  spans: readonly { pin: number; from: number; to: number; at: number }[],
  label: string,
  pointer: string,
): LayoutProblem[] {
  const sorted = [...spans].sort((a, b) => a.pin - b.pin || a.from - b.from);
  return sorted.flatMap((span, n) => {
    const before = sorted[n - 1];
    if (before === undefined || before.pin !== span.pin || before.to < span.from) return [];
    const message = `Data pin ${span.pin} of ${label} stands for two things in the same words of the chip (lines ${before.at + 1} and ${span.at + 1}). Give them different pins, or let one begin further on with "at".`;
    return [error({ pointer: `${pointer}/${span.at}`, code: 'pin-twice', message })];
  });
}

function socketProblems(checked: Checked, socket: Socket, at: number): LayoutProblem[] {
  const family = checked.index.familyOfSocket[at]!;
  const pointer = `/sockets/${at}/holds`;
  const spans = socket.holds.flatMap((held, n) => {
    const length = heldLength(checked, held);
    return length === null ? [] : [{ pin: held.pin, from: held.at, to: held.at + length - 1, at: n }];
  });
  const problems = pinTwice(spans, socket.label, pointer);
  if (family === null) return problems;
  for (const { pin, to, at: n } of spans) {
    if (pin >= family.width) {
      const message = `${socket.label} has a chip of ${family.width} ${family.width === 1 ? 'bit' : 'bits'}, so there is no data pin ${pin}; pins count from 0.`;
      problems.push(error({ pointer: `${pointer}/${n}/pin`, code: 'family-width', message }));
    }
    if (to >= family.words) {
      const message = `${socket.label} is to hold ${to + 1} words, but ${family.name} has ${family.words}. Choose a larger family, or a smaller range of words.`;
      problems.push(error({ pointer: `${pointer}/${n}`, code: 'family-size', message }));
    }
  }
  return problems;
}

/** Chips of which a part is never used: allowed, as such boards exist, but worth a look. */
function halfUsed(checked: Checked): LayoutProblem[] {
  const { document, index } = checked;
  const byFamily = new Map<string, { family: ChipFamily; sockets: string[]; used: number; first: number }>();
  document.sockets.forEach((socket, at) => {
    const family = index.familyOfSocket[at];
    const lengths = socket.holds.map((held) => held.at + (heldLength(checked, held) ?? 0));
    const used = Math.max(...lengths);
    if (family === null || family === undefined || used >= family.words) return;
    const key = `${family.id} ${used}`;
    const before = byFamily.get(key) ?? { family, sockets: [], used, first: at };
    byFamily.set(key, { ...before, sockets: [...before.sockets, socket.label] });
  });
  return [...byFamily.values()].map(({ family, sockets, used, first }) =>
    warning({
      pointer: `/sockets/${first}/family`,
      code: 'family-half-used',
      message: `Only ${used} of the ${family.words} words of a ${family.name} are used in ${listWords(sockets)}. Is the family right?`,
    }),
  );
}

function unknownFamilies({ document, index }: Checked): LayoutProblem[] {
  const known = [...document.families, ...builtInFamilies].map(({ id }) => id);
  return document.sockets.flatMap((socket, at) =>
    index.familyOfSocket[at] !== null
      ? []
      : [
          error({
            pointer: `/sockets/${at}/family`,
            code: 'unknown-family',
            message: `Nobody knows the chip family "${socket.family}". Describe it under "families", or use one of ${listWords(known, 20)}.`,
          }),
        ],
  );
}

function familyPins({ document }: Checked): LayoutProblem[] {
  return document.families.flatMap((family, at) =>
    repeats(family.pins.map(({ pin }) => pin)).map(({ at: n, item }) =>
      error({
        pointer: `/families/${at}/pins/${n}`,
        code: 'family-pin-twice',
        message: `Pin ${item} of ${family.name} is described twice.`,
      }),
    ),
  );
}

/** Chips that are too small, too narrow or unknown for what their sockets hold. */
export function checkChips(checked: Checked): LayoutProblem[] {
  return [
    ...unknownFamilies(checked),
    ...familyPins(checked),
    ...checked.document.sockets.flatMap((socket, at) => socketProblems(checked, socket, at)),
    ...halfUsed(checked),
  ];
}
