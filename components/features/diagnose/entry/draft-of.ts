import { addressWords } from '@/lib/layout/words';
import type { Evidence } from '@/shared';
import type { Bench } from '../bench';
import type { Doubt } from './doubts';
import {
  aliasTab,
  bitsTab,
  eitherTab,
  logTab,
  otherTab,
  passTab,
  pictureTab,
  readingsTab,
  signTab,
  supplyTab,
} from './entry-tabs';
import { noBits, writeBits } from './failing-bits';
import { draftOfReadings, writeReadingsDraft } from './readings-draft';
import { writeAlias, writeSign, writeSupply } from './small-drafts';

/** What is being typed: in which tab, as text, and what is doubted of it. */
export interface TypedDraft {
  readonly tab: string;
  readonly text: string;
  readonly doubts: readonly Doubt[];
}

/** A piece of evidence as a draft, to be changed. */
export function draftOf(seen: Evidence, { index }: Bench): TypedDraft {
  const of = (tab: string, text = ''): TypedDraft => ({ tab, text, doubts: [] });
  switch (seen.kind) {
    case 'code':
      return { tab: seen.format, text: seen.text, doubts: seen.doubts ?? [] };
    case 'lanes':
      return of(bitsTab, writeBits(seen));
    case 'mask':
      return of(bitsTab, writeBits({ ...noBits, failing: bitsOfMask(seen), passed: 'none' }));
    case 'pass':
      return of(passTab);
    case 'readings':
      return of(readingsTab, writeReadingsDraft(draftOfReadings(index, seen)));
    case 'log':
      return of(logTab);
    case 'picture':
      return of(pictureTab);
    case 'sign':
      return of(signTab, writeSign({ sign: seen.sign, socket: seen.socket ?? '' }));
    case 'measurement':
      return of(supplyTab, writeSupply({ socket: seen.socket, pin: String(seen.pin), volts: String(seen.volts) }));
    case 'alias': {
      const [one, other] = seen.addresses.map((each) => addressWords(index.document.addressMap, each));
      return of(aliasTab, writeAlias({ one: one ?? '', other: other ?? '', bits: seen.bits ?? null }));
    }
    case 'finding':
      // It has no entry of its own: it is taken out, or something else is put in its place.
      return of(otherTab);
    case 'either':
      return of(eitherTab);
  }
}

function bitsOfMask({ bank, mask }: Extract<Evidence, { kind: 'mask' }>) {
  return Array.from({ length: 40 }, (_, bit) => ({ bank, bit })).filter(({ bit }) => Math.floor(mask / 2 ** bit) % 2);
}
