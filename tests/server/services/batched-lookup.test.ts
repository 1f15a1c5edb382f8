import { batchLookups } from '@/server/services/batched-lookup';

/** A lookup whose queries end when the test says so. */
const held = () => {
  const queries: { keys: readonly string[]; end: (error?: Error) => void }[] = [];
  const lookUp = batchLookups<string>(
    (keys) =>
      new Promise((resolve, reject) => {
        const end = (error?: Error) =>
          error ? reject(error) : resolve(new Map(keys.filter((key) => key !== 'none').map((key) => [key, `${key}!`])));
        queries.push({ keys, end });
      }),
  );
  return { queries, lookUp };
};

describe('lookups in batches', () => {
  it('send the first at once and what comes meanwhile together, each key once', async () => {
    const { queries, lookUp } = held();
    const answers = ['a', 'b', 'c', 'b', 'a'].map(lookUp);
    expect(queries.map(({ keys }) => keys)).toEqual([['a']]);
    queries[0]?.end();
    await answers[0];
    expect(queries.map(({ keys }) => keys)).toEqual([['a'], ['b', 'c', 'a']]);
    queries[1]?.end();
    expect(await Promise.all(answers)).toEqual(['a!', 'b!', 'c!', 'b!', 'a!']);
  });

  it('never answer from a query that began before it was asked', async () => {
    const { queries, lookUp } = held();
    const early = lookUp('a');
    const late = lookUp('a');
    queries[0]?.end();
    await early;
    expect(queries).toHaveLength(2);
    queries[1]?.end();
    await late;
  });

  it('find nothing for a key that is not there', async () => {
    const { queries, lookUp } = held();
    const answer = lookUp('none');
    queries[0]?.end();
    expect(await answer).toBeUndefined();
  });

  it('go on after a query has failed', async () => {
    const { queries, lookUp } = held();
    const lost = lookUp('a');
    const next = lookUp('b');
    queries[0]?.end(new Error('the connection was lost'));
    await expect(lost).rejects.toThrow('the connection was lost');
    queries[1]?.end();
    expect(await next).toBe('b!');
  });
});
