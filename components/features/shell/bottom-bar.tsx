import { usePathname } from 'expo-router';
import { View } from 'react-native';
import { useSession } from '@/components/api/session';
import { makeStyles, sticky } from '@/components/theme';
import { NavLink } from './nav-link';
import { accountPlace, isCurrent, placesFor } from './places';

/** The places under the thumb, on a phone. On the workspace it does not stick: the room belongs to the answer. */
export function BottomBar() {
  const styles = useStyles();
  const pathname = usePathname();
  const session = useSession();
  const places = [...placesFor(session), accountPlace(session)];
  return (
    <View
      role="navigation"
      aria-label="Places"
      dataSet={{ print: 'hide' }}
      style={[styles.bar, !pathname.endsWith('/diagnose') && styles.sticking]}
    >
      {places.map((place) => (
        <NavLink key={place.href} place={place} current={isCurrent(place, pathname)} where="foot" />
      ))}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  bar: {
    flexDirection: 'row',
    backgroundColor: t.colours.paper,
    borderTopWidth: t.line.ink,
    borderTopColor: t.colours.ink,
    paddingHorizontal: t.space.md,
    gap: t.space.sm,
  },
  sticking: { position: sticky, bottom: t.space.none, zIndex: t.layer.header },
}));
