import type { ChipFamily, LayoutDocument } from '@/shared';
import { dynamicFamilies } from './dynamic-families';
import { staticFamilies } from './static-families';

/** RAM chip families that every layout can name without describing them. Each says where its facts come from. */
export const builtInFamilies: readonly ChipFamily[] = [...dynamicFamilies, ...staticFamilies];

const builtInById: ReadonlyMap<string, ChipFamily> = new Map(builtInFamilies.map((family) => [family.id, family]));

/**
 * The chip family that a layout means by an id: its own where it describes one of that id, else a built-in one.
 * Null where nobody knows it.
 */
export function findFamily(document: Pick<LayoutDocument, 'families'>, id: string): ChipFamily | null {
  return document.families.find((family) => family.id === id) ?? builtInById.get(id) ?? null;
}
