import { act, render, renderHook, screen } from '@testing-library/react';
import type { ReactNode } from 'react';
import { Text } from 'react-native';
import { makeStyles, ThemeProvider, useBreakpoint, useTheme, useThemeChoice } from '@/components/theme';
import { setDevice } from '@/tests/ui/support/device';

const wrapper = ({ children }: { children: ReactNode }) => <ThemeProvider>{children}</ThemeProvider>;

const useBoth = () => ({ theme: useTheme().name, ...useThemeChoice() });

test('the theme follows the system until the person chooses one', () => {
  const { result } = renderHook(useBoth, { wrapper });
  expect(result.current.theme).toBe('day');
  setDevice({ dark: true });
  expect(result.current.theme).toBe('night');
  act(() => result.current.choose('day'));
  expect(result.current.theme).toBe('day');
});

test('a choice of theme is remembered for the next visit', () => {
  const first = renderHook(useBoth, { wrapper });
  act(() => first.result.current.choose('night'));
  first.unmount();
  expect(renderHook(useBoth, { wrapper }).result.current).toMatchObject({ theme: 'night', choice: 'night' });
});

test('a remembered word that is no theme counts as none', () => {
  window.localStorage.setItem('rowcall.theme', 'sepia');
  expect(renderHook(useBoth, { wrapper }).result.current.choice).toBe('system');
});

test('styles are built once a theme, however many components use them', () => {
  const build = jest.fn(() => ({ box: { padding: 1 } }));
  const useStyles = makeStyles(build);
  const Box = () => <Text style={useStyles().box}>box</Text>;
  render(
    <ThemeProvider>
      <Box />
      <Box />
    </ThemeProvider>,
  );
  expect(screen.getAllByText('box')).toHaveLength(2);
  expect(build).toHaveBeenCalledTimes(1);
  setDevice({ dark: true });
  expect(build).toHaveBeenCalledTimes(2);
});

test.each([
  [390, 'phone'],
  [719, 'phone'],
  [720, 'medium'],
  [1080, 'wide'],
])('a window of %s px is %s', (width, expected) => {
  setDevice({ width });
  expect(renderHook(useBreakpoint).result.current).toBe(expected);
});
