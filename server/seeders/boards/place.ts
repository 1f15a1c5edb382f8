import type { LayoutDocumentInput } from '@/shared';

type SocketInput = LayoutDocumentInput['sockets'][number];

interface Point {
  readonly x: number;
  readonly y: number;
}

/** Sockets in one straight line, evenly spaced. */
interface SocketLine {
  readonly labels: readonly string[];
  /** Centre of the first socket, in sketch units. */
  readonly start: Point;
  /** From one centre to the next, in sketch units. */
  readonly step: Point;
  /** What all sockets of the line have in common. */
  readonly socket: Omit<SocketInput, 'label' | 'x' | 'y' | 'holds'>;
  /** What the chip at a place of the line holds; places count from 0. */
  readonly holds: (place: number) => SocketInput['holds'];
}

/** Lays out sockets along a line of the sketch, in the order of their labels. */
export const lineOfSockets = ({ labels, start, step, socket, holds }: SocketLine): SocketInput[] =>
  labels.map((label, place) => ({
    ...socket,
    label,
    x: start.x + step.x * place,
    y: start.y + step.y * place,
    holds: holds(place),
  }));

/** Whole numbers from one to another, both included, upwards or downwards. */
export const numbers = (from: number, to: number): number[] => {
  const direction = to < from ? -1 : 1;
  return Array.from({ length: Math.abs(to - from) + 1 }, (_, place) => from + direction * place);
};

/** Labels made of a prefix and each of the numbers, filled up with zeros to a number of digits. */
export const labelled = (prefix: string, from: readonly number[], digits = 1): string[] =>
  from.map((number) => prefix + String(number).padStart(digits, '0'));

/** The item at a place of a list; a RangeError where the list is too short. */
export const itemAt = <T>(list: readonly T[], place: number): T => {
  const item = list[place];
  if (item === undefined) throw new RangeError(`There is no item ${place} in a list of ${list.length}.`);
  return item;
};
