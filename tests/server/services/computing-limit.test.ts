import type { Context } from '@/server/context';
import type { AppError } from '@/server/errors';
import { spendComputing } from '@/server/services/computing-limit';

const caller = (ip: string, seconds: number): Context =>
  ({ ip, now: () => new Date(Date.UTC(2026, 0, 1) + seconds * 1000) }) as Context;

/** How many pieces of work are done before one is refused. */
const doneBefore = (context: Context, of: 'published' | 'document', sockets = 0): number => {
  for (let done = 0; done < 100_000; done++) {
    try {
      spendComputing(context, { of, sockets });
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

  it('may have fewer boards computed the larger they are', () => {
    const small = doneBefore(caller('192.0.2.6', 0), 'published');
    expect(doneBefore(caller('192.0.2.7', 0), 'published', 320)).toBe(Math.floor(small / 11));
  });

  it('is told how many seconds to wait, and may go on after them', () => {
    doneBefore(caller('192.0.2.3', 0), 'document');
    const refused = () => spendComputing(caller('192.0.2.3', 20), { of: 'published', sockets: 0 });
    expect(refused).toThrow(expect.objectContaining({ headers: { 'Retry-After': '40' } }));
    spendComputing(caller('192.0.2.3', 60), { of: 'published', sockets: 0 });
  });

  it('does not spend what others have', () => {
    doneBefore(caller('192.0.2.4', 0), 'document');
    expect(() => spendComputing(caller('192.0.2.5', 0), { of: 'document', sockets: 0 })).not.toThrow();
  });
});
