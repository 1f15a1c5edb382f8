import { useRef, type ReactNode } from 'react';
import { View } from 'react-native';
import { NewVersionNotice } from '@/components/features/offline/new-version-notice';
import { OfflineNotice } from '@/components/features/offline/offline-notice';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { BottomBar } from './bottom-bar';
import { CurrentBoardProvider } from './current-board';
import { Footer } from './footer';
import { Header } from './header';
import { SkipLink } from './skip-link';
import { usePageChange } from './use-page-change';

/** What stands around every page. */
export function Shell({ children }: { children: ReactNode }) {
  const styles = useStyles();
  const phone = useBreakpoint() === 'phone';
  const main = useRef<View>(null);
  usePageChange(main);
  return (
    <CurrentBoardProvider>
      <View style={styles.shell}>
        <SkipLink onSkip={() => main.current?.focus()} />
        <Header />
        <OfflineNotice />
        <NewVersionNotice />
        <View ref={main} role="main" tabIndex={-1} style={styles.main}>
          {children}
        </View>
        <Footer />
        {phone ? <BottomBar /> : null}
      </View>
    </CurrentBoardProvider>
  );
}

const useStyles = makeStyles((t) => ({
  shell: { flexGrow: 1, backgroundColor: t.colours.paper },
  // While the code of the next page arrives the foot keeps its place.
  main: { flexGrow: 1, flexShrink: 0, width: '100%', minHeight: '60vh' as '60%' },
}));
