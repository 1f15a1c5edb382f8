import { useEffect, type ReactNode } from 'react';
import { View } from 'react-native';
import { boardName } from '@/components/api/layouts';
import type { Bench } from '@/components/features/diagnose/bench';
import { rememberBoard, toggleStar, useDeviceBoards } from '@/components/features/lookup/device-boards';
import { useShowBoardInHeader } from '@/components/features/shell/current-board';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { Button, ButtonLink } from '@/components/ui/button';
import { Page } from '@/components/ui/page';
import { Tabs } from '@/components/ui/tabs';
import { Text } from '@/components/ui/text';
import { factsLine } from './board-facts';
import { useBoardLink, type BoardTab } from './board-link';
import { CodesTab } from './codes-tab';
import { MapTab } from './map-tab';
import { SourcesTab } from './sources-tab';
import { VersionsTab } from './versions-tab';

/** Between Codes and Sources stands what failed on such boards before, once there are reports of failures. */
const tabs: readonly { value: BoardTab; label: string }[] = [
  { value: 'map', label: 'Map' },
  { value: 'codes', label: 'Codes' },
  { value: 'sources', label: 'Sources' },
  { value: 'versions', label: 'Versions' },
];

type BoardPageProps = {
  bench: Bench;
  slug: string;
  /** Which version this is, in words. */
  version: string;
  notice: ReactNode;
};

/** A board that is there: its name, what it is, and the parts of its page. */
export function BoardPage({ bench, slug, version, notice }: BoardPageProps) {
  const styles = useStyles();
  const phone = useBreakpoint() === 'phone';
  const { tab, change } = useBoardLink();
  const { board } = bench.document;
  const name = boardName(board);
  useShowBoardInHeader(`${board.name}, rev ${board.revision}`, slug);
  useEffect(() => rememberBoard({ slug, name }), [slug, name]);
  return (
    <Page title={name} hideTitle width="full">
      <View style={[styles.head, phone && styles.headPhone]}>
        <View style={styles.words}>
          <Text variant={phone ? 'title' : 'display'} level={1}>
            {name}
          </Text>
          <Text tone="soft">{factsLine(bench.document, version)}</Text>
        </View>
        <View style={styles.actions}>
          <StarButton slug={slug} name={name} />
          <ButtonLink
            kind="primary"
            href={{ pathname: '/boards/[slug]/diagnose', params: { slug } }}
            label="Look up a failure"
          />
        </View>
        {notice === null ? null : <View style={styles.notice}>{notice}</View>}
      </View>
      <Tabs
        label={name}
        tabs={tabs}
        value={tab}
        onChange={(next) => change({ tab: next === 'map' ? undefined : next })}
        bleed
      >
        <TabPanel tab={tab} bench={bench} slug={slug} />
      </Tabs>
    </Page>
  );
}

function TabPanel({ tab, bench, slug }: { tab: BoardTab; bench: Bench; slug: string }) {
  switch (tab) {
    case 'map':
      return <MapTab bench={bench} slug={slug} />;
    case 'codes':
      return <CodesTab bench={bench} slug={slug} />;
    case 'sources':
      return <SourcesTab bench={bench} />;
    case 'versions':
      return <VersionsTab bench={bench} slug={slug} />;
  }
}

function StarButton({ slug, name }: { slug: string; name: string }) {
  const { starred } = useDeviceBoards();
  const star = starred.some((one) => one.slug === slug);
  return (
    <Button label={star ? 'Starred' : 'Star'} kind="plain" pressed={star} onPress={() => toggleStar({ slug, name })} />
  );
}

const useStyles = makeStyles((t) => ({
  head: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'center',
    justifyContent: 'space-between',
    gap: t.space.md,
    paddingHorizontal: t.space.xl,
    paddingTop: t.space.lg,
    paddingBottom: t.space.xs,
  },
  headPhone: { paddingHorizontal: t.space.lg },
  words: { flexGrow: 1, flexShrink: 1, flexBasis: t.measure.form - t.space.huge * 2, gap: t.space.hair },
  actions: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
  notice: { flexBasis: '100%' },
}));
