import type { ChipFamily } from '@/shared';
import { type ChipPin, type Given, bearsAsSignal, voltsWords, wantedVolts, withinTolerance } from './fit-supply';
import type { Finding } from './fit-types';

/** What the rules for one pin look at. */
export interface PinContext {
  readonly pin: ChipPin;
  readonly given: Given;
  readonly chip: ChipFamily;
  /** A pin of the socket that has this supply, the nearest in number; null where none has. */
  readonly whereIs: (volts: number) => number | null;
  /** A supply of the socket is described. */
  readonly powered: boolean;
}

type Found = Omit<Finding, 'pin'> | null;

const gives = (given: Given): string =>
  given.kind === 'nothing' ? 'nothing' : given.kind === 'unknown' ? 'an unknown signal' : given.name;

const undescribed = (n: number): Found => ({
  severity: 'change',
  words: `Pin ${n} is not described on both sides, so nobody can tell whether it agrees.`,
  change: `Compare pin ${n} with the data sheet and the drawing of the board.`,
});

/** How to bring a supply to a pin, or that the socket has it nowhere. */
function feed({ pin, given, whereIs }: PinContext, volts: number): Pick<Finding, 'change' | 'blocks'> {
  const from = whereIs(volts);
  if (from === null) return { blocks: true };
  const off = given.kind === 'nothing' ? '' : `isolate it from ${gives(given)} and `;
  return { change: `Pin ${pin.pin}: ${off}join it to pin ${from}, which has ${voltsWords(volts)}.` };
}

/** Where the highest supply of the chip is nowhere in the socket, its negative one is not behind a pin left out either. */
function unknownSupply({ pin, chip, whereIs, powered }: PinContext, wanted: number | null): Found {
  const highest = Math.max(...chip.pins.map((one) => wantedVolts(one) ?? 0));
  if (wanted === null || wanted >= 0 || !powered || whereIs(highest) !== null) return undescribed(pin.pin);
  return {
    severity: 'destroys',
    words: `Pin ${pin.pin} wants ${voltsWords(wanted)}, and the chip never bears to run without its negative supply; the socket has neither that nor ${voltsWords(highest)}.`,
    blocks: true,
  };
}

function supplyPin(context: PinContext): Found {
  const { pin, given } = context;
  const wanted = wantedVolts(pin);
  if (given.kind === 'unknown') return unknownSupply(context, wanted);
  if (given.kind === 'volts' && wanted === null && given.volts === null) return null;
  if (wanted === null || (given.kind === 'volts' && given.volts === null)) return undescribed(pin.pin);
  const has = given.kind === 'volts' ? given.volts! : null;
  if (has !== null && withinTolerance(pin, has)) return null;
  const wants = `the chip wants ${voltsWords(wanted)} there`;
  const mend = feed(context, wanted);
  const nowhere = mend.blocks === true ? ` The socket has ${voltsWords(wanted)} at no pin.` : '';
  const at = `Pin ${pin.pin} has ${gives(given)}; ${wants}`;
  if (wanted < 0 && (has === null || has > wanted * 0.5)) {
    const words = `${at}, and never bears to run without its negative supply.${nowhere}`;
    return { severity: 'destroys', words, ...mend };
  }
  const tooMuch = has !== null && (wanted === 0 ? true : has * wanted < 0 || Math.abs(has) > Math.abs(wanted));
  if (tooMuch) return { severity: 'destroys', words: `${at}.${nowhere}`, ...mend };
  return { severity: 'change', words: `${at} and does not work without.${nowhere}`, ...mend };
}

function unusedPin({ pin, given, chip }: PinContext): Found {
  const n = pin.pin;
  if (given.kind !== 'volts' || given.volts === null) return null;
  if (bearsAsSignal(chip, given.volts)) return null;
  return {
    severity: 'change',
    words: `Pin ${n} has ${given.name}. The chip leaves that pin free, but some makers use it inside.`,
    change: `Pin ${n}: isolate it from ${given.name}.`,
  };
}

function dataPin({ pin, given }: PinContext): Found {
  const n = pin.pin;
  if (given.kind === 'unknown') return undescribed(n);
  if (given.kind === 'volts')
    return {
      severity: 'destroys',
      words: `Pin ${n} has ${given.name}; the chip drives its data output ${pin.name} against it.`,
      blocks: true,
    };
  if (given.kind === 'nothing')
    return { severity: 'change', words: `Pin ${n} is the data pin ${pin.name}; nothing leads there.`, blocks: true };
  if (given.does !== pin.does)
    return {
      severity: 'change',
      words: `Pin ${n} has ${given.name}; the chip drives its data output ${pin.name} against it.`,
      blocks: true,
    };
  if (given.index === (pin.index ?? null)) return null;
  return {
    severity: 'harmless',
    words: `Pin ${n} is ${given.name} of the socket and ${pin.name} of the chip: what is written comes back the same.`,
  };
}

