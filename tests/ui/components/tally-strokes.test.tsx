import { screen } from '@testing-library/react';
import { percentWords, tallyCount } from '@/components/ui/percent';
import { TallyStrokes } from '@/components/ui/tally-strokes';
import { renderPage } from '@/tests/ui/support/render';

test.each([
  [0, '0 %'],
  [0.004, 'under 1 %'],
  [0.06, '6 %'],
  [0.914, '91 %'],
  [0.996, 'over 99 %'],
  [1, '100 %'],
])('%s is said as %s', (probability, words) => {
  expect(percentWords(probability)).toBe(words);
});

test.each([
  [0.02, 0],
  [0.06, 1],
  [0.5, 5],
  [0.91, 9],
  [0.98, 9],
  [1, 10],
])('%s is drawn as %s strokes of ten', (probability, strokes) => {
  expect(tallyCount(probability)).toBe(strokes);
});

test('ten strokes are drawn, and only the number is read out', () => {
  const { container } = renderPage(<TallyStrokes probability={0.91} />);
  expect(container.querySelectorAll('path')).toHaveLength(10);
  expect(container.querySelector('svg')?.closest('[aria-hidden="true"]')).not.toBeNull();
  expect(screen.getByText('91 %')).toBeVisible();
});
