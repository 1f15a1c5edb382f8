import type { ReadResult } from './meaning';
import { type Reader, readText } from './read';

/** A person who counted flashes or beeps may say "5 or 6". */
const either = /(\S+)\s+or\s+(\S+)/i;

/** More doubts than this in one code tell nothing. */
const mostDoubts = 3;

function readDoubtful(reader: Reader, text: string, doubts: number): ReadResult {
  const plain = readText(reader, text);
  const doubt = plain.ok || doubts === 0 ? null : either.exec(text);
  if (doubt === null) return plain;
  const [whole, one, two] = doubt;
  const before = text.slice(0, doubt.index);
  const after = text.slice(doubt.index + whole.length);
  const results = [one!, two!].map((word) => ({
    word,
    result: readDoubtful(reader, before + word + after, doubts - 1),
  }));
  const refused = results.find(({ result }) => !result.ok);
  if (refused !== undefined && !refused.result.ok) {
    const { reason } = refused.result;
    return { ok: false, reason: `With "${refused.word}": ${reason}`, at: doubt.index };
  }
  const read = results.flatMap(({ word, result }) => (result.ok ? [{ word, result }] : []));
  return {
    ok: true,
    text: read.map(({ result }) => result.text).join(' or '),
    notes: [...new Set(read.flatMap(({ result }) => result.notes))],
    readings: read.flatMap(({ word, result }) =>
      result.readings.map((reading) => ({ ...reading, takes: [...reading.takes, `"${word}" is right`] })),
    ),
  };
}

/** Text to evidence as readText does; and where a person typed "5 or 6", the readings of both. */
export function readEither(reader: Reader, text: string): ReadResult {
  return readDoubtful(reader, text, mostDoubts);
}
