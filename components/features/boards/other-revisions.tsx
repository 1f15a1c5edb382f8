import { useInfiniteQuery, useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { View } from 'react-native';
import { keptLayoutsQuery, layoutListQuery, useBoardLayout } from '@/components/api/layouts';
import { benchOf, type Bench } from '@/components/features/diagnose/bench';
import { makeStyles } from '@/components/theme';
import { Link } from '@/components/ui/link';
import { Panel } from '@/components/ui/panel';
import { Text } from '@/components/ui/text';
import { compareLayouts } from '@/lib/layout/difference';
import type { LayoutCard } from '@/shared/api/layouts';
import { differenceSentences } from './difference-words';

type OtherRevisionsProps = { bench: Bench; slug: string };

/** Other revisions of the same board, each with what differs. Nothing where this is the only one that is known. */
export function OtherRevisions({ bench, slug }: OtherRevisionsProps) {
  const styles = useStyles();
  const revisions = useRevisions(bench, slug);
  if (revisions.length === 0) return null;
  return (
    <Panel title="Other revisions">
      <View role="list" aria-label="Other revisions" style={styles.list}>
        {revisions.map((card) => (
          <Revision key={card.slug} card={card} bench={bench} />
        ))}
      </View>
    </Panel>
  );
}

function Revision({ card, bench }: { card: LayoutCard; bench: Bench }) {
  const styles = useStyles();
  const { layout, pending } = useBoardLayout(card.slug);
  const other = layout === null ? null : benchOf(layout.document);
  const sentences = useMemo(
    () => (other === null ? [] : differenceSentences(compareLayouts(bench.index, other.index))),
    [bench, other],
  );
  return (
    <View role="listitem" style={styles.revision}>
      <Link href={{ pathname: '/boards/[slug]', params: { slug: card.slug } }} standalone>
        {`Revision ${card.revision}`}
      </Link>
      {other === null ? (
        <Text variant="small" tone="soft">
          {pending ? 'Comparing…' : 'It did not arrive, so it cannot be compared.'}
        </Text>
      ) : (
        sentences.map((sentence) => (
          <Text key={sentence} variant="small">
            {sentence}
          </Text>
        ))
      )}
    </View>
  );
}

/** Most revisions that are compared at once: each is a whole document. */
const mostRevisions = 8;

function useRevisions({ document }: Bench, slug: string): readonly LayoutCard[] {
  const { maker, name } = document.board;
  const served = useInfiniteQuery(layoutListQuery({ maker, q: name }));
  const kept = useQuery(keptLayoutsQuery);
  return useMemo(() => {
    const found = new Map<string, LayoutCard>();
    for (const card of [...(served.data?.pages.flatMap(({ items }) => items) ?? []), ...(kept.data ?? [])]) {
      if (card.slug !== slug && card.maker === maker && card.name === name) found.set(card.slug, card);
    }
    const byRevision = (a: LayoutCard, b: LayoutCard) => a.revision.localeCompare(b.revision, 'en', { numeric: true });
    return [...found.values()].sort(byRevision).slice(0, mostRevisions);
  }, [served.data, kept.data, slug, maker, name]);
}

const useStyles = makeStyles((t) => ({
  list: { gap: t.space.sm },
  revision: { gap: t.space.xs, paddingBottom: t.space.sm },
}));
