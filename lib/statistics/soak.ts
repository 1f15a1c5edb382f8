/** What a soak without a failure shows. */
export interface SoakBound {
  /** Upper limit of the chance of a failure in one hour. */
  readonly mostPerHour: number;
  /** Failures are rarer than once in so many hours. */
  readonly rarerThanHours: number;
}

/**
 * What `hours` of soak without a failure show, at 95 % unless said otherwise: failures are rarer than once in
 * hours/3 (rule of three), with the exact limit 1 - 0.05^(1/hours) of the chance in one hour. J. A. Hanley, A.
 * Lippman-Hand, If nothing goes wrong, is everything all right?, JAMA 249 (1983) 1743-1745. Null where there was no
 * soak. Throws RangeError for a negative time or a confidence that is not between 0 and 1.
 */
export function soakBound(hours: number, confidence = 0.95): SoakBound | null {
  if (!(hours >= 0)) throw new RangeError(`A soak does not last ${hours} hours.`);
  if (!(confidence > 0 && confidence < 1)) throw new RangeError('A confidence lies between 0 and 1.');
  if (hours === 0) return null;
  const doubt = -Math.log(1 - confidence);
  // At 95 % the logarithm is 2.996: the trade says three.
  const three = confidence === 0.95 ? 3 : doubt;
  return { mostPerHour: -Math.expm1(-doubt / hours), rarerThanHours: hours / three };
}
