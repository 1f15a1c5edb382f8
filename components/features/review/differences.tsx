import { useState, type ReactNode } from 'react';
import { View } from 'react-native';
import { namesWords, sectionsWords } from '@/components/features/boards/difference-words';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Text } from '@/components/ui/text';
import type { FormatDifference, LayoutDifference } from '@/lib/layout/difference';
import { holdsOther } from '@/lib/layout/part-difference';
import { bankWords, sentenceCase } from '@/lib/layout/words';

type DifferencesProps = { difference: LayoutDifference; before: number; after: number };

/** Lines of one list that stand before one asks for more. */
const firstLines = 12;

/** What has changed between two versions, in words: the codes first, then lanes, sockets and the rest; and what stayed. */
export function Differences({ difference, before, after }: DifferencesProps) {
  const styles = useStyles();
  const { lanes, sameLanes, formats, sockets, sharedParts, sections } = difference;
  const codes = formats.flatMap((format) => format.changed.map((code) => ({ format, code })));
  // What a socket holds is told by its lanes already.
  const held = new Set(lanes.flatMap(({ before: was, after: now }) => [...was, ...now]));
  const others = sockets.filter(({ label, words }) => words !== holdsOther || !held.has(label));
  const things = [...others, ...sharedParts];
  const nothing = codes.length + lanes.length + things.length === 0;
  return (
    <View style={styles.all}>
      <View style={styles.part}>
        <Text variant="heading" level={3}>
          Changed
        </Text>
        {nothing ? <Text>{`No code, lane, socket or shared part differs from version ${before}.`}</Text> : null}
        <Lines
          label="Codes that name another socket"
          lines={codes.map(({ format, code }) => ({
            key: `${format.id}/${code.text}`,
            name: code.text,
            value: `${format.name}: named ${namesWords(code.before)}, now names ${namesWords(code.after)}`,
          }))}
        />
        <Lines
          label="Lanes that other sockets hold"
          lines={lanes.map(({ bank, bit, before: was, after: now }) => ({
            key: `${bank}/${bit}`,
            name: now.join(', ') || was.join(', '),
            value: sentenceCase(
              `bit ${bit} of ${bankWords(bank)}: in ${namesWords(was)} before, in ${namesWords(now)} now`,
            ),
          }))}
        />
        <Lines
          label="Sockets and shared parts"
          lines={things.map(({ label, words }) => ({
            key: `${label} ${words}`,
            name: label,
            value: sentenceCase(words),
          }))}
        />
        <Formats formats={formats} />
        {sections.length === 0 ? null : (
          <Text variant="small">{sentenceCase(`also changed: ${sectionsWords(difference)}.`)}</Text>
        )}
      </View>
      <View style={styles.part}>
        <Text variant="heading" level={3}>
          The same
        </Text>
        <Lines label="The same" lines={sameLines({ sameLanes, formats, after })} />
      </View>
    </View>
  );
}

function sameLines({
  sameLanes,
  formats,
  after,
}: {
  sameLanes: number;
  formats: readonly FormatDifference[];
  after: number;
}) {
  const kept = formats.filter(({ state, codes }) => state === 'kept' && codes > 0);
  return [
    { key: 'lanes', name: `${sameLanes} lanes`, value: `In the same sockets in version ${after}` },
    ...kept.map(({ id, name, codes, changed }) => ({
      key: id,
      name: `${codes - changed.length} codes`,
      value: `${name}: name the same sockets`,
    })),
  ];
}

function Formats({ formats }: { formats: readonly FormatDifference[] }) {
  const words = formats.flatMap(({ name, state, changed, reworded }) => {
    if (state === 'new') return [`“${name}” is a new report format.`];
    if (state === 'gone') return [`“${name}” is no longer there.`];
    return reworded && changed.length === 0
      ? [`“${name}” is described otherwise; its codes name the same sockets.`]
      : [];
  });
  return words.map((sentence) => (
    <Text key={sentence} variant="small">
      {sentence}
    </Text>
  ));
}

type LinesProps = { label: string; lines: readonly { key: string; name: string; value: ReactNode }[] };

function Lines({ label, lines }: LinesProps) {
  const styles = useStyles();
  const [all, setAll] = useState(false);
  if (lines.length === 0) return null;
  return (
    <View>
      <View role="list" aria-label={label}>
        {lines.slice(0, all ? lines.length : firstLines).map(({ key, name, value }) => (
          <View key={key} role="listitem" style={styles.line}>
            <View style={styles.name}>
              <Text variant="codeSmall">{name}</Text>
            </View>
            <View style={styles.value}>
              <Text variant="small">{value}</Text>
            </View>
          </View>
        ))}
      </View>
      {lines.length > firstLines && !all ? (
        <Button kind="quiet" label={`Show all ${lines.length}`} onPress={() => setAll(true)} style={styles.more} />
      ) : null}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.xl, paddingTop: t.space.md },
  part: { flexGrow: 1, flexShrink: 1, flexBasis: t.measure.form / 2 + t.space.huge, gap: t.space.md, minWidth: 0 },
  line: {
    flexDirection: 'row',
    alignItems: 'baseline',
    gap: t.space.md,
    paddingVertical: t.space.sm,
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.rule,
  },
  name: { flexBasis: 0, flexGrow: 2, minWidth: 0 },
  value: { flexBasis: 0, flexGrow: 5, minWidth: 0 },
  more: { alignSelf: 'flex-start' },
}));
