import { execFileSync } from 'node:child_process';
import { join } from 'node:path';

interface Table {
  readonly title: string;
  readonly columns: string[];
  readonly rows: string[][];
}

const root = join(__dirname, '..', '..', '..');

const prove = (program: string[], only: string, cases: number): Table[] =>
  JSON.parse(
    execFileSync(
      process.execPath,
      ['--import', 'tsx', join('server', 'scripts', 'prove', program[0] as string), ...program.slice(1)],
      {
        cwd: root,
        env: { ...process.env, PROVE_CASES: String(cases), PROVE_SEED: '3', PROVE_ONLY: only },
        encoding: 'utf8',
      },
    ),
  ) as Table[];

const share = (text: string | undefined) => Number((text ?? '').replace(' %', ''));

describe('the proof', () => {
  it('finds the place of a dead chip first on boards of 8 to 256 sockets, and says so in its columns', () => {
    const [table] = prove(['singles.ts', 'own'], 'chip dead', 100);
    expect(table?.columns).toEqual([
      'fault',
      'cases',
      'place or group first',
      'in first three',
      'a chip first',
      'chips pulled before',
      'naive rule first',
      'naive chips pulled',
      'calibration error',
      '95 % set',
      'set holds it',
    ]);
    const [row] = table?.rows ?? [];
    expect(row?.[0]).toBe('chip dead');
    expect(row?.[1]).toBe('100');
    expect(share(row?.[2])).toBeGreaterThanOrEqual(90);
    expect(share(row?.[3])).toBeGreaterThanOrEqual(95);
  }, 300_000);

  it('does not send for a chip where a whole buffer is dead', () => {
    const [table] = prove(['singles.ts', 'shared'], 'whole data part', 60);
    const [row] = table?.rows ?? [];
    expect(share(row?.[4])).toBeLessThanOrEqual(10);
    expect(share(row?.[6])).toBe(0);
  }, 300_000);
});
