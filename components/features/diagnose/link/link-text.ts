/**
 * The smallest parts of a link: fields that survive every address bar and chat.
 * Letters and digits stand for themselves, all else is `_` code point in hexadecimal `_`; so `~`, `.` and `-` are
 * free to separate, and nothing has to be percent-encoded.
 */

/** A field as it stands in a link. */
export function escapeField(text: string): string {
  if (text === '') return '__';
  return Array.from(text, (sign) =>
    /[A-Za-z0-9]/.test(sign) ? sign : `_${(sign.codePointAt(0) as number).toString(16).toUpperCase()}_`,
  ).join('');
}

/** The text of a field. What is not an escape stays as it is, so that a link may be written by hand. */
export function readField(field: string): string {
  if (field === '__') return '';
  return field.replace(/_([0-9A-Fa-f]{1,6})_/g, (whole, hex: string) => {
    const point = parseInt(hex, 16);
    return point <= 0x10ffff ? String.fromCodePoint(point) : whole;
  });
}
