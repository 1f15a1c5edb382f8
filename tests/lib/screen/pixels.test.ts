import fc from 'fast-check';
import { bankIndex } from '@/lib/brand';
import { buildLayoutIndex } from '@/lib/layout/build-layout-index';
import { pixelToPlaces, placeToPixels } from '@/lib/screen/pixels';
import { screenOf } from '@/lib/screen/screen';
import { anyScreen, plainPlace } from './plain-screen';

const screenWith = (document: Parameters<typeof buildLayoutIndex>[0]) => screenOf(buildLayoutIndex(document))!;

describe('a pixel', () => {
  it('leads to the bit of the word that a plain formula gives, in every plane', () => {
    fc.assert(
      fc.property(anyScreen, fc.nat(), fc.nat(), (document, a, b) => {
        const { width, height, planes } = document.screenMap!;
        const pixel = { x: a % width, y: b % height };
        const places = pixelToPlaces(screenWith(document), pixel.x, pixel.y);
        expect(places.map(({ kept }) => kept && { bank: kept.bank, word: kept.word, bit: kept.bit })).toEqual(
          planes.map((_, plane) => plainPlace(document, plane, pixel)),
        );
      }),
      { numRuns: 1000 },
    );
  });

  it('comes back from its bit, with every other pixel that shows the same bit', () => {
    fc.assert(
      fc.property(anyScreen, fc.nat(), fc.nat(), (document, a, b) => {
        const { width, height, planes } = document.screenMap!;
        const at = { x: a % width, y: b % height };
        const screen = screenWith(document);
        for (const { plane, kept } of pixelToPlaces(screen, at.x, at.y)) {
          const back = placeToPixels(screen, kept!);
          expect(back).toContainEqual({ plane, ...at });
          for (const pixel of back) {
            expect(plainPlace(document, pixel.plane, pixel)).toEqual({
              bank: kept!.bank,
              word: kept!.word,
              bit: kept!.bit,
            });
          }
          let same = 0;
          for (let p = 0; p < planes.length; p++)
            for (let y = 0; y < height; y++)
              for (let x = 0; x < width; x++) {
                const place = plainPlace(document, p, { x, y });
                if (place?.bank === kept!.bank && place.word === kept!.word && place.bit === kept!.bit) same++;
              }
          expect(back).toHaveLength(same);
        }
      }),
      { numRuns: 60 },
    );
  });

  it('outside the picture leads nowhere, and a word that is not shown has no pixel', () => {
    fc.assert(
      fc.property(anyScreen, (document) => {
        const screen = screenWith(document);
        const { width, height } = document.screenMap!;
        expect(pixelToPlaces(screen, width, 0)).toEqual([]);
        expect(pixelToPlaces(screen, 0, height)).toEqual([]);
        expect(pixelToPlaces(screen, -1, 0)).toEqual([]);
        expect(placeToPixels(screen, { bank: bankIndex(0), word: 60_000, bit: 0 })).toEqual([]);
      }),
      { numRuns: 20 },
    );
  });
});
