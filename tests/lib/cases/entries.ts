import type { Change, Reading, RunInput } from '@/shared';

type EvidenceInput = NonNullable<RunInput['evidence']>[number];
type ReadingsInput = Extract<EvidenceInput, { kind: 'readings' }>;
type Line = ReadingsInput['lines'][number];

/** A word that was written and read back. */
export const line = (address: number, written: number, read: number): Line => ({ address, written, read });

/** The same at every address of a run of them. */
export const span = (
  range: { from: number; to: number; step?: Reading['step'] },
  written: number,
  read: number,
): Line => ({
  address: range.from,
  to: range.to,
  ...(range.step === undefined ? {} : { step: range.step }),
  written,
  read,
});

/** Readings as one piece of evidence; nothing is known of the rest of the memory unless said. */
export const readings = (
  lines: readonly Line[],
  how: Partial<Omit<ReadingsInput, 'kind' | 'lines'>> = {},
): EvidenceInput => ({
  kind: 'readings',
  lines: [...lines],
  ...how,
});

/** The whole memory was tested, and only these lines failed. */
export const allThatFailed = (lines: readonly Line[]): EvidenceInput => readings(lines, { rest: 'passed' });

export const code = (format: string, text: string): EvidenceInput => ({ kind: 'code', format, text });

export const volts = (socket: string, pin: number, measured: number): EvidenceInput => ({
  kind: 'measurement',
  socket,
  pin,
  volts: measured,
});

/** One run with what was seen in it. */
export const seen = (...evidence: EvidenceInput[]): RunInput => ({ evidence });

/** One run with what was done before it. */
export const after = (changes: Change | readonly Change[], ...evidence: EvidenceInput[]): RunInput => ({
  changes: 'kind' in changes ? [changes] : [...changes],
  evidence,
});

export const swap = (one: string, other: string): Change => ({ kind: 'swap', sockets: [one, other] });

/** Lanes that failed, all others of the board tested and passed. */
export const onlyLanes = (...failing: { bank: string; bit: number }[]): EvidenceInput => ({
  kind: 'lanes',
  failing,
  passed: 'rest',
});
