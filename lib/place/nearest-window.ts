import { addressWords } from '../layout/words';
import type { AddressMap } from './address';

/** Why an address leads to no word of the board: what lies there, or the window that is nearest. */
export function nearestWords(
  { windows, index }: AddressMap,
  address: number,
  unit: 'address' | 'word' = 'address',
): string {
  const { addressMap } = index.document;
  const shown = addressWords(addressMap, address);
  const elsewhere = addressMap.elsewhere.find(({ range }) => address >= range.from && address <= range.to);
  if (elsewhere) return `${shown}: ${elsewhere.means}.`;
  if (windows.length === 0) return `${shown}: this layout does not say at which addresses its memory answers.`;
  let nearest = windows[0]!;
  let least = Infinity;
  for (const each of windows) {
    const scale = unit === 'word' ? each.steps : 1;
    const at = address * scale;
    const { from, to } = each.window.range;
    const distance = at < from ? from - at : at > to ? at - to : 0;
    if (distance < least) {
      least = distance;
      nearest = each;
    }
  }
  const { from, to } = nearest.window.range;
  const scale = unit === 'word' ? nearest.steps : 1;
  const words = (n: number) => addressWords(addressMap, Math.floor(n / scale));
  return `${shown} lies outside this board's memory; the nearest window is ${words(from)} to ${words(to)}.`;
}
