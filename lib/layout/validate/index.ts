import type { LayoutDocument, LayoutProblem } from '@/shared';
import { buildLayoutIndex } from '../build-layout-index';
import { checkChips } from './chips';
import { checkCoverage } from './coverage';
import { checkExamples } from './examples';
import { checkFormats, compileFormats } from './formats';
import { checkMultiplexing } from './multiplexing';
import { checkNames } from './names';
import { checkPlaces } from './places';
import { checkRails } from './rails';
import { checkScreen } from './screen';
import { checkSharedParts } from './shared-parts';
import { checkWindows } from './windows';

/**
 * Every problem of a layout document that the schema lets through, each with a JSON pointer, how bad it is, a stable
 * code, and words that its contributor understands. Empty for a layout without fault. Never throws.
 */
export function validateLayout(document: LayoutDocument): LayoutProblem[] {
  const checked = { document, index: buildLayoutIndex(document) };
  const compiled = compileFormats(checked);
  return [
    ...checkNames(checked),
    ...checkCoverage(checked),
    ...checkChips(checked),
    ...checkRails(checked),
    ...checkPlaces(checked),
    ...checkMultiplexing(checked),
    ...checkSharedParts(checked),
    ...checkWindows(checked),
    ...checkScreen(checked),
    ...checkFormats(checked, compiled),
    ...checkExamples(checked, compiled),
  ];
}
