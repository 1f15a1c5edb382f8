import type { ChipFamily } from '@/shared';
import { pinList } from './pin-list';

const K = 1024;

/**
 * Static RAM families, all on +5 V, the smallest first. Pins from the source that each names; access times are
 * the usual ones (common practice, no source).
 */
export const staticFamilies: readonly ChipFamily[] = [
  {
    id: 'static-1k-1',
    name: '1K × 1 static',
    alsoCalled: ['2102'],
    kind: 'static',
    words: K,
    width: 1,
    pins: pinList('A6 A5 /W A1 A2 A3 A4 A0 0V +5V D Q /CS A9 A8 A7'),
    gradesNs: [250, 350, 450, 650],
    stackable: true,
    source: 'From memory; compare with the data sheet of the chip at hand.',
  },
  {
    id: 'static-1k-4',
    name: '1K × 4 static',
    alsoCalled: ['2114'],
    kind: 'static',
    words: K,
    width: 4,
    pins: pinList('A6 A5 A4 A3 A0 A1 A2 /CS 0V /W D3 D2 D1 D0 A9 A8 A7 +5V'),
    gradesNs: [200, 300, 450],
    stackable: true,
    source: 'Pins: c64-wiki.com, "RAM". Its data pins are numbered from 1 there.',
  },
  {
    id: 'static-2k-8',
    name: '2K × 8 static, 24 pins',
    alsoCalled: ['6116', '2016'],
    kind: 'static',
    words: 2 * K,
    width: 8,
    pins: pinList('A7 A6 A5 A4 A3 A2 A1 A0 D0 D1 D2 0V D3 D4 D5 D6 D7 /CS A10 /OE /W A9 A8 +5V'),
    gradesNs: [100, 120, 150, 200],
    stackable: true,
    source: 'From memory; compare with the data sheet of the chip at hand.',
  },
  {
    id: 'static-8k-8',
    name: '8K × 8 static, 28 pins',
    alsoCalled: ['6264'],
    kind: 'static',
    words: 8 * K,
    width: 8,
    pins: pinList('NC A12 A7 A6 A5 A4 A3 A2 A1 A0 D0 D1 D2 0V D3 D4 D5 D6 D7 /CS A10 /OE A11 A9 A8 CS2 /W +5V'),
    gradesNs: [70, 100, 120, 150],
    stackable: true,
    source: 'From memory; compare with the data sheet of the chip at hand.',
  },
  {
    id: 'static-32k-8',
    name: '32K × 8 static, 28 pins',
    alsoCalled: ['62256'],
    kind: 'static',
    words: 32 * K,
    width: 8,
    pins: pinList('A14 A12 A7 A6 A5 A4 A3 A2 A1 A0 D0 D1 D2 0V D3 D4 D5 D6 D7 /CS A10 /OE A11 A9 A8 A13 /W +5V'),
    gradesNs: [55, 70, 85, 100, 120],
    stackable: true,
    source: 'Pins: Debian package kicad-symbols 6.0.10, Memory_RAM.kicad_sym, KM62256CLP.',
  },
  {
    id: 'static-128k-8',
    name: '128K × 8 static, 32 pins',
    alsoCalled: ['628128', '681000'],
    kind: 'static',
    words: 128 * K,
    width: 8,
    pins: pinList(
      'NC A16 A14 A12 A7 A6 A5 A4 A3 A2 A1 A0 D0 D1 D2 0V D3 D4 D5 D6 D7 /CS A10 /OE A11 A9 A8 A13 /W CS2 A15 +5V',
    ),
    gradesNs: [55, 70, 85, 100],
    stackable: true,
    source: 'Pins: Debian package kicad-symbols 6.0.10, Memory_RAM.kicad_sym, 628128_DIP32_SSOP32.',
  },
];
