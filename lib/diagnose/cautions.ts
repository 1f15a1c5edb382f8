import type { Caution, Diagnosis } from '@/shared';
import type { LayoutIndex } from '../layout/layout-index';

const texts = {
  'power-off': 'Power off, unplug and wait for the capacitors before you move a chip.',
  'negative-rail': 'Three-rail RAM: measure the negative rail at the socket first. It must never run without it.',
  'rail-at-pin': 'Compare the supply pins before you fit another type: a wrong rail at a pin destroys the chip.',
  soldered:
    'Soldered chips: measure and scope before you desolder. A lifted pad is a second fault. Lead: wash your hands, keep out of the fumes.',
  static: 'Static: touch ground before you touch a chip, and put it down on conductive foam.',
  many: 'Many lanes fail at once: measure every supply rail at a socket before any chip is pulled.',
  mains:
    'Mains and picture-tube voltages inside are for licensed practice. The service manual and local rules come first.',
} as const;

export type CautionId = keyof typeof texts;

/** The cautions that this answer owes, the most pressing first. They defer to the service manual and to local rules. */
export function cautionsFor(
  index: LayoutIndex,
  answer: { outcome: Diagnosis['outcome']; failing: number; sockets: readonly string[] },
): Caution[] {
  if (answer.outcome === 'no-evidence' || answer.outcome === 'not-shown') return [];
  const ids: CautionId[] = [];
  if (answer.failing >= 4 && answer.outcome !== 'place') ids.push('many');
  ids.push('power-off');
  const named = answer.sockets.flatMap((label) => index.socketByLabel.get(label) ?? []);
  const about = named.length > 0 ? named : index.document.sockets.map((_, at) => at);
  const families = about.map((socket) => index.familyOfSocket[socket]);
  if (families.some((family) => family?.pins.some((pin) => (pin.volts ?? 0) < 0)))
    ids.push('negative-rail', 'rail-at-pin');
  if (named.some((socket) => index.document.sockets[socket]?.soldered)) ids.push('soldered');
  ids.push('static', 'mains');
  return ids.map((id) => ({ id, text: texts[id] }));
}
