import { screen } from '@testing-library/react';
import { useState } from 'react';
import { Text } from 'react-native';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { Tabs } from '@/components/ui/tabs';
import { renderPage } from '@/tests/ui/support/render';

const ways = [
  { value: 'code', label: 'Lamp code' },
  { value: 'mask', label: 'Bit mask' },
  { value: 'beeps', label: 'Beeps' },
] as const;

type Way = (typeof ways)[number]['value'];

function Segments() {
  const [value, setValue] = useState<Way>('code');
  return <SegmentedControl label="Way of reporting" options={ways} value={value} onChange={setValue} />;
}

function TabbedParts() {
  const [value, setValue] = useState<Way>('code');
  return (
    <Tabs label="Parts" tabs={ways} value={value} onChange={setValue}>
      <Text>{`panel of ${value}`}</Text>
    </Tabs>
  );
}

test('a segmented control is one stop of the Tab key, and arrows choose inside it', async () => {
  const { user } = renderPage(<Segments />);
  await user.tab();
  expect(screen.getByRole('radio', { name: 'Lamp code' })).toHaveFocus();
  await user.keyboard('{ArrowRight}');
  const second = screen.getByRole('radio', { name: 'Bit mask' });
  expect(second).toHaveFocus();
  expect(second).toBeChecked();
  await user.keyboard('{End}');
  expect(screen.getByRole('radio', { name: 'Beeps' })).toBeChecked();
  await user.keyboard('{ArrowRight}');
  expect(screen.getByRole('radio', { name: 'Lamp code' })).toBeChecked();
  await user.tab();
  expect(document.body).toHaveFocus();
});

test('the panel of tabs takes its name from the current tab', async () => {
  const { user } = renderPage(<TabbedParts />);
  await user.click(screen.getByRole('tab', { name: 'Beeps' }));
  expect(screen.getByRole('tabpanel', { name: 'Beeps' })).toHaveTextContent('panel of beeps');
  expect(screen.getByRole('tab', { selected: true })).toHaveAccessibleName('Beeps');
});

test('arrows move between tabs', async () => {
  const { user } = renderPage(<TabbedParts />);
  await user.tab();
  await user.keyboard('{ArrowLeft}');
  expect(screen.getByRole('tab', { selected: true })).toHaveAccessibleName('Beeps');
});
