import { render, screen } from '@testing-library/react';
import { spanWords } from '@/components/features/boards/address-spans';
import { SocketAddresses } from '@/components/features/boards/socket-addresses';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument } from '@/shared';

const demo = (slug: string) => layoutDocument.parse(demoBoards.find((board) => board.slug === slug)?.document);

describe('the addresses of a socket', () => {
  it('are told whole, and for a dead row and column, in the notation of the machine', () => {
    const board = demo('tarnvall-t-64-rev-b');
    render(<SocketAddresses document={board} at={board.sockets.findIndex(({ label }) => label === 'U31')} />);
    expect(screen.getByText('8000 to BFFF')).toBeTruthy();
    expect(screen.getByText('8000 to BF80, one in 80')).toBeTruthy();
    expect(screen.getByText('8000 to 807F')).toBeTruthy();
    expect(screen.getAllByText('128 words')).toHaveLength(2);
  });

  it('are counted where there are many runs, and name the register', () => {
    const spans = [0, 1, 2, 3, 4, 5].map((n) => ({
      first: n * 4096,
      last: n * 4096 + 8,
      step: 4,
      count: 3,
      register: { name: 'PAGE', value: 1 },
    }));
    const told = spanWords(demo('rimstad-ct-7-rev-3'), spans);
    expect(told[1]).toBe('1000 to 1008, one in 4, PAGE 1');
    expect(told.at(-1)).toBe('and 2 more runs like these');
  });

  it('are left out where no window leads to the chip', () => {
    const board = {
      ...demo('tarnvall-t-64-rev-b'),
      addressMap: { notation: 'octal' as const, windows: [], elsewhere: [] },
    };
    const { container } = render(<SocketAddresses document={board} at={0} />);
    expect(container.textContent).toBe('');
  });
});
