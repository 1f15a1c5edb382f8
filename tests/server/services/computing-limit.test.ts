import type { Context } from '@/server/context';
import type { AppError } from '@/server/errors';
import { spendComputing } from '@/server/services/computing-limit';

const caller = (ip: string, seconds: number): Context =>
  ({ ip, now: () => new Date(Date.UTC(2026, 0, 1) + seconds * 1000) }) as Context;

/** How many pieces of work are done before one is refused. */
const doneBefore = (context: Context, work: 'published' | 'document'): number => {
  for (let done = 0; done < 100_000; done++) {
    try {
      spendComputing(context, work);
    } catch (error) {
      expect(error as AppError).toMatchObject({ code: 'too-many-requests' });
      return done;
    }
  }
  throw new Error('nothing was refused');
};

describe('one caller', () => {
  it('may have a fifth as many documents computed as published boards', () => {
    expect(doneBefore(caller('192.0.2.1', 0), 'published')).toBe(5 * doneBefore(caller('192.0.2.2', 0), 'document'));
  });

  it('is told how many seconds to wait, and may go on after them', () => {
    doneBefore(caller('192.0.2.3', 0), 'document');
    const refused = () => spendComputing(caller('192.0.2.3', 20), 'published');
    expect(refused).toThrow(expect.objectContaining({ headers: { 'Retry-After': '40' } }));
    spendComputing(caller('192.0.2.3', 60), 'published');
  });

  it('does not spend what others have', () => {
    doneBefore(caller('192.0.2.4', 0), 'document');
    expect(() => spendComputing(caller('192.0.2.5', 0), 'document')).not.toThrow();
  });
});
