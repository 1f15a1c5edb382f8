import { useState } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { percentWords } from '@/components/ui/percent';
import { Text } from '@/components/ui/text';
import type { Suspect } from '@/shared';
import { stated } from '../stated';
import { suspectKind, suspectName } from './suspect-words';

/** One suspect: its rank, what it is, how likely, why; opened, everything that speaks for and against it. */
export function SuspectEntry({ suspect, onShow }: { suspect: Suspect; onShow: (socket: string) => void }) {
  const styles = useStyles();
  const [open, setOpen] = useState(false);
  const first = suspect.rank === 1;
  const name = suspectName(suspect);
  const [reason, ...others] = suspect.reasons;
  const more = others.length + suspect.explains.length + suspect.contradicts.length > 0 || suspect.modes.length > 1;
  return (
    <View role="listitem" style={styles.entry}>
      <View aria-hidden style={[styles.rank, first && styles.rankFirst]}>
        <Text variant="smallStrong" tone={first ? 'onPencil' : 'mark'}>
          {suspect.rank}
        </Text>
      </View>
      <View style={styles.words}>
        <View style={styles.head}>
          <Text variant="heading" level={3} tone={first ? 'answer' : 'mark'} style={styles.name}>
            <Text variant={first ? 'codeMedium' : 'code'} tone={first ? 'answer' : 'mark'}>
              {name}
            </Text>
            <Text tone="soft">{` ${suspectKind(suspect)}`}</Text>
          </Text>
          <Text variant="heading" level={null} style={styles.fixed}>
            {percentWords(stated(suspect.probability))}
          </Text>
        </View>
        {reason === undefined ? null : <Text variant="small">{reason}</Text>}
        {open ? <Details suspect={suspect} others={others} /> : null}
        <View style={styles.actions}>
          {more ? (
            <Button
              kind="quiet"
              label={open ? 'Less' : 'Why, and what against'}
              aria-label={`${open ? 'Less' : 'Why, and what against'}: ${name} ${suspectKind(suspect)}`.trim()}
              aria-expanded={open}
              onPress={() => setOpen(!open)}
            />
          ) : null}
          {open && suspect.socket !== null ? (
            <Button kind="quiet" label={`Show ${suspect.socket}`} onPress={() => onShow(suspect.socket as string)} />
          ) : null}
        </View>
      </View>
    </View>
  );
}

function Details({ suspect, others }: { suspect: Suspect; others: readonly string[] }) {
  const styles = useStyles();
  return (
    <View style={styles.details}>
      {others.map((reason) => (
        <Text key={reason} variant="small">
          {reason}
        </Text>
      ))}
      <Named title="Explains" items={suspect.explains} />
      <Named title="Speaks against it" items={suspect.contradicts} />
      {suspect.modes.map(({ mode, intermittent, words, probability }) => (
        <Text key={`${mode}${intermittent}`} variant="small" tone="soft">
          {`${words}: ${percentWords(probability)}`}
        </Text>
      ))}
    </View>
  );
}

function Named({ title, items }: { title: string; items: readonly string[] }) {
  if (items.length === 0) return null;
  return (
    <Text variant="small">
      <Text variant="smallStrong">{`${title}: `}</Text>
      <Text variant="codeSmall">{items.join(', ')}</Text>
    </Text>
  );
}

const useStyles = makeStyles((t) => ({
  entry: {
    flexDirection: 'row',
    gap: t.space.md,
    paddingVertical: t.space.md,
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.rule,
  },
  rank: {
    width: t.space.xl + t.space.hair,
    height: t.space.xl + t.space.hair,
    marginTop: t.space.xs,
    alignItems: 'center',
    justifyContent: 'center',
    borderWidth: t.line.ink,
    borderColor: t.colours.mark,
    borderRadius: t.radius.round,
  },
  rankFirst: { backgroundColor: t.colours.pencil, borderColor: t.colours.pencil },
  words: { flex: 1, minWidth: 0, gap: t.space.xs },
  head: { flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', gap: t.space.sm },
  fixed: { flexShrink: 0 },
  name: { flexShrink: 1 },
  details: { gap: t.space.xs },
  actions: { flexDirection: 'row', flexWrap: 'wrap', marginLeft: -t.space.sm },
}));
