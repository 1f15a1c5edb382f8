import type { ChipFamily } from '@/shared';
import type { SocketIndex } from '../../brand';
import type { LayoutIndex } from '../../layout/layout-index';
import { servedLanes } from '../../layout/served-lanes';
import { listWords, numbersWords } from '../../layout/words';
import { labelOf } from '../timeline';
import { lanesOfSocket } from './moved-lanes';
import { onSameLine, partnersFor } from './partners';
import type { Beliefs } from './states';

/**
 * Where to put the two tips of the meter for each leg of a chip: data pins from the chip on the same data line,
 * all others from the neighbour that shares its strobe. Always to the leg, or the contact is left out.
 */
export function continuityWords(beliefs: Beliefs, socket: SocketIndex): string {
  const { index } = beliefs.findings;
  const here = labelOf(index, socket);
  const line = onSameLine(beliefs, socket);
  const beside = partnersFor(beliefs, socket).beside;
  const family = index.familyOfSocket[socket] ?? null;
  const pins = family ? pinsOf(family) : null;
  const to = `to the leg of the chip in ${here}`;
  const neighbour = beside === null ? 'the chip beside it' : labelOf(index, beside);
  if (!pins) {
    const data =
      line === null ? `The data pins ${leadWords(index, socket)}` : `The data pins: from ${labelOf(index, line)}`;
    return `Power off, measure from each pin of ${neighbour} ${to}, the same pin. ${data}.`;
  }
  const [first, ...others] = pins.data;
  if (line === null) {
    const data = `Data ${pinsWords(pins.data)} ${leadWords(index, socket)}`;
    return `Power off, measure from ${neighbour} ${to}, ${pinsWords(pins.rest)}. ${data}.`;
  }
  const same = others.length > 0 ? ` Then ${pinsWords(others)} the same way,` : ' Then';
  const rest = `${pinsWords(pins.rest)} from ${neighbour}`;
  return `Power off, measure from ${pinWords(first)} of ${labelOf(index, line)} ${to}, ${pinWords(first)}.${same} ${others.length > 0 ? 'and ' : ''}${rest}.`;
}

interface Pins {
  /** The output first: without it nothing is read. */
  readonly data: readonly number[];
  readonly rest: readonly number[];
}

function pinsOf(family: ChipFamily): Pins | null {
  const which = (wanted: readonly string[]) =>
    family.pins.filter(({ does }) => wanted.includes(does)).map(({ pin }) => pin);
  const data = [...which(['data-out', 'data']), ...which(['data-in'])];
  const rest = which(['address', 'row-strobe', 'column-strobe', 'write-enable', 'chip-select', 'output-enable']);
  return data.length === 0 || rest.length === 0 ? null : { data, rest: rest.sort((a, b) => a - b) };
}

const pinWords = (pin: number | undefined) => `pin ${pin ?? '?'}`;

function pinsWords(pins: readonly number[]): string {
  return pins.length === 1 ? pinWords(pins[0]) : `pins ${numbersWords([...pins].sort((a, b) => a - b))}`;
}

/** "lead to U30", by what the layout lists for the line. */
function leadWords(index: LayoutIndex, socket: SocketIndex): string {
  const own = lanesOfSocket(index, socket);
  const buffers = index.document.sharedParts.filter(({ role }) => role === 'data-buffer' || role === 'shift-register');
  const serving = buffers.filter((part) => servedLanes(index, part).some((lane) => own.includes(lane)));
  const labels = serving.map(({ label }) => label);
  return labels.length === 0 ? 'lead elsewhere, to what drives the line' : `lead to ${listWords(labels, 3)}`;
}

/** "-5 V at pin 1, +12 V at pin 8 and +5 V at pin 9", null where the layout and the family say nothing. */
export function railsWords(index: LayoutIndex, socket: SocketIndex): string | null {
  const label = labelOf(index, socket);
  const listed = index.document.rails.filter(({ sockets }) => !sockets || sockets.includes(label));
  const rails =
    listed.length > 0
      ? listed.map(({ name, volts, pins }) => ({ name, volts, pin: pins[0] ?? 0 }))
      : (index.familyOfSocket[socket]?.pins ?? []).flatMap(({ does, name, volts, pin }) =>
          does === 'supply' && volts !== undefined ? [{ name, volts, pin }] : [],
        );
  if (rails.length === 0) return null;
  // The lowest first: it is the one whose loss destroys chips.
  rails.sort((a, b) => a.volts - b.volts || a.pin - b.pin);
  return listWords(rails.map(({ name, pin }) => `${name} at pin ${pin}`));
}
