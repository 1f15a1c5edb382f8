import { checkText, tooLarge } from '@/components/features/contribute/check-text';
import { demoDocument } from '@/tests/ui/support/boards';

const loom = demoDocument('tarnvall-t-64-rev-b');
const write = (document: object) => JSON.stringify(document, null, 2);

test('a sound document has no problem, and is what will be sent', () => {
  const checked = checkText(write(loom));
  expect(checked).toMatchObject({ problems: [], errors: 0, leftOut: [] });
  expect(checked.sent).toEqual(loom);
  expect(checked.document?.sockets).toHaveLength(32);
});

test('an empty field has neither problem nor document', () => {
  expect(checkText('  \n ')).toMatchObject({ problems: [], sent: null, document: null });
});

test('problems of content are told with the line on which they stand', () => {
  const text = write({ ...loom, examples: [{ format: 'lamp', text: 'Z9', sockets: ['U10'] }] });
  const [problem] = checkText(text).problems;
  expect(problem).toMatchObject({ severity: 'error', pointer: '/examples/0/text', code: 'example-unread' });
  expect(text.split('\n')[(problem?.place.line ?? 0) - 1]).toContain('"Z9"');
});

test('problems of form and of content come together, and the preview leaves out what cannot be read', () => {
  const checked = checkText(
    write({
      ...loom,
      rails: [{ name: '+5 V', volts: 'five', pins: [8] }],
      examples: [{ format: 'lamp', text: 'Z9', sockets: ['U10'] }],
    }),
  );
  expect(checked.problems.map(({ pointer }) => pointer)).toEqual(['/rails/0/volts', '/examples/0/text']);
  expect(checked.leftOut).toEqual(['rails']);
  expect(checked.document?.rails).toEqual([]);
});

test('errors come before what is only doubtful', () => {
  // A shared part that lies on a socket is doubtful; on the sketch it would hide it.
  const { x, y } = loom.sockets[0]!;
  const sharedParts = loom.sharedParts.map((part, at) => (at === 0 ? { ...part, x, y } : part));
  const examples = [{ format: 'lamp', text: 'Z9', sockets: ['U10'] }];
  const severities = checkText(write({ ...loom, sharedParts, examples })).problems.map(({ severity }) => severity);
  expect(severities).toContain('warning');
  expect(severities.indexOf('warning')).toBeGreaterThan(severities.lastIndexOf('error'));
});

test('without its sockets there is nothing to draw', () => {
  const checked = checkText(write({ ...loom, sockets: [] }));
  expect(checked.document).toBeNull();
  expect(checked.errors).toBe(1);
});

test('a text beyond what the server takes is refused without being read', () => {
  const checked = checkText('['.repeat(2_000_001));
  expect(checked.problems.map(({ message }) => message)).toEqual([
    'This is 2.0 MB; a layout document has at most 2.0 MB.',
  ]);
  expect(tooLarge(50_000_000)).toBe('This is 50.0 MB; a layout document has at most 2.0 MB.');
  expect(tooLarge(1_999_999)).toBeNull();
});
