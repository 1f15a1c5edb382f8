import type { ChipFamily } from '@/shared';
import { organisationFit, packagePins } from './fit-organisation';
import { pinFinding } from './fit-pin';
import { type ChipPin, type Given, givenAt, wantedVolts } from './fit-supply';
import type { Finding, FitCheck, FitNote, FitPin, FitReason, FitVerdict, RailAtPins } from './fit-types';

const weight = { destroys: 0, change: 1, harmless: 2 } as const;

/** The rails of a layout that reach a socket, as the fit check takes them. */
export function railsAtSocket<Rail extends RailAtPins & { readonly sockets?: readonly string[] | undefined }>(
  rails: readonly Rail[],
  socket: string,
): Rail[] {
  return rails.filter(({ sockets }) => sockets === undefined || sockets.includes(socket));
}

function givenWords(given: Given): string {
  if (given.kind === 'nothing') return 'nothing';
  return given.kind === 'unknown' ? 'not described' : given.name;
}

function comparePins(socket: ChipFamily, chip: ChipFamily, rails: readonly RailAtPins[]) {
  const socketPins = new Map(socket.pins.map((pin) => [pin.pin, pin]));
  const railAt = (n: number) => rails.find(({ pins }) => pins.includes(n));
  const given = (n: number): Given => givenAt(socketPins.get(n), railAt(n));
  const last = packagePins(socket);
  const chipPins = new Map<number, ChipPin>(chip.pins.map((pin) => [pin.pin, pin]));
  const powered = Array.from({ length: last }, (_, i) => given(i + 1)).some(
    (has) => has.kind === 'volts' && (has.volts ?? 0) > 0,
  );
  const findings: Finding[] = [];
  const pins: FitPin[] = [];
  for (let n = 1; n <= last; n++) {
    const pin = chipPins.get(n);
    const has = given(n);
    if (pin === undefined) {
      if (has.kind !== 'unknown' && socket.id !== chip.id) findings.push(undescribedPin(n));
      continue;
    }
    const whereIs = (volts: number) => nearest(n, last, (at) => supplies(given(at), volts));
    const finding = pinFinding({ pin, given: has, chip, whereIs, powered });
    if (finding !== null) findings.push(finding);
    pins.push({ pin: n, socket: givenWords(has), chip: pin.name, severity: finding?.severity ?? 'same' });
  }
  return { findings, pins };
}

const undescribedPin = (pin: number): Finding => ({
  pin,
  severity: 'change',
  words: `Pin ${pin} of the chip is not described, so nobody can tell whether it agrees.`,
  change: `Compare pin ${pin} with the data sheet and the drawing of the board.`,
});

const supplies = (given: Given, volts: number) => given.kind === 'volts' && given.volts === volts;

function nearest(from: number, last: number, has: (pin: number) => boolean): number | null {
  const pins = Array.from({ length: last }, (_, i) => i + 1).filter((n) => n !== from && has(n));
  return pins.reduce<number | null>(
    (best, n) => (best === null || Math.abs(n - from) < Math.abs(best - from) ? n : best),
    null,
  );
}

function findingsOf(socket: ChipFamily, chip: ChipFamily, rails: readonly RailAtPins[]) {
  const described = [packagePins(socket), packagePins(chip)] as const;
  if (described[0] === 0 || described[1] === 0) {
    if (socket.id === chip.id) return { findings: [], pins: [] };
    const finding: Finding = {
      pin: null,
      severity: 'change',
      words: 'The pins of one of the two are not described, so nobody can tell whether they agree.',
      change: 'Compare every pin with the data sheets before you fit it.',
    };
    return { findings: [finding], pins: [] };
  }
  if (described[0] === described[1]) return comparePins(socket, chip, rails);
  const words = `The chip has ${described[1]} pins, the socket ${described[0]}.`;
  return { findings: [{ pin: null, severity: 'change', words, blocks: true } satisfies Finding], pins: [] };
}

function headlineOf(verdict: FitVerdict, reasons: readonly FitReason[]): string {
  const first = reasons[0]?.words ?? '';
  switch (verdict) {
    case 'fits':
      return 'Fits as it is.';
    case 'destroyed':
      return `Would be destroyed. ${first}`;
    case 'does-not-fit':
      return `Does not fit. ${first}`;
    case 'fits-after-changes':
      return `Fits after changes. ${first}`;
  }
}

function supplyNotes(socket: ChipFamily, chip: ChipFamily): FitNote[] {
  const volts = (family: ChipFamily) =>
    [...new Set(family.pins.map(wantedVolts).filter((value) => value !== null && value !== 0))].sort().join();
  if (volts(socket) === volts(chip)) return [];
  const words =
    'Change the wiring of this socket only, or of the whole row with all its chips: never mix parts of other supplies on the same changed pins.';
  return [{ about: 'supply', words }];
}

const speedNote: FitNote = {
  about: 'speed',
  words: 'Take the same speed grade or a faster one; a slower chip may fail warm or at a low supply.',
};

/**
 * Whether a chip of one family may go into a socket wired for another, pin by pin, with what would have to be
 * changed. A family always fits a socket of its own. `rails` are the supplies that the layout states at pins of the
 * socket, in volts; they count before what the family of the socket wants there. Where the pins of a family are not
 * described, or only in part, that stands among the reasons.
 */
export function fitCheck(socketFamily: ChipFamily, fitted: ChipFamily, rails: readonly RailAtPins[] = []): FitCheck {
  const byPin = findingsOf(socketFamily, fitted, rails);
  const organisation = organisationFit(socketFamily, fitted);
  const findings = [...byPin.findings, ...organisation.findings].sort(
    (a, b) =>
      weight[a.severity] - weight[b.severity] ||
      Number(b.blocks ?? false) - Number(a.blocks ?? false) ||
      (a.pin ?? 0) - (b.pin ?? 0),
  );
  const changes = findings.flatMap(({ change }) => change ?? []);
  const destroys = findings.some(({ severity }) => severity === 'destroys');
  const blocked = findings.some(({ blocks }) => blocks === true);
  const verdict = destroys
    ? 'destroyed'
    : blocked
      ? 'does-not-fit'
      : findings.some(({ severity }) => severity === 'change')
        ? 'fits-after-changes'
        : 'fits';
  const reasons = findings.map(({ pin, words, severity }): FitReason => ({ pin, words, severity }));
  const fitsSomehow = !blocked;
  return {
    verdict,
    headline: headlineOf(verdict, reasons),
    reasons,
    changes: fitsSomehow ? changes : [],
    fitsAfterChanges: fitsSomehow,
    notes: [...organisation.notes, ...(fitsSomehow ? supplyNotes(socketFamily, fitted) : []), speedNote],
    pins: byPin.pins,
  };
}
