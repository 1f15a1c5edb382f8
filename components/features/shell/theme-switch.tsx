import { useThemeChoice, type ThemeChoice } from '@/components/theme';
import { SegmentedControl } from '@/components/ui/segmented-control';

const options: readonly { value: ThemeChoice; label: string }[] = [
  { value: 'system', label: 'As system' },
  { value: 'day', label: 'Day' },
  { value: 'night', label: 'Night' },
];

/** Chooses the theme; remembered on this device. */
export function ThemeSwitch() {
  const { choice, choose } = useThemeChoice();
  return <SegmentedControl kind="outlined" label="Theme" options={options} value={choice} onChange={choose} />;
}
