import type { CheckAction, Diagnosis, LayoutDocumentInput, RunInput } from '@/shared';

/**
 * How an expectation names a suspect:
 * "U25" a place, be it chip or contact; "chip:U25" the chip that was in U25 at first, wherever it is now;
 * "chip:U12#2" the second chip that lay in U12; "position:U25" its contacts; "shared:U30" a shared part;
 * "short:2-3" two data lines joined; "line:5" a data line itself; "rail:-5 V" a supply; "fitting:U24" a bent leg
 * or a chip turned round there, "fitting:any" anywhere;
 * "together:U7+U8" both bad at once, said as one; "common:2+3" one thing that spoils both bits;
 * "bank:1" one thing that spoils the whole bank; "all" one thing that spoils every bank.
 */
export type SuspectName = string;

/** A check that is asked for, in substance. */
export interface ExpectedCheck {
  readonly actions: readonly CheckAction[];
  /** Sockets that it handles; for a swap no others. */
  readonly sockets?: readonly string[];
  /** What its sentence must say. */
  readonly says?: readonly RegExp[];
  /** What one of its outcomes must say that the board will show. */
  readonly sees?: RegExp;
}

/** How the first reading of a case must have been understood. */
export interface ExpectedDetail {
  readonly bank?: string;
  readonly word?: number;
  readonly mask?: number;
  readonly row?: number;
  readonly column?: number;
}

export interface ExpectedReading {
  readonly outcome?: readonly Diagnosis['outcome'][];
  /** The leading set, in any order. Empty: nothing on the board is named. Left out: practice does not rank it. */
  readonly top?: readonly SuspectName[];
  /** Others that are listed too. A pattern is looked for in all sentences of the answer. */
  readonly alsoListed?: readonly (SuspectName | RegExp)[];
  readonly mustNotLead?: readonly SuspectName[];
  readonly sure: readonly Diagnosis['sure'][];
  /** The leading set together holds at least the first share, and none of it alone more than the second. */
  readonly together?: { readonly holds: number; readonly eachAtMost: number };
  /** Two that are likely bad at the same time. */
  readonly pairs?: readonly (readonly [SuspectName, SuspectName])[];
  /** The first is the first of the answer's checks, the others come anywhere among them. */
  readonly checks?: readonly ExpectedCheck[];
  readonly says?: readonly RegExp[];
  readonly detail?: ExpectedDetail;
  readonly signature?: Partial<Diagnosis['signatures'][number]>;
}

export interface BenchCase {
  readonly id: string;
  readonly title: string;
  readonly board: LayoutDocumentInput;
  readonly runs: readonly RunInput[];
  /** The same evidence entered in other ways; the reading is the same. */
  readonly alsoAs?: Readonly<Record<string, readonly RunInput[]>>;
  readonly expect: ExpectedReading;
}
