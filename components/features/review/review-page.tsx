import { useMemo, useState } from 'react';
import { View } from 'react-native';
import { BoardSketch } from '@/components/board/board-sketch';
import { noMarks } from '@/components/board/sketch-types';
import { useSketchView } from '@/components/board/use-sketch-view';
import { arrayWords, familyCounts } from '@/components/features/boards/board-facts';
import { ExampleList } from '@/components/features/boards/example-list';
import { SourceList } from '@/components/features/boards/source-list';
import { stateWords } from '@/components/features/boards/version-words';
import type { Bench } from '@/components/features/diagnose/bench';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { dateWords } from '@/components/ui/date-words';
import { Link } from '@/components/ui/link';
import { Page } from '@/components/ui/page';
import { Panel } from '@/components/ui/panel';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { Split } from '@/components/ui/split';
import { ErrorState, Loading } from '@/components/ui/states';
import { Text } from '@/components/ui/text';
import { compareLayouts } from '@/lib/layout/difference';
import type { ReviewDetail } from '@/shared/api/layouts';
import { DecisionBar } from './decision-bar';
import { differenceMarks } from './difference-marks';
import { Differences } from './differences';
import { ProblemsOf } from './problems-of';

/** The version that is published now. */
export type Published =
  | { readonly state: 'none' }
  | { readonly state: 'loading'; readonly number: number }
  | { readonly state: 'failed'; readonly number: number; readonly retry: () => void }
  | { readonly state: 'ready'; readonly number: number; readonly bench: Bench };

type ReviewPageProps = { review: ReviewDetail; bench: Bench; published: Published };

/** A version beside the published one: what a code means now, what proves it, and the decision. */
export function ReviewPage({ review, bench, published }: ReviewPageProps) {
  const styles = useStyles();
  const phone = useBreakpoint() === 'phone';
  const { maker, name, revision, number } = review;
  const title = `${name}, rev ${revision}, version ${number}`;
  const beside = published.state === 'none' ? '' : ` beside ${published.number}`;
  return (
    <Page title={`${title}, review`} hideTitle width="full">
      <View style={[styles.head, phone && styles.headPhone]}>
        <View style={styles.words}>
          <Text variant="title" level={1}>{`${title}${beside}`}</Text>
          <Text variant="small" tone="soft">
            {`${maker}. ${sentOf(review)}`}
          </Text>
        </View>
        <DecisionBar review={review} />
      </View>
      <Split
        mainLabel="What a code means now"
        asideLabel="Proof"
        main={<Comparison bench={bench} published={published} review={review} />}
        aside={<Proof bench={bench} review={review} />}
      />
    </Page>
  );
}

function sentOf(review: ReviewDetail): string {
  const by = review.own ? 'you' : (review.author?.name ?? 'an account that is gone');
  const sent = `Sent by ${by}, ${dateWords(review.submittedAt)}.`;
  return review.state === 'submitted' ? sent : `${sent} Now: ${stateWords(review)}.`;
}

function Comparison({ bench, published, review }: ReviewPageProps) {
  if (published.state === 'ready')
    return <BesidePublished bench={bench} published={published} number={review.number} />;
  return (
    <>
      {published.state === 'loading' ? <Loading label="Fetching the published version" lines={3} /> : null}
      {published.state === 'failed' ? (
        <ErrorState
          title={`Version ${published.number}, which is published, did not arrive.`}
          onRetry={published.retry}
        >
          Without it the differences cannot be shown.
        </ErrorState>
      ) : null}
      {published.state === 'none' ? <Text variant="heading">A board that is not published yet</Text> : null}
      <Sketch bench={bench} />
    </>
  );
}

type Shown = 'differences' | 'before' | 'now';

type BesideProps = { bench: Bench; published: Extract<Published, { state: 'ready' }>; number: number };

function BesidePublished({ bench, published, number }: BesideProps) {
  const styles = useStyles();
  const [shown, setShown] = useState<Shown>('differences');
  const difference = useMemo(
    () => compareLayouts(published.bench.index, bench.index),
    [published.bench.index, bench.index],
  );
  const marks = useMemo(() => differenceMarks(bench.document, difference), [bench.document, difference]);
  return (
    <>
      <View style={styles.choice}>
        <Text variant="heading">What a code means now</Text>
        <SegmentedControl
          label="What the sketch shows"
          options={[
            { value: 'differences', label: 'Differences' },
            { value: 'before', label: `Version ${published.number}` },
            { value: 'now', label: `Version ${number}` },
          ]}
          value={shown}
          onChange={setShown}
        />
      </View>
      {shown === 'before' ? (
        <Sketch key="before" bench={published.bench} />
      ) : (
        <Sketch key="now" bench={bench} marks={shown === 'differences' ? marks : noMarks} />
      )}
      <Differences difference={difference} before={published.number} after={number} />
    </>
  );
}

function Sketch({ bench, marks = noMarks }: { bench: Bench; marks?: typeof noMarks }) {
  const [view, setView] = useSketchView(bench.index);
  return (
    <BoardSketch
      index={bench.index}
      marks={marks}
      view={view}
      onView={setView}
      label={`Sketch of ${bench.document.board.name}`}
    />
  );
}

function Proof({ bench, review }: { bench: Bench; review: ReviewDetail }) {
  const styles = useStyles();
  const { document } = bench;
  return (
    <>
      <Panel title="Check">
        <ProblemsOf problems={review.problemList} />
      </Panel>
      <Panel title="Worked examples" note="Run now, on this version.">
        <ExampleList bench={bench} />
      </Panel>
      <Panel title="Sources">
        <SourceList sources={document.sources} />
      </Panel>
      <Panel title="The board">
        <View style={styles.facts}>
          <Text variant="small">{`${arrayWords(document)}, ${document.sockets.length} sockets.`}</Text>
          <Text variant="small">
            {`${familyCounts(document)
              .map(({ sockets, name }) => `${sockets} for ${name}`)
              .join('; ')}.`}
          </Text>
          <Text variant="small">
            {document.reportFormats.length === 0
              ? 'No report format.'
              : `Report formats: ${document.reportFormats.map(({ name }) => name).join(', ')}.`}
          </Text>
          <Text variant="small">
            {document.board.marks.length === 0
              ? 'No marks to compare the revision by.'
              : `Marks: ${document.board.marks.join('; ')}.`}
          </Text>
          <Link
            href={{ pathname: '/boards/[slug]', params: { slug: review.slug, version: String(review.number) } }}
            standalone
          >
            Open it as a board, with all its codes
          </Link>
        </View>
      </Panel>
    </>
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
    paddingVertical: t.space.md,
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.ruleStrong,
  },
  headPhone: { paddingHorizontal: t.space.lg },
  words: { flexShrink: 1, flexGrow: 1, flexBasis: t.measure.form - t.space.huge * 2 },
  choice: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'center',
    justifyContent: 'space-between',
    gap: t.space.md,
  },
  facts: { gap: t.space.xs },
}));
