import type { Theme } from './theme';

const sheetId = 'rowcall-document';

/** Rules that components cannot set on themselves: the page's ground, the keyboard's focus ring, print, motion. */
function documentCss({ name, colours, line, space, radius }: Theme): string {
  return `
:root { color-scheme: ${name === 'night' ? 'dark' : 'light'}; background: ${colours.paper}; accent-color: ${colours.pen}; }
body { background: ${colours.paper}; color: ${colours.ink}; }
::selection { background: ${colours.pencilWash}; color: ${colours.ink}; }
:focus { outline: none; }
:focus-visible { outline: ${line.heavy}px solid ${colours.pen} !important; outline-offset: ${space.hair}px; border-radius: ${radius.sm}px; }
[tabindex="-1"]:focus-visible { outline: none !important; }
input:-webkit-autofill { -webkit-text-fill-color: ${colours.ink}; box-shadow: inset 0 0 0 999px ${colours.sheet}; }
@media (prefers-reduced-motion: reduce) { *, *::before, *::after { animation: none !important; transition: none !important; scroll-behavior: auto !important; } }
@media print { :root, body { background: none; } [data-print="hide"] { display: none !important; } }
@media not print { [data-print="only"] { display: none !important; } }
`;
}

/** Dresses the document itself in a theme. Does nothing where there is no document. */
export function applyDocumentStyle(theme: Theme): void {
  if (typeof document === 'undefined') return;
  let element = document.getElementById(sheetId);
  if (element === null) {
    element = document.createElement('style');
    element.id = sheetId;
    document.head.appendChild(element);
  }
  element.textContent = documentCss(theme);
  for (const meta of Array.from(document.querySelectorAll('meta[name="theme-color"]'))) {
    meta.removeAttribute('media');
    meta.setAttribute('content', theme.colours.paper);
  }
}
