import type { Href } from 'expo-router';
import { builtInFamilies } from '@/lib';

/** What the page of chips shows: a socket and a chip to compare, and a family to look at. All are ids of families. */
export type PartsLink = { readonly socket: string; readonly chip: string; readonly family: string };

type Params = Partial<Record<string, string | string[]>>;

/** Names of the parts of the link. */
export const partsParams = ['socket', 'chip', 'family'] as const satisfies readonly (keyof PartsLink)[];

const known = new Set(builtInFamilies.map(({ id }) => id));

/** Reads the link of the page; what names no family is left empty. */
export function readPartsLink(params: Params): PartsLink {
  const of = (name: keyof PartsLink) => {
    const given = params[name];
    const id = (Array.isArray(given) ? given[0] : given) ?? '';
    return known.has(id) ? id : '';
  };
  return { socket: of('socket'), chip: of('chip'), family: of('family') };
}

/** The way to the page, with what is known already. A family that a layout describes itself is not on it. */
export function partsLink({ socket = '', chip = '' }: Partial<PartsLink>): Href {
  const given = { socket, chip };
  const params = Object.fromEntries(Object.entries(given).filter(([, id]) => known.has(id)));
  return { pathname: '/parts', params };
}
