/**
 * A button, radio or checkbox by its name. A role query looks at the style of every node of a drawn board, which
 * takes jsdom seconds a press.
 */
export function control(name: string, at = 0): HTMLElement {
  const all = Array.from(
    document.querySelectorAll<HTMLElement>('button, [role="button"], [role="radio"], [role="checkbox"]'),
  );
  const found = all.filter((one) => (one.getAttribute('aria-label') ?? one.textContent) === name);
  const wanted = found[at];
  if (wanted === undefined)
    throw new Error(`There is no control “${name}” among: ${all.map((one) => one.textContent).join(' | ')}`);
  return wanted;
}
