/**
 * Does `work` and answers after `milliseconds` at the earliest, so that the time does not tell which of two
 * short ways it took.
 */
export const takeAtLeast = async <T>(milliseconds: number, work: () => Promise<T>): Promise<T> => {
  const pause = new Promise((resolve) => setTimeout(resolve, milliseconds));
  const [result] = await Promise.allSettled([work(), pause]);
  if (result.status === 'rejected') throw result.reason;
  return result.value;
};
