/**
 * A button, radio or checkbox by its name. A role query looks at the style of every node of a drawn board, which
 * takes jsdom seconds a press.
 */
export function control(name: string | RegExp, at = 0): HTMLElement {
  const all = Array.from(
    document.querySelectorAll<HTMLElement>('button, [role="button"], [role="radio"], [role="checkbox"]'),
  );
  const called = (one: HTMLElement) => one.getAttribute('aria-label') ?? one.textContent ?? '';
  const found = all.filter((one) => (typeof name === 'string' ? called(one) === name : name.test(called(one))));
  const wanted = found[at];
  if (wanted === undefined)
    throw new Error(`There is no control “${String(name)}” among: ${all.map((one) => one.textContent).join(' | ')}`);
  return wanted;
}
