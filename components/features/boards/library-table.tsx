import { View } from 'react-native';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { Link } from '@/components/ui/link';
import { Table, type Column } from '@/components/ui/table';
import { Text } from '@/components/ui/text';
import { boardFacts } from '@/components/features/lookup/find-boards';
import type { LayoutCard } from '@/shared/api/layouts';
import { familyLabel } from './library-link';

type LibraryTableProps = { rows: readonly LayoutCard[]; kept: ReadonlySet<string> };

/** Published boards: a ruled table where there is room, a stack of entries on a phone. */
export function LibraryTable({ rows, kept }: LibraryTableProps) {
  const phone = useBreakpoint() === 'phone';
  return (
    <Table
      caption="Published boards"
      hideCaption
      columns={phone ? phoneColumns(kept) : wideColumns(kept)}
      rows={rows}
      rowKey={({ slug }) => slug}
    />
  );
}

const chipWords = ({ families }: LayoutCard) => families.map(familyLabel).join('; ');

const kindWords = ({ kind, year }: LayoutCard) => [kind === 'other' ? '' : kind, year].filter(Boolean).join(', ');

function wideColumns(kept: ReadonlySet<string>): Column<LayoutCard>[] {
  return [
    { key: 'board', header: 'Board', share: 3, cell: (card) => <BoardLink card={card} /> },
    { key: 'maker', header: 'Maker', share: 2, cell: ({ maker }) => maker },
    { key: 'kind', header: 'Kind, year', share: 1.7, cell: kindWords },
    { key: 'banks', header: 'Banks', share: 0.7, align: 'right', cell: ({ banks }) => banks },
    { key: 'bits', header: 'Bits', share: 0.6, align: 'right', cell: ({ dataBits }) => dataBits },
    { key: 'sockets', header: 'Sockets', share: 0.8, align: 'right', cell: ({ sockets }) => sockets },
    { key: 'chips', header: 'Chips', share: 2.4, cell: (card) => <Text variant="small">{chipWords(card)}</Text> },
    {
      key: 'kept',
      header: 'On this device',
      share: 1.2,
      cell: ({ slug }) => (kept.has(slug) ? <Kept words="✓ kept" /> : <Text tone="soft">no</Text>),
    },
  ];
}

function phoneColumns(kept: ReadonlySet<string>): Column<LayoutCard>[] {
  return [
    {
      key: 'board',
      header: 'Board',
      cell: (card) => <Entry card={card} kept={kept.has(card.slug)} />,
    },
  ];
}

/** All of a board in one entry: named lines under one another would make the list four times as long. */
function Entry({ card, kept }: { card: LayoutCard; kept: boolean }) {
  const styles = useStyles();
  return (
    <View>
      <BoardLink card={card} />
      <Text variant="small">{card.maker}</Text>
      <Text variant="small" tone="soft">
        {boardFacts(card)}
      </Text>
      <View style={styles.foot}>
        <Text variant="fine" tone="soft">
          {chipWords(card)}
        </Text>
        {kept ? <Kept words="✓ works without network" /> : null}
      </View>
    </View>
  );
}

function BoardLink({ card: { slug, name, revision } }: { card: LayoutCard }) {
  return (
    <Link href={{ pathname: '/boards/[slug]', params: { slug } }} standalone>
      {`${name}, rev ${revision}`}
    </Link>
  );
}

function Kept({ words }: { words: string }) {
  return (
    <Text variant="small" tone="tick">
      {words}
    </Text>
  );
}

const useStyles = makeStyles((t) => ({
  foot: { flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'space-between', columnGap: t.space.md },
}));
