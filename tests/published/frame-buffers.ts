import type { PublishedSource } from './machine-charts';

/**
 * Where published descriptions of real machines place the pixels of their screens: check values only, copied from the
 * sources that each names. None of these machines is part of the product's data.
 */
interface FrameBuffer {
  readonly machine: string;
  readonly sources: readonly PublishedSource[];
  readonly width: number;
  readonly height: number;
  readonly pixelsPerByte: number;
  readonly base: number;
  readonly leftmostBit: number;
  readonly worked: readonly { x: number; y: number; address: number; bit?: number }[];
}

/** The address as the source writes it, highest bit first. */
export const spectrumAddressBits = '0 1 0 y7 y6 y2 y1 y0 y5 y4 y3 x7 x6 x5 x4 x3';

export const spectrum: FrameBuffer = {
  machine: 'Sinclair ZX Spectrum, display file',
  sources: [
    {
      title: 'Spectrum Video Modes',
      author: 'faqwiki.zxnet.co.uk, no author named',
      year: 'no date',
      page: 'display file layout',
      read: 'read',
    },
    {
      title: 'Spectrum screen',
      author: 'area51.dev, no author named',
      year: 'no date',
      page: 'sinclair/spectrum/screen/file',
      read: 'read',
    },
  ],
  width: 256,
  height: 192,
  pixelsPerByte: 8,
  base: 0x4000,
  leftmostBit: 7,
  worked: [
    { x: 0, y: 0, address: 0x4000 },
    { x: 8, y: 0, address: 0x4001 },
    { x: 0, y: 1, address: 0x4100 },
    { x: 0, y: 8, address: 0x4020 },
    { x: 0, y: 64, address: 0x4800 },
    { x: 255, y: 191, address: 0x57ff, bit: 0 },
  ],
};

/** The formula as the source writes it; numbers hexadecimal. */
export const appleFormula = (x: number, y: number) =>
  0x2000 + (y % 8) * 0x400 + (Math.floor(y / 8) % 8) * 0x80 + Math.floor(y / 64) * 0x28 + Math.floor(x / 7);

export const apple: FrameBuffer = {
  machine: 'Apple II, high-resolution page 1',
  sources: [
    {
      title:
        'a tutorial on Apple II high-resolution memory: three sections of 64 lines, eights of lines 128 bytes apart',
      author: 'not named in the reference',
      year: 'no date',
      page: 'not given',
      read: 'secondary',
    },
  ],
  width: 280,
  height: 192,
  pixelsPerByte: 7,
  base: 0x2000,
  leftmostBit: 0,
  worked: [
    { x: 0, y: 0, address: 0x2000 },
    { x: 0, y: 64, address: 0x2028 },
    { x: 0, y: 128, address: 0x2050 },
    { x: 0, y: 8, address: 0x2080 },
    { x: 0, y: 1, address: 0x2400 },
  ],
};
