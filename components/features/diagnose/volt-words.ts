/** "4.72 V", "−5.01 V": volts to the hundredth, with a sign that is as wide as a digit. */
export function voltWords(volts: number): string {
  const rounded = Math.round(Math.abs(volts) * 100) / 100;
  return `${volts < 0 && rounded > 0 ? '−' : ''}${rounded}\u00a0V`;
}

/** Volts as a technician types them: comma or point, any dash for minus, "V" allowed. Null where the text is no number. */
export function readVolts(text: string): number | null {
  const plain = text
    .trim()
    .replace(/\s*v$/i, '')
    .replace(/^[−–-]\s*/, '-')
    .replace(/^\+\s*/, '')
    .replace(',', '.');
  if (!/^-?(\d+\.?\d*|\.\d+)$/.test(plain)) return null;
  const volts = Number(plain);
  return Math.abs(volts) <= 100 ? volts + 0 : null;
}
