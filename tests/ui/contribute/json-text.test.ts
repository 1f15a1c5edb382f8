import { readJson } from '@/components/features/contribute/json-text';

const text = `{
  "board": { "maker": "M" },
  "sockets": [
    { "label": "U1" },
    { "label": "U~/2" }
  ],
  "a/b": { "~": 1 }
}`;

const placeOf = (pointer: string) => {
  const read = readJson(text);
  if (!read.ok) throw new Error(read.reason);
  const { offset, length, line } = read.placeOf(pointer);
  return [line, text.slice(offset, offset + length)];
};

test('every value is found in the text by its pointer', () => {
  expect(placeOf('/board/maker')).toEqual([2, '"M"']);
  expect(placeOf('/sockets/1/label')).toEqual([5, '"U~/2"']);
  expect(placeOf('/a~1b/~0')).toEqual([7, '1']);
});

test('a field that is missing leads to what it is missing in', () => {
  expect(placeOf('/sockets/0/family')).toEqual([4, '{ "label": "U1" }']);
  expect(placeOf('/sockets/7/family')[0]).toBe(3);
  expect(placeOf('')[0]).toBe(1);
});

test.each([
  ['{\n "a": [1,,2] }', 2, 'Here a value is expected. Perhaps there is a comma too many.'],
  ['{\n "a": 1,\n}', 3, 'Here the name of a field is expected, in double quotes. Perhaps there is a comma too many.'],
  ['{ "a" 1 }', 1, 'Here a colon is expected.'],
  ['{ "a": 1 "b": 2 }', 1, 'Here a comma is expected.'],
  ['{ "a": 1', 1, 'A closing brace } is missing.'],
  ["{ 'a': 1 }", 1, 'This word is no JSON: text stands in double quotes.'],
  ['// note\n{}', 1, 'JSON has no comments.'],
  ['{} {}', 1, 'Something stands after the end of the document.'],
])('%j is refused at its line with the reason', (broken, line, reason) => {
  expect(readJson(broken)).toMatchObject({ ok: false, reason, place: { line } });
});

test('a document that is nested without end is refused, and nothing is thrown', () => {
  expect(readJson('['.repeat(200_000))).toMatchObject({ ok: false });
});

test('a field named like a part of every object stays a field', () => {
  const read = readJson('{ "__proto__": { "x": 1 } }');
  expect(read.ok && Object.keys(read.value as object)).toEqual(['__proto__']);
});
