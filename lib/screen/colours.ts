import type { ScreenMap } from '@/shared';

type Plane = ScreenMap['planes'][number];

/** Adding red, green and blue light; the names are those of the trade. */
const mixes: Readonly<Record<string, string>> = {
  '': 'black',
  r: 'red',
  g: 'green',
  b: 'blue',
  rg: 'yellow',
  gb: 'cyan',
  rb: 'magenta',
  rgb: 'white',
};

const isSingle = (planes: readonly Plane[], wanted: Plane['colour']) =>
  planes.filter(({ colour }) => colour === wanted).length === 1;

/**
 * The colour that a dot shows while it is lit in these planes of a screen and dark in the others: "magenta" for red
 * and blue, "bright white" with the intensity, "dark grey" or "grey" where several planes of one colour make steps.
 */
export function colourName(map: ScreenMap, lit: readonly number[]): string {
  const planes = lit.flatMap((at) => map.planes[at] ?? []);
  const all = map.planes;
  const mono = all.every(({ colour }) => colour === 'white' || colour === 'amber');
  if (mono) return monoName(all, planes);
  const has = (colour: Plane['colour']) => planes.some((plane) => plane.colour === colour);
  const light = has('white') ? 'rgb' : `${has('red') ? 'r' : ''}${has('green') ? 'g' : ''}${has('blue') ? 'b' : ''}`;
  const mix = light === '' && has('amber') ? 'amber' : (mixes[light] ?? 'white');
  const steps = (['red', 'green', 'blue'] as const).some((each) => has(each) && !isSingle(all, each));
  const whole = steps && planes.length < all.length ? 'weaker ' : '';
  if (!all.some(({ colour }) => colour === 'intensity')) return `${whole}${mix}`;
  if (mix === 'black') return has('intensity') ? 'grey' : 'black';
  return has('intensity') ? `bright ${whole}${mix}` : `${whole}${mix}`;
}

function monoName(all: readonly Plane[], lit: readonly Plane[]): string {
  if (lit.length === 0) return 'dark';
  const name = all.every(({ colour }) => colour === 'amber') ? 'amber' : 'white';
  if (lit.length === all.length) return all.length === 1 ? 'lit' : name;
  return name === 'white' ? 'grey' : `dim ${name}`;
}

const everyPlane = (map: ScreenMap) => map.planes.map((_, at) => at);

/** The colour of a dot that is lit in every plane: "white" on a screen of red, green and blue. */
export function fullColour(map: ScreenMap): string {
  return colourName(map, everyPlane(map));
}

/** What a fault in some planes does to the colours. */
export interface ColourFault {
  /** Where their dots are dark that should be lit: "magenta in place of white". */
  readonly missing: string;
  /** Where their dots are lit that should be dark: "green in place of black". */
  readonly lit: string;
}

/** How the picture looks where the dots of these planes are wrong. Planes by their place in the screen map. */
export function colourFault(map: ScreenMap, planes: readonly number[]): ColourFault {
  const others = everyPlane(map).filter((at) => !planes.includes(at));
  return {
    missing: `${colourName(map, others)} in place of ${fullColour(map)}`,
    lit: `${colourName(map, planes)} in place of ${colourName(map, [])}`,
  };
}

/** One colour that a place can show in place of what is drawn, and the planes that are then wrong. */
export interface ColourChoice {
  readonly shows: string;
  readonly planes: readonly number[];
}

/** More planes than this are not combined with one another. */
const mostCombined = 4;

/**
 * missing: every colour that the full colour can show as when planes are dark. lit: every colour that black can show
 * as when planes are lit. Each with those planes, the fewest first; where two sets of planes give one colour, such as
 * two planes of grey, only the first is there.
 */
export function colourChoices(map: ScreenMap, looks: 'missing' | 'lit'): ColourChoice[] {
  const all = everyPlane(map);
  const sets =
    all.length > mostCombined
      ? [...all.map((at) => [at]), all]
      : Array.from({ length: 2 ** all.length - 1 }, (_, n) =>
          all.filter((at) => Math.floor((n + 1) / 2 ** at) % 2 === 1),
        );
  const usual = looks === 'lit' ? colourName(map, []) : fullColour(map);
  const choices = new Map<string, ColourChoice>();
  for (const planes of sets.sort((a, b) => a.length - b.length)) {
    const lit = looks === 'lit' ? planes : all.filter((at) => !planes.includes(at));
    const shows = colourName(map, lit);
    if (shows !== usual && !choices.has(shows)) choices.set(shows, { shows, planes });
  }
  return [...choices.values()];
}
