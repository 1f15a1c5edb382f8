import type { BankIndex, BitIndex, CpuAddress, Lane, WordNumber } from '../brand';
import { bitIndex, cpuAddress, lane } from '../brand';
import { encodeAddress, type AddressOf } from '../place/address';
import { placeInPlane, seesRegister, type Screen, type ScreenPlane } from './screen';

/** Where one plane of a pixel is kept. */
export interface PixelPlace {
  /** The plane, by its place in the screen map. */
  readonly plane: number;
  readonly address: CpuAddress;
  /** The register value under which the address leads there; null where it always does. */
  readonly register: AddressOf['register'];
  /** Null where the address leads to no word of the board, or the word has no such bit. */
  readonly kept: {
    readonly bank: BankIndex;
    readonly word: WordNumber;
    readonly bit: BitIndex;
    readonly lane: Lane;
  } | null;
}

/** A pixel of one plane, in the picture as the memory holds it: before it is turned. */
export interface PlanePixel {
  readonly plane: number;
  readonly x: number;
  readonly y: number;
}

/** The bit of a word that each plane of a pixel is kept in, in the order of the planes. Empty outside the picture. */
export function pixelToPlaces(screen: Screen, x: number, y: number): PixelPlace[] {
  const { map, index } = screen;
  const unit = Math.floor(x / map.pixelsPerUnit);
  if (!(x >= 0 && x < map.width && y >= 0 && y < map.height && unit < map.unitsPerLine)) return [];
  return screen.planes.map((plane, at) => {
    const address = cpuAddress(plane.base + screen.lineOffsets[y]! + unit);
    const place = placeInPlane(screen, plane, address);
    const register = place === null ? (plane.plane.register ?? null) : place.register;
    const of = place === null ? -1 : plane.cellOf(place).lanes[x % map.pixelsPerUnit]!;
    if (place === null || of < 0) return { plane: at, address, register, kept: null };
    const kept = { bank: place.bank, word: place.word, bit: bitIndex(of % index.bitCount), lane: lane(of) };
    return { plane: at, address, register, kept };
  });
}

/**
 * The pixels that show one bit of a word: none where the screen does not show it, several where the screen repeats a
 * line or two planes show the same bit.
 */
export function placeToPixels(screen: Screen, target: { bank: BankIndex; word: number; bit: number }): PlanePixel[] {
  const addresses = encodeAddress(screen.addressMap, target);
  return screen.planes.flatMap((plane, at) =>
    addresses
      .filter(({ register }) => seesRegister(plane.plane, register))
      .flatMap(({ address }) => pixelsAt(screen, plane, { address, target }))
      .map((pixel) => ({ plane: at, ...pixel })),
  );
}

interface Wanted {
  readonly address: number;
  readonly target: { readonly bank: BankIndex; readonly word: number; readonly bit: number };
}

function pixelsAt(screen: Screen, plane: ScreenPlane, { address, target }: Wanted): { x: number; y: number }[] {
  const place = placeInPlane(screen, plane, address);
  if (place?.bank !== target.bank || place.word !== target.word) return [];
  const { map, index, lineOffsets } = screen;
  const { lanes } = plane.cellOf(place);
  const found: { x: number; y: number }[] = [];
  for (let y = 0; y < map.height; y++) {
    const unit = address - plane.base - lineOffsets[y]!;
    if (unit < 0 || unit >= screen.shownUnits) continue;
    lanes.forEach((of, pixel) => {
      const x = unit * map.pixelsPerUnit + pixel;
      if (of === target.bank * index.bitCount + target.bit && x < map.width) found.push({ x, y });
    });
  }
  return found;
}
