import type { LayoutProblem } from '@/shared';
import { listWords } from '../words';
import { type Checked, error, warning } from './problem';

interface Box {
  readonly label: string;
  readonly pointer: string;
  readonly socket: boolean;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

interface Placed {
  readonly x: number;
  readonly y: number;
  readonly turn: number;
  readonly width: number;
  readonly height: number;
}

/** A quarter turn swaps width and height; the centre stays. */
function edges({ x, y, turn, width, height }: Placed) {
  const [across, down] = turn % 2 === 0 ? [width, height] : [height, width];
  return { left: x - across / 2, right: x + across / 2, top: y - down / 2, bottom: y + down / 2 };
}

function boxes({ document }: Checked): Box[] {
  const sockets = document.sockets.map((socket, at) => ({
    label: socket.label,
    pointer: `/sockets/${at}`,
    socket: true,
    ...edges(socket),
  }));
  const parts = document.sharedParts.flatMap((part, at) =>
    part.x === undefined || part.y === undefined
      ? []
      : [
          {
            label: part.label,
            pointer: `/sharedParts/${at}`,
            socket: false,
            ...edges({ ...part, x: part.x, y: part.y }),
          },
        ],
  );
  return [...sockets, ...parts];
}

/** Rounding in a drawn layout is no overlap. */
const slack = 1e-6;

/** For each box the earlier ones that it covers, by a sweep from left to right. */
function covered(all: readonly Box[]): Map<Box, Box[]> {
  const found = new Map<Box, Box[]>();
  const order = new Map(all.map((box, at) => [box, at]));
  let active: Box[] = [];
  for (const box of [...all].sort((a, b) => a.left - b.left)) {
    active = active.filter((other) => other.right > box.left + slack);
    for (const other of active) {
      if (other.bottom <= box.top + slack || other.top >= box.bottom - slack) continue;
      const [first, later] = order.get(other)! < order.get(box)! ? [other, box] : [box, other];
      const list = found.get(later);
      if (list === undefined) found.set(later, [first]);
      else list.push(first);
    }
    active.push(box);
  }
  return found;
}

/** Sockets and shared parts that cover one another on the sketch. */
export function checkPlaces(checked: Checked): LayoutProblem[] {
  return [...covered(boxes(checked))].map(([box, under]) => {
    const sockets = under.filter((other) => other.socket);
    const both = box.socket && sockets.length > 0;
    const finding = {
      pointer: box.pointer,
      code: both ? 'sockets-cover' : 'parts-cover',
      message: `${box.label} covers ${listWords((both ? sockets : under).map(({ label }) => label))} on the sketch. Move or turn one of them.`,
    };
    return both ? error(finding) : warning(finding);
  });
}
