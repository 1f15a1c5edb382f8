/** Bit of a whole number below 2^53, which the bit operators of the language do not reach. */
export function bitOf(value: number, bit: number): number {
  return Math.floor(value / 2 ** bit) % 2;
}

/** Bits that are 1 in both of two whole numbers below 2^40, which the operator of the language does not reach. */
export function commonOnes(a: number, b: number): number {
  const high = 2 ** 20;
  return (Math.floor(a / high) & Math.floor(b / high)) * high + ((a % high) & (b % high));
}

/** Exclusive-or of some bits of a number. */
export function parityOfBits(value: number, bits: readonly number[]): number {
  return bits.reduce((sum, bit) => sum + bitOf(value, bit), 0) % 2;
}

/** The number without some of its bits, the ones above moved down. `bits` ascending. */
export function closeUp(value: number, bits: readonly number[]): number {
  return bits.reduceRight((rest, bit) => Math.floor(rest / 2 ** (bit + 1)) * 2 ** bit + (rest % 2 ** bit), value);
}

/** Every number that closes up to the value: 2^n of them for n bits. `bits` ascending. */
export function openUp(value: number, bits: readonly number[]): number[] {
  return bits.reduce(
    (opened, bit) =>
      opened.flatMap((rest) => {
        const zero = Math.floor(rest / 2 ** bit) * 2 ** (bit + 1) + (rest % 2 ** bit);
        return [zero, zero + 2 ** bit];
      }),
    [value],
  );
}
