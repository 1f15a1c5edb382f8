import { createElement } from 'react';

/** The words that a pointer shows when it rests on a part of the drawing. */
export function svgTitle(words: string) {
  // A title inside an SVG needs no React Native style, so it goes to the page as it is.
  return createElement('title', null, words);
}
