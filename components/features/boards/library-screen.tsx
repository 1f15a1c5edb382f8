import { useLocalSearchParams, useRouter } from 'expo-router';
import { useCallback, useEffect, useMemo, useRef, useState } from 'react';
import { View } from 'react-native';
import { useSession } from '@/components/api/session';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { Button, ButtonLink } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Page } from '@/components/ui/page';
import { useDebounced } from '@/components/ui/use-debounced';
import { LibraryFilters } from './library-filters';
import { filterNames, longestSearch, readLibraryLink, type LibraryLink } from './library-link';
import { LibraryList } from './library-list';

/** Time in ms after the last key before the search goes into the link. */
const pause = 200;

const cleared = Object.fromEntries(filterNames.map((name) => [name, undefined])) as LibraryLink;

/** The library: every published board, searched and narrowed by what stands in its link. */
export function LibraryScreen() {
  const styles = useStyles();
  const { link, change } = useLibraryLink();
  const { text, setText } = useSearchText(link.q ?? '', change);
  const { mayContribute } = useSession();
  const phone = useBreakpoint() === 'phone';
  const add = <ButtonLink href="/contribute" label={mayContribute ? 'Add a board' : 'Your board is not here?'} />;
  const clear = () => {
    setText('');
    change(cleared);
  };
  return (
    <Page
      title="Boards"
      lead={phone ? undefined : 'Every board whose memory somebody has documented.'}
      actions={phone ? undefined : add}
    >
      <View style={styles.search}>
        <Field
          label="Search"
          hint="Maker, name or revision, or a word from the marks on the copper."
          value={text}
          onChangeText={setText}
          maxLength={longestSearch}
          inputMode="search"
          autoCorrect={false}
          autoComplete="off"
          trailing={text === '' ? undefined : <Button kind="quiet" label="Clear" onPress={() => setText('')} />}
        />
        <LibraryFilters link={link} onChange={change} onClear={() => change({ ...cleared, q: link.q })} />
      </View>
      <LibraryList link={link} onClear={clear} />
      {phone ? add : null}
    </Page>
  );
}

function useLibraryLink() {
  const router = useRouter();
  const params = useLocalSearchParams<Record<string, string>>();
  const key = filterNames.map((name) => params[name] ?? '').join('\n');
  // The router makes a new object of params each time; only what stands in it counts.
  // eslint-disable-next-line react-hooks/exhaustive-deps
  const link = useMemo(() => readLibraryLink(params), [key]);
  const change = useCallback((next: LibraryLink) => router.setParams({ ...next }), [router]);
  return { link, change };
}

/** The field follows every key, the link once the hand rests; whoever goes back gets the search of then. */
function useSearchText(inLink: string, change: (next: LibraryLink) => void) {
  const [text, setText] = useState(inLink);
  const settled = useDebounced(text, pause);
  // What this field wrote into the link last: anything else came from outside.
  const written = useRef(inLink);
  useEffect(() => {
    const search = settled.trim();
    if (search === written.current) return;
    written.current = search;
    change({ q: search === '' ? undefined : search });
  }, [settled, change]);
  useEffect(() => {
    if (inLink === written.current) return;
    written.current = inLink;
    setText(inLink);
  }, [inLink]);
  return { text, setText };
}

const useStyles = makeStyles((t) => ({ search: { gap: t.space.md } }));
