import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Text } from '@/components/ui/text';
import type { Bench } from '../bench';
import { LogImport } from '../logs/log-import';
import { PictureEntry } from '../picture/picture-entry';
import { AliasEntry } from './alias-entry';
import { BitsEntry } from './bits-entry';
import { ActionList } from './choice-list';
import { EitherEntry } from './either-entry';
import {
  aliasTab,
  bitsTab,
  eitherTab,
  isOther,
  logTab,
  otherKinds,
  otherTab,
  passTab,
  pictureTab,
  readingsTab,
  signTab,
  supplyTab,
} from './entry-tabs';
import { PassEntry } from './pass-entry';
import { ReadingsEntry } from './readings-entry';
import { SignEntry } from './sign-entry';
import { SupplyEntry } from './supply-entry';
import type { Entry } from './use-entry';

type KindEntryProps = {
  bench: Bench;
  entry: Entry;
  /** Back from a kind that has its own way out. */
  onClose: () => void;
};

/** What is entered in a tab that is no report format, under its name where the strip does not say it. */
export function KindEntry({ bench, entry, onClose }: KindEntryProps) {
  const styles = useStyles();
  const { tab } = entry;
  const kind = isOther(bench, tab) ? otherKinds(bench).find((one) => one.tab === tab) : undefined;
  if (entry.format !== null) return null;
  return (
    <View style={styles.all}>
      {kind === undefined ? null : (
        <View style={styles.head}>
          <Text variant="heading" level={2} style={styles.name}>
            {kind.label}
          </Text>
          <Button kind="quiet" label="Another kind" onPress={() => entry.chooseTab(otherTab)} />
        </View>
      )}
      <Body bench={bench} entry={entry} onClose={onClose} />
      {entry.refused === null ? null : (
        <Text variant="smallStrong" tone="pencil">
          {entry.refused}
        </Text>
      )}
    </View>
  );
}

function Body({ bench, entry, onClose }: KindEntryProps) {
  const { text, setText } = entry;
  switch (entry.tab) {
    case bitsTab:
      return <BitsEntry document={bench.document} bits={entry.bits} onChange={entry.setBits} />;
    case passTab:
      return <PassEntry document={bench.document} onPass={(banks) => entry.add({ kind: 'pass', banks })} />;
    case readingsTab:
      return entry.readings === null ? null : (
        <ReadingsEntry bench={bench} text={text} typed={entry.readings} onChange={setText} />
      );
    case signTab:
      return <SignEntry bench={bench} text={text} onChange={setText} />;
    case supplyTab:
      return <SupplyEntry bench={bench} text={text} onChange={setText} />;
    case aliasTab:
      return <AliasEntry bench={bench} text={text} onChange={setText} />;
    case eitherTab:
      return entry.before?.kind === 'either' ? (
        <EitherEntry bench={bench} seen={entry.before} onChoose={entry.add} />
      ) : null;
    case pictureTab:
      return (
        <PictureEntry
          index={bench.index}
          before={entry.before?.kind === 'picture' ? entry.before : undefined}
          onEvidence={entry.add}
          onClose={onClose}
        />
      );
    case logTab:
      return <LogImport index={bench.index} onEvidence={entry.add} />;
    default:
      return (
        <ActionList
          label="What else there is to enter"
          lines={otherKinds(bench).map(({ tab, label, help }) => ({ value: tab, label, help }))}
          onPress={entry.chooseTab}
        />
      );
  }
}

/** Whether the tab has its own way to the answer, so that the keys at the foot would only be in the way. */
export const hasOwnWay = (tab: string): boolean =>
  [passTab, otherTab, logTab, pictureTab, eitherTab].some((one) => one === tab);

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  head: { flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between', gap: t.space.sm },
  name: { flexShrink: 1 },
}));
