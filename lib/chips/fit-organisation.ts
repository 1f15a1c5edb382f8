import type { ChipFamily } from '@/shared';
import type { Finding, FitNote } from './fit-types';

/** What the comparison of two organisations found. */
export interface OrganisationFit {
  readonly findings: readonly Finding[];
  readonly notes: readonly FitNote[];
}

/** A count of words as the trade writes it: 16384 is "16K", 1048576 "1M". */
export function wordsOfSize(words: number): string {
  if (words >= 2 ** 20 && words % 2 ** 20 === 0) return `${words / 2 ** 20}M`;
  return words >= 1024 && words % 1024 === 0 ? `${words / 1024}K` : String(words);
}

/** Pins of the package: the highest pin that is described, 0 where none is. */
export function packagePins(family: ChipFamily): number {
  return family.pins.reduce((most, { pin }) => Math.max(most, pin), 0);
}

const blocked = (words: string): Finding => ({ pin: null, severity: 'change', words, blocks: true });

function sizes(socket: ChipFamily, chip: ChipFamily): OrganisationFit {
  const findings: Finding[] = [];
  const notes: FitNote[] = [];
  if (chip.kind !== socket.kind)
    findings.push(
      blocked(
        chip.kind === 'dynamic'
          ? 'The chip is dynamic: it needs strobes and refresh, which a socket for static RAM does not give.'
          : 'The chip is static: it needs all its address pins at once, but the socket sends row and column in turn.',
      ),
    );
  if (chip.width !== socket.width)
    findings.push(
      blocked(
        `The chip has ${chip.width === 1 ? '1 data bit' : `${chip.width} data bits`}, the socket is wired for ${socket.width}.`,
      ),
    );
  if (chip.words < socket.words)
    findings.push(
      blocked(
        `The chip holds ${wordsOfSize(chip.words)} words, the socket needs ${wordsOfSize(socket.words)}; what lies above would repeat what lies below.`,
      ),
    );
  else if (chip.words > socket.words)
    notes.push({
      about: 'capacity',
      words: `Uses ${wordsOfSize(socket.words)} of the ${wordsOfSize(chip.words)} words of the chip, 1 in ${chip.words / socket.words}.`,
    });
  return { findings, notes };
}

/** Address inputs of the chip that the socket moves, by their number. */
function movedAddresses(socket: ChipFamily, chip: ChipFamily): ReadonlySet<number> {
  const moved = new Set(socket.pins.filter(({ does }) => does === 'address').map(({ pin }) => pin));
  return new Set(
    chip.pins.flatMap((pin, at) => (pin.does === 'address' && moved.has(pin.pin) ? [pin.index ?? at] : [])),
  );
}

const addressPins = (family: ChipFamily) => new Set(family.pins.flatMap((p) => (p.does === 'address' ? [p.pin] : [])));

function addresses(socket: ChipFamily, chip: ChipFamily): readonly Finding[] {
  const wants = addressPins(chip);
  const described = new Set(chip.pins.map(({ pin }) => pin));
  const lost = [...addressPins(socket)].filter((pin) => described.has(pin) && !wants.has(pin));
  if (lost.length === 0) return [];
  return [
    blocked(
      lost.length === 1
        ? `The address line at pin ${lost[0]} of the socket reaches no address pin of the chip.`
        : `The address lines at pins ${lost.join(', ')} of the socket reach no address pin of the chip.`,
    ),
  ];
}

/**
 * Bits of the word number that a dynamic chip takes over the moving lines, against those that the socket's family
 * takes: a chip with more words on as many lines looks at lines that the other ignores at column time.
 */
function columnLines(socket: ChipFamily, chip: ChipFamily): readonly Finding[] {
  if (chip.kind !== 'dynamic' || socket.kind !== 'dynamic') return [];
  const moved = movedAddresses(socket, chip).size;
  const more = Math.min(Math.log2(chip.words), 2 * moved) - Math.log2(socket.words);
  if (moved === 0 || more < 1) return [];
  const lines =
    more < 2 ? '1 address line that the socket ignores' : `${Math.floor(more)} address lines that the socket ignores`;
  return [
    {
      pin: null,
      severity: 'change',
      words: `At column time the chip also looks at ${lines}.`,
      change: 'See to it that those lines stand at the same level whenever the column strobe falls.',
    },
  ];
}

const everyMs = (ms: number) => `${Number(ms.toFixed(2))} ms`;

/**
 * Whether the refresh of the board reaches the rows of the chip in time. Address inputs that stand still leave half
 * of the rows unused each, and unused rows need no refresh.
 */
function refresh(socket: ChipFamily, chip: ChipFamily): OrganisationFit {
  const none = { findings: [], notes: [] };
  if (chip.kind !== 'dynamic' || socket.kind !== 'dynamic') return none;
  if (chip.rows === undefined || socket.rows === undefined) {
    if (chip.rows === socket.rows) return none;
    const words = 'The rows that a refresh must reach are not described for both: compare the data sheets.';
    return { findings: [], notes: [{ about: 'refresh', words }] };
  }
  const rowInputs = Math.ceil(Math.log2(chip.rows));
  const described = addressPins(chip).size > 0 && addressPins(socket).size > 0;
  const moved = movedAddresses(socket, chip);
  const still = described ? Array.from({ length: rowInputs }, (_, i) => i).filter((i) => !moved.has(i)).length : 0;
  const rows = Math.max(1, Math.ceil(chip.rows / 2 ** still));
  const notes: FitNote[] = [];
  const findings: Finding[] = [];
  if (rows < chip.rows)
    notes.push({
      about: 'refresh',
      words: `${rows} of its ${chip.rows} rows are used, so a refresh of ${rows} rows is enough.`,
    });
  if (rows > socket.rows)
    findings.push({
      pin: null,
      severity: 'change',
      words: `The chip has ${rows} rows to refresh, the board counts ${socket.rows}: the other rows forget what they hold.`,
      change: `Let the refresh counter of the board run over ${rows} rows.`,
    });
  else if (chip.refreshMs !== undefined && socket.refreshMs !== undefined) {
    const every = (socket.refreshMs * rows) / socket.rows;
    if (every > chip.refreshMs + 1e-9)
      findings.push({
        pin: null,
        severity: 'change',
        words: `The chip wants each row refreshed every ${everyMs(chip.refreshMs)}, the board takes ${everyMs(every)}.`,
        change: `Refresh faster: ${rows} rows in ${everyMs(chip.refreshMs)}.`,
      });
    else if (rows < socket.rows)
      notes.push({
        about: 'refresh',
        words: `The board counts ${socket.rows} rows in ${everyMs(socket.refreshMs)}, so it reaches each of the ${rows} rows of the chip every ${everyMs(every)}, if it spreads the refresh evenly.`,
      });
  }
  return { findings, notes };
}

/** Compares width, size, kind, address lines and refresh of a chip with what a socket is wired for. */
export function organisationFit(socket: ChipFamily, chip: ChipFamily): OrganisationFit {
  const size = sizes(socket, chip);
  const rows = refresh(socket, chip);
  const lines =
    packagePins(socket) === packagePins(chip) ? [...addresses(socket, chip), ...columnLines(socket, chip)] : [];
  return { findings: [...size.findings, ...lines, ...rows.findings], notes: [...size.notes, ...rows.notes] };
}
