import type { Evidence, LaneName } from '@/shared';
import type { Bench } from '../bench';
import { laneName, lanesOf } from '../marks';
import { readLink, writeLink } from '../link/workspace-link';

/** Evidence that names failing bits outright. */
export type LanesEvidence = Extract<Evidence, { kind: 'lanes' }>;

/** No failing bits yet. What is not marked passed, until somebody says otherwise. */
export const noBits: LanesEvidence = { kind: 'lanes', failing: [], passed: 'rest' };

const same = (a: LaneName, b: LaneName) => a.bank === b.bank && a.bit === b.bit;

/** Marks a bit as failing, or takes the mark away. */
export function toggleBit(bits: LanesEvidence, lane: LaneName): LanesEvidence {
  const rest = bits.failing.filter((other) => !same(other, lane));
  return { ...bits, failing: rest.length < bits.failing.length ? rest : [...bits.failing, lane] };
}

/** Whether a bit is marked. */
export const isMarked = ({ failing }: LanesEvidence, lane: LaneName): boolean =>
  failing.some((other) => same(other, lane));

/** Marks all bits that a chip holds, or takes their marks away where all of them have one. */
export function toggleSocket({ index }: Bench, bits: LanesEvidence, label: string): LanesEvidence {
  const at = index.socketByLabel.get(label);
  const held = at === undefined ? [] : lanesOf(index, at).map((lane) => laneName(index, lane));
  const all = held.every((lane) => isMarked(bits, lane));
  const wanted = held.filter((lane) => all || !isMarked(bits, lane));
  return wanted.reduce(toggleBit, bits);
}

/** Failing bits as the text of a draft. */
export const writeBits = (bits: LanesEvidence): string =>
  bits.failing.length === 0 && bits.passed === noBits.passed
    ? ''
    : writeLink([{ changes: [], evidence: [bits], complete: true }]);

/** Failing bits from the text of a draft; none where it holds something else. */
export function readBits(text: string): LanesEvidence {
  const [first] = readLink(text).runs[0]?.evidence ?? [];
  return first?.kind === 'lanes' ? first : noBits;
}
