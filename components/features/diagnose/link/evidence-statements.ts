import type { Evidence, PlainEvidence } from '@/shared';
import { readField } from './link-text';
import { aliasStatement, logStatement, readingsStatement } from './reading-statements';
import { codeStatement, doubtedCode, lanesStatement, maskStatement, passStatement } from './report-statements';
import { findingStatement, measurementStatement, pictureStatement, signStatement } from './seen-statements';
import { statement } from './statement';

/**
 * A piece of evidence as text of a link. What can be understood in several ways is `e` with what each way takes, and the
 * ways after it as statements of their own: `e.octal.hexadecimal~r.-.1CwFFrF7~r.-.34wFFrF7`.
 */
export function writeEvidence(seen: Evidence): string {
  if (seen.kind !== 'either') return writePlain(seen);
  const { ways } = seen;
  return [statement('e', ...ways.map(({ takes }) => takes)), ...ways.map(({ evidence }) => writePlain(evidence))].join(
    '~',
  );
}

function writePlain(seen: PlainEvidence): string {
  switch (seen.kind) {
    case 'code':
      return codeStatement.write(seen);
    case 'lanes':
      return lanesStatement.write(seen);
    case 'mask':
      return maskStatement.write(seen);
    case 'pass':
      return passStatement.write(seen);
    case 'readings':
      return readingsStatement.write(seen);
    case 'log':
      return logStatement.write(seen);
    case 'picture':
      return pictureStatement.write(seen);
    case 'sign':
      return signStatement.write(seen);
    case 'measurement':
      return measurementStatement.write(seen);
    case 'alias':
      return aliasStatement.write(seen);
    case 'finding':
      return findingStatement.write(seen);
  }
}

const readers: Readonly<Record<string, (fields: readonly string[]) => unknown>> = {
  c: codeStatement.read,
  q: doubtedCode.read,
  l: lanesStatement.read,
  m: maskStatement.read,
  p: passStatement.read,
  r: readingsStatement.read,
  f: logStatement.read,
  v: pictureStatement.read,
  g: signStatement.read,
  u: measurementStatement.read,
  a: aliasStatement.read,
  b: findingStatement.read,
};

/** What a statement says was seen, before the schema has checked it; null for a letter of something else. */
export function rawEvidence(text: string): unknown {
  const [letter = '', ...fields] = text.split('.');
  return Object.hasOwn(readers, letter) ? (readers[letter]?.(fields) ?? null) : null;
}

/** What `e` and the statements of its ways say, before the schema has checked it. */
export function rawEither(takes: readonly string[], ways: readonly string[]): unknown {
  return {
    kind: 'either',
    ways: takes.map((one, at) => ({ takes: readField(one), evidence: rawEvidence(ways[at] ?? '') })),
  };
}
