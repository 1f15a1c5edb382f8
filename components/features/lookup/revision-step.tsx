import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import { keptLayoutQuery, layoutQuery } from '@/components/api/layouts';
import { makeStyles } from '@/components/theme';
import { ButtonLink } from '@/components/ui/button';
import { Page } from '@/components/ui/page';
import { Text } from '@/components/ui/text';
import type { LayoutCard } from '@/shared/api/layouts';
import type { BoardFamily } from './find-boards';

/** Look-up, between its steps: revisions differ in which socket is which, so the marks are compared first. */
export function RevisionStep({ family, kept }: { family: BoardFamily; kept: ReadonlySet<string> }) {
  const styles = useStyles();
  return (
    <Page
      title="Which revision?"
      over={`${family.maker} ${family.name}`}
      lead="The same code can mean another socket on another revision. Compare the marks with the board."
      width="prose"
    >
      <View role="list" aria-label="Revisions" style={styles.list}>
        {family.revisions.map((card) => (
          <Revision key={card.slug} card={card} onDevice={kept.has(card.slug)} />
        ))}
      </View>
      <ButtonLink kind="quiet" href="/" label="Another board" style={styles.back} />
    </Page>
  );
}

function Revision({ card, onDevice }: { card: LayoutCard; onDevice: boolean }) {
  const styles = useStyles();
  // Opening a board keeps it on the device, so a look at the marks already makes the look-up work in the cellar.
  const served = useQuery(layoutQuery(card.slug));
  const device = useQuery(keptLayoutQuery(card.slug));
  const board = (served.data ?? device.data)?.document.board;
  return (
    <View role="listitem" style={styles.revision}>
      <Text variant="heading">{`Revision ${card.revision}`}</Text>
      {board === undefined ? (
        <Text variant="small" tone="soft">
          {served.isError ? 'Its marks did not arrive.' : 'Fetching its marks…'}
        </Text>
      ) : board.marks.length === 0 ? (
        <Text variant="small" tone="soft">
          Nobody has noted what to look for. Read the revision off the board itself.
        </Text>
      ) : (
        <View role="list" aria-label={`What to look for on revision ${card.revision}`}>
          <Text variant="smallStrong">Look for</Text>
          {board.marks.map((mark) => (
            <View key={mark} role="listitem" style={styles.mark}>
              <Text aria-hidden tone="pencil">
                –
              </Text>
              <Text style={styles.words}>{mark}</Text>
            </View>
          ))}
        </View>
      )}
      <ButtonLink
        kind="primary"
        href={{ pathname: '/boards/[slug]/diagnose', params: { slug: card.slug } }}
        label={`It is revision ${card.revision}`}
        style={styles.choose}
      />
      {onDevice ? (
        <Text variant="fine" tone="tick">
          ✓ works without network
        </Text>
      ) : null}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  list: { gap: t.space.lg },
  revision: {
    gap: t.space.sm,
    padding: t.space.lg,
    backgroundColor: t.colours.sheet,
    borderTopWidth: t.line.thin,
    borderBottomWidth: t.line.thin,
    borderColor: t.colours.rule,
    borderLeftWidth: t.line.bar,
    borderLeftColor: t.colours.ink,
  },
  mark: { flexDirection: 'row', gap: t.space.sm },
  words: { flexShrink: 1 },
  choose: { alignSelf: 'flex-start' },
  back: { alignSelf: 'flex-start' },
}));
