import { existsSync, readFileSync } from 'node:fs';

const folder = '/usr/share/kicad/symbols';

/**
 * Pin names of a symbol of KiCad by pin number, from the Debian package kicad-symbols. Throws where the package is
 * not installed or has no such symbol; a symbol that extends another has its pins.
 */
export function kicadPins(file: string, symbol: string): ReadonlyMap<number, string> {
  const path = `${folder}/${file}`;
  if (!existsSync(path))
    throw new Error(`${path} is missing: run "npm test", or install the Debian package kicad-symbols.`);
  const text = readFileSync(path, 'utf8');
  const start = text.indexOf(`\n  (symbol "${symbol}"`);
  if (start < 0) throw new Error(`${file} has no symbol ${symbol}.`);
  const end = text.indexOf('\n  (symbol ', start + 1);
  const body = text.slice(start, end < 0 ? undefined : end);
  const parent = /^\s*\(symbol "[^"]*" \(extends "([^"]*)"\)/.exec(body)?.[1];
  if (parent !== undefined) return kicadPins(file, parent);
  const pins = [...body.matchAll(/\(pin \w+ \w+[^]*?\(name "([^"]*)"[^]*?\(number "(\d+)"/g)];
  return new Map(pins.map(([, name, number]) => [Number(number), name!]));
}
