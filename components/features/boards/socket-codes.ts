import type { Bench, BenchFormat } from '@/components/features/diagnose/bench';
import { lanesOf } from '@/components/features/diagnose/marks';
import type { Lane } from '@/lib';

/** What one report format says when the chip of a socket has failed. */
export interface SocketCodes {
  readonly id: string;
  readonly name: string;
  /** The codes, the one for the whole chip alone where the format has one. */
  readonly texts: readonly string[];
  /** The code is one of many: the machine shows the address of whichever word failed. */
  readonly oneOfMany: boolean;
  /** Why there is none. */
  readonly reason: string | null;
}

/** Whether a format shows an address, so that a lane has a code for each of its words. */
export const showsAddress = ({ definition }: BenchFormat): boolean =>
  definition.parts.some((part) => 'field' in part && part.field === 'address');

/** The codes that a dead chip in a socket would cause, one entry a format. */
export function codesOfSocket({ index, formats }: Bench, socket: number): SocketCodes[] {
  const lanes = lanesOf(index, socket);
  return formats.map((format) => {
    const common = { id: format.definition.id, name: format.definition.name, oneOfMany: showsAddress(format) };
    return { ...common, ...codesOfLanes(format, lanes) };
  });
}

function codesOfLanes({ compiled }: BenchFormat, lanes: readonly Lane[]): Pick<SocketCodes, 'texts' | 'reason'> {
  const whole = compiled.write(lanes);
  if (whole.ok) return { texts: [whole.text], reason: null };
  const single = lanes.map((lane) => compiled.write([lane]));
  const texts = [...new Set(single.flatMap((written) => (written.ok ? [written.text] : [])))];
  return { texts, reason: texts.length === 0 ? whole.reason : null };
}
