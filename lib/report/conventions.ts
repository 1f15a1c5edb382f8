import type { FormatField } from '@/shared';
import { radixOf } from './numerals';

interface PlacedField {
  readonly field: FormatField;
  readonly at: number;
}

/** A convention that the layout leaves open, and its two answers in words. */
export interface Question {
  readonly kind: 'first' | 'order';
  /** Parts of the format that it concerns. */
  readonly parts: readonly number[];
  readonly answers: readonly [string, string];
}

/** One answer to every open question. */
export interface Convention {
  readonly takes: readonly string[];
  /** The number of the first bank, bit or lane in this part. */
  readonly first: (part: PlacedField) => 0 | 1;
  /** True where the number 0, or the lowest place, is the highest bit. */
  readonly highFirst: (part: PlacedField) => boolean;
}

const plural: Partial<Record<FormatField['field'], string>> = { bank: 'banks', bit: 'bits', lane: 'lanes' };
const ordered: ReadonlySet<FormatField['field']> = new Set(['bit', 'lane', 'mask', 'written', 'read'] as const);

/** The questions that the fields of a format leave open. Those about the order of the bits are one question. */
export function questionsOf(fields: readonly PlacedField[]): Question[] {
  const counted = fields.flatMap(({ field, at }): Question[] => {
    const what = plural[field.field];
    const counts = radixOf(field.notation) !== null && field.notation !== 'one-hot';
    if (field.first !== 'unknown' || what === undefined || !counts) return [];
    return [{ kind: 'first', parts: [at], answers: [`${what} counted from 0`, `${what} counted from 1`] }];
  });
  const turned = fields.filter(
    ({ field }) => field.bitOrder === 'unknown' && ordered.has(field.field) && radixOf(field.notation) !== null,
  );
  if (turned.length === 0) return counted;
  return [
    ...counted,
    { kind: 'order', parts: turned.map(({ at }) => at), answers: ['bit 0 is the lowest', 'bit 0 is the highest'] },
  ];
}

function conventionOf(questions: readonly Question[], answers: readonly (0 | 1)[]): Convention {
  const answerTo = (kind: Question['kind'], at: number) => {
    const found = questions.findIndex((question) => question.kind === kind && question.parts.includes(at));
    return found < 0 ? 0 : answers[found]!;
  };
  return {
    takes: questions.map((question, n) => question.answers[answers[n]!]),
    first: ({ field, at }) => (field.first === 'unknown' ? answerTo('first', at) : field.first),
    highFirst: ({ field, at }) =>
      field.bitOrder === 'unknown' ? answerTo('order', at) === 1 : field.bitOrder === 'high-first',
  };
}

/** Every way to answer the open questions, the usual answers first. At least one. */
export function conventionsOf(questions: readonly Question[]): Convention[] {
  const count = 2 ** questions.length;
  return Array.from({ length: count }, (_, n) =>
    conventionOf(
      questions,
      questions.map((_, q) => (Math.floor(n / 2 ** q) % 2 === 1 ? 1 : 0)),
    ),
  );
}
