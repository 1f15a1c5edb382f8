import type { Evidence } from '@/shared';
import type { Lane } from '../../brand';
import type { LayoutIndex } from '../../layout/layout-index';
import { laneAt } from '../../layout/served-lanes';
import { bankWords, listWords } from '../../layout/words';
import { emptyPiece, laneName, noChoice, refuse, shownOf, type Read, type Where } from './piece';

type Of<K extends Evidence['kind']> = Extract<Evidence, { kind: K }>;

function direct(where: Where, text: string, said: { failing: readonly Lane[]; passed: readonly Lane[] }): Read {
  return {
    piece: { ...emptyPiece(where), choices: [{ ...noChoice, ...said }], passesOutright: said.failing.length === 0 },
    shown: {
      ...shownOf(where, text),
      failing: said.failing.map((lane) => laneName(where.index, lane)),
      passed: said.passed.length,
    },
  };
}

/** Why a bank that evidence names does not exist. */
export function bankReason(index: LayoutIndex, bank: string): string {
  return `This board has no bank ${bank}. It has ${listWords(index.document.memory.banks.map((each) => bankWords(each.id)))}.`;
}

const bitReason = (index: LayoutIndex, bank: string, bit: number) =>
  `Bit ${bit}: ${bankWords(bank)} has no such bit; this board has bits 0 to ${index.bitCount - 1}.`;

/** A mask of failing bits of one bank; its other bits passed. */
export function readMask(where: Where, evidence: Of<'mask'>): Read {
  const { index } = where;
  const text = `${bankWords(evidence.bank)}, mask ${evidence.mask.toString(16).toUpperCase()}`;
  const bank = index.bankByName.get(evidence.bank);
  if (bank === undefined) return refuse(where, text, bankReason(index, evidence.bank));
  const failing: Lane[] = [];
  const passed: Lane[] = [];
  for (let bit = 0, rest = evidence.mask; bit < Math.max(index.bitCount, 40); bit++, rest = Math.floor(rest / 2)) {
    const set = rest % 2 === 1;
    const lane = laneAt(index, bank, bit);
    if (lane !== null) (set ? failing : passed).push(lane);
    else if (set) return refuse(where, text, bitReason(index, evidence.bank, bit));
  }
  return direct(where, text, { failing, passed });
}

/** Lanes by name. */
export function readLanes(where: Where, evidence: Of<'lanes'>): Read {
  const { index } = where;
  const find = (lanes: readonly { bank: string; bit: number }[]): Lane[] | string => {
    const found: Lane[] = [];
    for (const each of lanes) {
      const bank = index.bankByName.get(each.bank);
      if (bank === undefined) return bankReason(index, each.bank);
      const lane = laneAt(index, bank, each.bit);
      if (lane === null) return bitReason(index, each.bank, each.bit);
      found.push(lane);
    }
    return found;
  };
  const words = evidence.failing.map((each) => `bit ${each.bit} of ${bankWords(each.bank)}`);
  const text = words.length > 0 ? listWords(words) : 'passed';
  const failing = find(evidence.failing);
  if (typeof failing === 'string') return refuse(where, text, failing);
  const failed = new Set(failing);
  const rest = () => ([...index.lanes] as Lane[]).filter((lane) => !failed.has(lane));
  const passed = evidence.passed === 'rest' ? rest() : evidence.passed === 'none' ? [] : find(evidence.passed);
  if (typeof passed === 'string') return refuse(where, text, passed);
  return direct(where, text, { failing, passed });
}

/** Banks that passed as a whole. */
export function readPass(where: Where, evidence: Of<'pass'>): Read {
  const { index } = where;
  const banks = evidence.banks ?? index.document.memory.banks.map((bank) => bank.id);
  const text = evidence.banks ? `${listWords(banks.map(bankWords))} passed` : 'all passed';
  const passed: Lane[] = [];
  for (const id of banks) {
    const bank = index.bankByName.get(id);
    if (bank === undefined) return refuse(where, text, bankReason(index, id));
    for (let bit = 0; bit < index.bitCount; bit++) {
      const lane = laneAt(index, bank, bit);
      if (lane !== null) passed.push(lane);
    }
  }
  return direct(where, text, { failing: [], passed });
}
