import { closingLine, projectsOf } from '@/server/scripts/setup/test-run.mjs';

describe('the closing line of a run', () => {
  it('counts what passed and what failed', () => {
    expect(closingLine({ passed: 12, failed: 0, skipped: 0 })).toBe('Rowcall: 12 passed, 0 failed');
  });

  it('tells what was skipped, only if something was', () => {
    expect(closingLine({ passed: 12, failed: 1, skipped: 2 })).toBe('Rowcall: 12 passed, 1 failed, 2 skipped');
  });
});

describe('the projects that a run may touch', () => {
  it.each([
    [[], ['lib', 'shared', 'published', 'server', 'browser', 'ui']],
    [
      ['--selectProjects', 'lib', 'ui', '--verbose'],
      ['lib', 'ui'],
    ],
    [['tests/server/routes/people.test.ts'], ['server']],
    [['--verbose', '/somewhere/tests/lib/report/write.test.ts'], ['lib']],
  ])('%j: %j', (args, projects) => {
    expect(projectsOf(args)).toEqual(projects);
  });
});
