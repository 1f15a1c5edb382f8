import type { LayoutIndex } from '../layout/layout-index';
import { compileFormat } from '../report/compile-format';
import type { CompiledFormat } from '../report/meaning';

const compiled = new WeakMap<LayoutIndex, ReadonlyMap<string, CompiledFormat>>();

/** The report formats of a layout that work, by id, compiled once. */
export function compiledFormats(index: LayoutIndex): ReadonlyMap<string, CompiledFormat> {
  const before = compiled.get(index);
  if (before) return before;
  const formats = new Map<string, CompiledFormat>();
  for (const definition of index.document.reportFormats) {
    const result = compileFormat(definition, index);
    if (result.ok && !formats.has(definition.id)) formats.set(definition.id, result.format);
  }
  compiled.set(index, formats);
  return formats;
}
