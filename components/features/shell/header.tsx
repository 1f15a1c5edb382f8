import { usePathname } from 'expo-router';
import { View } from 'react-native';
import { useSession } from '@/components/api/session';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { ButtonLink } from '@/components/ui/button';
import { useBoardInHeader } from './current-board';
import { NavLink } from './nav-link';
import { accountPlace, isCurrent, placesFor } from './places';
import { Wordmark } from './wordmark';

/** The head of the sheet: wordmark, places, the board at hand, the account; a heavy ink rule under it. */
export function Header() {
  const styles = useStyles();
  const breakpoint = useBreakpoint();
  const pathname = usePathname();
  const board = useBoardInHeader();
  const session = useSession();
  const account = accountPlace(session);
  const phone = breakpoint === 'phone';
  return (
    <View role="banner" dataSet={{ print: 'hide' }} style={[styles.header, phone && styles.headerPhone]}>
      <Wordmark />
      {phone ? null : (
        <View role="navigation" aria-label="Places" style={styles.places}>
          {placesFor(session).map((place) => (
            <NavLink key={place.href} place={place} current={isCurrent(place, pathname)} where="head" />
          ))}
        </View>
      )}
      <View style={styles.end}>
        {board === null ? null : (
          <View style={styles.board}>
            <ButtonLink href={`/boards/${board.slug}`} label={board.name} kind="plain" />
          </View>
        )}
        {phone ? null : (
          <ButtonLink
            href={account.href}
            label={account.label}
            kind={isCurrent(account, pathname) ? 'secondary' : 'plain'}
            aria-current={isCurrent(account, pathname) ? 'page' : undefined}
          />
        )}
      </View>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  header: {
    minHeight: t.headerHeight.wide,
    flexDirection: 'row',
    alignItems: 'center',
    gap: t.space.xxl,
    paddingHorizontal: t.space.xl - t.space.xs,
    borderBottomWidth: t.line.ink,
    borderBottomColor: t.colours.ink,
  },
  headerPhone: { gap: t.space.md, paddingHorizontal: t.space.md, justifyContent: 'space-between' },
  // The underline of the current place lies on the header's rule.
  places: { flexDirection: 'row', gap: t.space.xl + t.space.xs, marginBottom: -t.line.ink },
  end: {
    flexGrow: 1,
    flexShrink: 1,
    minWidth: 0,
    flexDirection: 'row',
    justifyContent: 'flex-end',
    alignItems: 'center',
    gap: t.space.xl,
    paddingVertical: t.space.sm,
  },
  board: { flexShrink: 1, minWidth: 0 },
}));
