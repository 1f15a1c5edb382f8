import type { LayoutListFilters } from '@/components/api/layouts';
import type { LayoutCard } from '@/shared/api/layouts';

/** Names of the parts of the library's link, in the order in which they are shown. */
export const filterNames = ['q', 'maker', 'kind', 'family', 'bits'] as const;

/** The library's link: what is searched, and what it is narrowed by. All of it is text, as in an address. */
export type LibraryLink = Partial<Record<(typeof filterNames)[number], string>>;

/** Longest search that the server takes. */
export const longestSearch = 120;

type Params = Partial<Record<string, string | string[]>>;

/** Reads the link of the library from what stands in the address; what is empty, repeated or too long is cut. */
export function readLibraryLink(params: Params): LibraryLink {
  return Object.fromEntries(
    filterNames.flatMap((name) => {
      const given = params[name];
      const text = (Array.isArray(given) ? given[0] : given)?.slice(0, longestSearch) ?? '';
      if (text.trim() === '' || (name === 'bits' && !/^[1-9]\d?$/.test(text))) return [];
      return [[name, text]];
    }),
  );
}

/** The filters of the request for a link. A kind that does not exist is for the server to refuse. */
export function filtersOf({ q, maker, kind, family, bits }: LibraryLink): LayoutListFilters {
  return {
    ...(q === undefined ? {} : { q: q.trim() }),
    ...(maker === undefined ? {} : { maker }),
    ...(kind === undefined ? {} : { kind: kind as LayoutCard['kind'] }),
    ...(family === undefined ? {} : { family }),
    ...(bits === undefined ? {} : { bits: Number(bits) }),
  };
}

/** Whether a board fits the filters of a link, its search apart; the same rule as the server's. */
export function fitsFilters(card: LayoutCard, { maker, kind, family, bits }: LibraryLink): boolean {
  return (
    (maker === undefined || card.maker.toLowerCase() === maker.trim().toLowerCase()) &&
    (kind === undefined || card.kind === kind) &&
    (family === undefined || card.families.includes(family)) &&
    (bits === undefined || card.dataBits === Number(bits))
  );
}

/** "“loom”, maker Tarnvall Textil, 8 bits": what was searched, in words. Empty where nothing was. */
export function searchWords({ q, maker, kind, family, bits }: LibraryLink): string {
  return [
    q && `“${q.trim()}”`,
    maker && `maker ${maker}`,
    kind && `kind ${kind}`,
    family && `chips ${familyLabel(family)}`,
    bits && `${bits} bits`,
  ]
    .filter(Boolean)
    .join(', ');
}

/** "64K × 1 dynamic": a chip family by its id, where the id tells it; else the id as it is. */
export function familyLabel(id: string): string {
  const [, kind, words, width, rest] = /^(dynamic|static)-(\d+[km]?)-(\d+)(?:-(.+))?$/.exec(id) ?? [];
  if (kind === undefined || words === undefined || width === undefined) return id;
  return `${words.toUpperCase()} × ${width} ${kind}${rest === undefined ? '' : `, ${rest.replaceAll('-', ' ')}`}`;
}
