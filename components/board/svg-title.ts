import { createDomElement } from '@/components/ui/dom-element';

/** The words that a pointer shows when it rests on a part of the drawing. */
export function svgTitle(words: string) {
  return createDomElement('title', { children: words });
}
