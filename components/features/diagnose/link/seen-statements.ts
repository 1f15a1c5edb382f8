import type { Finding, Measurement, Picture, PictureMark, Sign } from '@/shared';
import { escapeField, readField } from './link-text';
import { dashed, decimal, fromDecimal, whole, type Statement } from './statement';

const looks = { missing: 'm', lit: 'l', wrong: 'w' } as const satisfies Record<PictureMark['looks'], string>;

/**
 * `v.r.wx0t7n32y0t191-red`: marks on the picture. `r` the rest is right, `u` nobody looked. Of a mark: how it looks
 * (m missing, l lit, w wrong), the span in x with its end after t, its repeat after n and the end of the repeats after u,
 * the same in y, the planes.
 */
export const pictureStatement: Statement<Picture> = {
  write: ({ marks, rest }) => ['v', rest === 'right' ? 'r' : 'u', ...marks.map(writeMark)].join('.'),
  read: ([rest, ...marks]) => ({
    kind: 'picture',
    rest: rest === 'u' ? 'unknown' : 'right',
    marks: marks.map(readMark),
  }),
};

function writeMark({ looks: look, planes = [], x, everyX, untilX, y, everyY, untilY }: PictureMark): string {
  const own = `${looks[look]}x${writeSpan(x, everyX, untilX)}y${writeSpan(y, everyY, untilY)}`;
  return [own, ...planes.map(escapeField)].join('-');
}

function writeSpan(
  [from, to]: readonly [number, number],
  every: number | undefined,
  until: number | undefined,
): string {
  const tags = { t: to === from ? undefined : to, n: every, u: until };
  return `${from}${Object.entries(tags)
    .map(([tag, value]) => (value === undefined ? '' : `${tag}${value}`))
    .join('')}`;
}

const span = String.raw`(\d{1,5})(?:t(\d{1,5}))?(?:n(\d{1,5}))?(?:u(\d{1,5}))?`;
const markPattern = new RegExp(`^([mlw])x${span}y${span}$`);

function readMark(text: string): unknown {
  const [own = '', ...planes] = text.split('-');
  const [, look, x0, x1 = x0, everyX, untilX, y0, y1 = y0, everyY, untilY] = markPattern.exec(own) ?? [];
  if (look === undefined) return null;
  const maybe = (digits: string | undefined) => (digits === undefined ? undefined : whole(digits));
  return {
    looks: (Object.keys(looks) as PictureMark['looks'][]).find((one) => looks[one] === look),
    planes: planes.length === 0 ? undefined : planes.map(readField),
    x: [whole(x0), whole(x1)],
    everyX: maybe(everyX),
    untilX: maybe(untilX),
    y: [whole(y0), whole(y1)],
    everyY: maybe(everyY),
    untilY: maybe(untilY),
  };
}

/** `g.hot.U31`: a sign, and the socket that it was seen at. */
export const signStatement: Statement<Sign> = {
  write: ({ sign, socket }) => ['g', sign, ...(socket === undefined ? [] : [escapeField(socket)])].join('.'),
  read: ([sign, socket]) => ({ kind: 'sign', sign, socket: socket === undefined ? undefined : readField(socket) }),
};

/** `u.U31.8.4-72`: volts at a pin of a socket, `n5-01` below 0 V. */
export const measurementStatement: Statement<Measurement> = {
  write: ({ socket, pin, volts }) => ['u', escapeField(socket), pin, decimal(volts)].join('.'),
  read: ([socket = '', pin, volts]) => ({
    kind: 'measurement',
    socket: readField(socket),
    pin: whole(pin),
    volts: fromDecimal(volts),
  }),
};

/** `b.legs.bad.position-U25`: what a check at the bench found; colons of the part's id are dashes. */
export const findingStatement: Statement<Finding> = {
  write: ({ check, found, about }) => ['b', check, found, about.split(':').map(escapeField).join('-')].join('.'),
  read: ([check, found, about = '']) => ({ kind: 'finding', check, about: dashed(about).join(':'), found }),
};