/** Inputs that may be held at a fixed level without loss, and at which. */
function heldLevel(pin: ChipPin): 'any' | 'low' | 'high' | null {
  if (pin.does === 'address') return 'any';
  if (pin.does === 'output-enable') return 'low';
  return pin.does === 'refresh' ? 'high' : null;
}

function heldInput({ pin, given, chip, whereIs }: PinContext): Found {
  if (given.kind !== 'volts' || given.volts === null) return null;
  const n = pin.pin;
  if (!bearsAsSignal(chip, given.volts))
    return {
      severity: 'destroys',
      words: `Pin ${n} has ${given.name}; the chip has its input ${pin.name} there.`,
      ...(heldLevel(pin) === null
        ? { blocks: true }
        : { change: `Pin ${n}: isolate it from ${given.name} and ${tie(pin, whereIs)}.` }),
    };
  const level = given.volts > 1 ? 'high' : 'low';
  const may = heldLevel(pin);
  const words = `${given.name} at pin ${n} holds ${pin.name} ${level}`;
  if (may === 'any') return { severity: 'harmless', words: `${words}, so the chip is used in part.` };
  if (may === level) return { severity: 'harmless', words: `${words}, as it may be.` };
  if (may === null) return { severity: 'change', words: `${words}, but the chip needs that signal.`, blocks: true };
  return {
    severity: 'change',
    words: `${words}, which stops the chip.`,
    change: `Pin ${n}: isolate it from ${given.name} and ${tie(pin, whereIs)}.`,
  };
}

function tie(pin: ChipPin, whereIs: PinContext['whereIs']): string {
  const volts = heldLevel(pin) === 'high' ? 5 : 0;
  const from = whereIs(volts);
  return `tie ${pin.name} to ${voltsWords(volts)}${from === null ? '' : ` (pin ${from})`}`;
}

function inputPin(context: PinContext): Found {
  const { pin, given, whereIs } = context;
  const n = pin.pin;
  if (given.kind === 'unknown' || (given.kind === 'volts' && given.volts === null)) return undescribed(n);
  if (given.kind === 'volts') return heldInput(context);
  const tieable = heldLevel(pin) !== null;
  if (given.kind === 'nothing') {
    const words = `Pin ${n} is the chip's input ${pin.name}; nothing leads there.`;
    return tieable
      ? { severity: 'change', words, change: `Pin ${n}: ${tie(pin, whereIs)}.` }
      : { severity: 'change', words, blocks: true };
  }
  if (given.does !== pin.does) {
    const words = `Pin ${n} has ${given.name}; the chip has ${pin.name} there.`;
    return tieable
      ? { severity: 'change', words, change: `Pin ${n}: isolate it from ${given.name} and ${tie(pin, whereIs)}.` }
      : { severity: 'change', words, blocks: true };
  }
  if (given.name.startsWith('/') !== pin.name.startsWith('/'))
    return {
      severity: 'change',
      words: `Pin ${n} has ${given.name}; the chip's ${pin.name} acts at the other level.`,
      blocks: true,
    };
  if (given.index === (pin.index ?? null)) return null;
  return {
    severity: 'harmless',
    words: `Pin ${n} is ${given.name} of the socket and ${pin.name} of the chip: the words lie elsewhere inside it.`,
  };
}

/** What one pin of a chip meets in the socket: a difference with its weight, or null where they agree. */
export function pinFinding(context: PinContext): Finding | null {
  const { pin } = context;
  const found = rule(context);
  return found === null ? null : { pin: pin.pin, ...found };
}

function rule(context: PinContext): Found {
  switch (context.pin.does) {
    case 'supply':
    case 'ground':
      return supplyPin(context);
    case 'none':
      return unusedPin(context);
    case 'data':
    case 'data-out':
      return dataPin(context);
    case 'address':
    case 'data-in':
    case 'row-strobe':
    case 'column-strobe':
    case 'write-enable':
    case 'chip-select':
    case 'output-enable':
    case 'refresh':
      return inputPin(context);
  }
}
