/** A probability as it may be said: what was inferred is never certain, however the sum comes out. */
export const stated = (probability: number): number => Math.min(probability, 0.999);
