import { View } from 'react-native';
import { BoardSketch } from '@/components/board/board-sketch';
import type { SketchMarks, SketchView } from '@/components/board/sketch-types';
import { makeStyles } from '@/components/theme';
import { createDomElement } from '@/components/ui/dom-element';
import { percentWords } from '@/components/ui/percent';
import { Text } from '@/components/ui/text';
import { Wordmark } from '@/components/features/shell/wordmark';
import { addressWords } from '@/lib/layout/words';
import type { Diagnosis, Evidence, Run } from '@/shared';
import { stated } from '../stated';
import { leadingSuspects, suspectKind, suspectName } from '../answer/suspect-words';
import type { Bench } from '../bench';
import { measuredSupplies } from '../answer/measured';
import { evidenceWords, runTitle } from '../evidence-words';
import { placeWords } from '../runs/word-places';
import { pullSteps } from './pull-steps';

type PullSheetProps = {
  bench: Bench;
  runs: readonly Run[];
  diagnosis: Diagnosis;
  marks: SketchMarks;
  view: SketchView;
};

/** Suspects, and pieces of evidence of a run, that fit on one page. */
const mostSuspects = 4;
const mostEvidence = 8;
/** Patterns, decoded places of one piece of evidence, and measured supplies that fit. */
const mostPatterns = 2;
const mostPlaces = 3;
const mostSupplies = 6;
/** Suspects below this probability are left to the screen. */
const leastPrinted = 0.01;

/** One page for the bench: what was reported, what to pull, how sure, the steps, and blanks to fill in by hand. */
export function PullSheet({ bench, runs, diagnosis, marks, view }: PullSheetProps) {
  const styles = useStyles();
  const { board } = bench.document;
  const said = diagnosis.sentences.slice(0, 4);
  const patterns = diagnosis.signatures.slice(0, mostPatterns).map(({ words }) => words);
  return (
    <View aria-hidden dataSet={{ paper: 'pull-sheet' }} style={styles.page}>
      {createDomElement('style', { children: paperRules })}
      <View style={styles.head}>
        <View style={styles.words}>
          <Text variant="heading" level={1}>{`${board.maker} ${board.name}, revision ${board.revision}`}</Text>
          <Text variant="small">Pull sheet. Compare the revision with the board before you pull anything.</Text>
        </View>
        <Wordmark />
      </View>
      <View style={styles.blanks}>
        <Blank label="Date" />
        <Blank label="Technician" />
        <Blank label="Serial number" />
      </View>
      <View style={styles.answer}>
        <Text variant="title" level={2}>
          {diagnosis.headline}
        </Text>
        <Text variant="small">
          {diagnosis.probability === null ? '' : `${percentWords(stated(diagnosis.probability))}. `}
          {[...said, ...patterns.filter((words) => !said.join(' ').includes(words))].join(' ')}
        </Text>
      </View>
      <View style={styles.columns}>
        <View style={styles.left}>
          <BoardSketch
            {...{ index: bench.index, marks, view: { ...view, table: false, zoom: 'whole' } }}
            onView={ignore}
            print
            compact={false}
            showControls={false}
            greatestHeight={360}
          />
        </View>
        <View style={styles.right}>
          <Reported bench={bench} runs={runs} diagnosis={diagnosis} />
          <Suspects diagnosis={diagnosis} />
          <Open diagnosis={diagnosis} />
        </View>
      </View>
      <View style={styles.columns}>
        <View style={styles.left}>
          <Text variant="smallStrong" level={3}>
            Steps
          </Text>
          {pullSteps(bench, diagnosis).map((step) => (
            <View key={step} style={styles.step}>
              <View style={styles.box} />
              <Text variant="small" style={styles.words}>
                {step}
              </Text>
            </View>
          ))}
        </View>
        <View style={styles.right}>
          <Text variant="smallStrong" level={3}>
            Measured at the socket
          </Text>
          <MeasuredOnPaper bench={bench} runs={runs} />
        </View>
      </View>
      <View style={styles.cautions}>
        {diagnosis.cautions.map(({ id, text }) => (
          <Text key={id} variant="fine">
            {text}
          </Text>
        ))}
      </View>
    </View>
  );
}

// Until it is printed the sheet lies beside the page, where the sketch can measure itself. Type made for a screen at
// arm's length is smaller on paper, so that all of it fits one page of A4 or Letter.
const paperRules = `
@page { margin: 12mm; }
@media print { [data-paper] { position: static !important; width: auto !important; background: none !important; zoom: 0.85; } }
`;

const ignore = () => undefined;

function Reported({ bench, runs, diagnosis }: Pick<PullSheetProps, 'bench' | 'runs' | 'diagnosis'>) {
  const placesOf = (run: number, index: number) =>
    diagnosis.evidence.find((one) => one.run === run && one.index === index)?.words ?? [];
  return (
    <View>
      <Text variant="smallStrong" level={3}>
        {runs.some(({ evidence }) => evidence.some(({ kind }) => kind === 'finding'))
          ? 'What it reported and what was found'
          : 'What it reported'}
      </Text>
      {runs.map((run, at) => (
        <View key={at}>
          <Text variant="small">{runTitle(run, at)}</Text>
          {printed(run).map(({ seen, index }) => {
            const { text, note } = evidenceWords(seen, bench, runs.slice(0, at + 1));
            return (
              <View key={index}>
                <Text variant="codeSmall">
                  {text}
                  <Text variant="fine">{`  ${note}`}</Text>
                </Text>
                {placesOf(at, index)
                  .slice(0, mostPlaces)
                  .map((place, nth) => (
                    <Text key={nth} variant="fine">
                      {`${addressWords(bench.document.addressMap, place.address)}: ${placeWords(bench.index, place)}`}
                    </Text>
                  ))}
              </View>
            );
          })}
          {run.evidence.length > mostEvidence ? (
            <Text variant="fine">{`and ${run.evidence.length - mostEvidence} more`}</Text>
          ) : null}
        </View>
      ))}
    </View>
  );
}

/** The evidence of a run that is printed: where it is too much, what was found at the bench before the rest. */
function printed({ evidence }: Run): { seen: Evidence; index: number }[] {
  const all = evidence.map((seen, index) => ({ seen, index }));
  const found = all.filter(({ seen }) => seen.kind === 'finding');
  const others = all.filter(({ seen }) => seen.kind !== 'finding');
  const room = Math.max(1, mostEvidence - found.length);
  return [...others.slice(0, room), ...found].slice(0, mostEvidence).sort((a, b) => a.index - b.index);
}

function Suspects({ diagnosis }: { diagnosis: Diagnosis }) {
  const styles = useStyles();
  const suspects = leadingSuspects(diagnosis).filter(({ probability }) => probability >= leastPrinted);
  if (suspects.length === 0) return null;
  return (
    <View style={styles.suspects}>
      <Text variant="smallStrong" level={3}>
        Suspects
      </Text>
      {suspects.slice(0, mostSuspects).map((suspect) => (
        <View key={suspect.id} style={styles.suspect}>
          <Text variant="codeSmall">{`${suspect.rank}  ${suspectName(suspect)}`}</Text>
          <Text variant="small" style={styles.words}>
            {suspectKind(suspect)}
          </Text>
          <Text variant="smallStrong">{percentWords(stated(suspect.probability))}</Text>
        </View>
      ))}
    </View>
  );
}

/** What nobody knows yet, with boxes to tick once it is known. */
function Open({ diagnosis: { questions } }: { diagnosis: Diagnosis }) {
  const styles = useStyles();
  return questions.map(({ ask, answers }) => (
    <View key={ask} style={styles.suspects}>
      <Text variant="smallStrong" level={3}>
        {ask}
      </Text>
      {answers.slice(0, mostSuspects).map(({ words, share }) => (
        <View key={words} style={styles.step}>
          <View style={styles.box} />
          <Text variant="small" style={styles.words}>
            {words}
          </Text>
          <Text variant="small">{percentWords(stated(share))}</Text>
        </View>
      ))}
    </View>
  ));
}

/** What was measured, and blanks for the rails that were not. */
function MeasuredOnPaper({ bench, runs }: Pick<PullSheetProps, 'bench' | 'runs'>) {
  const { rails } = bench.document;
  const measured = measuredSupplies(bench, runs).slice(0, mostSupplies);
  const done = new Set(measured.map(({ pin }) => pin));
  const blanks = rails.filter(({ pins }) => !pins.some((pin) => done.has(pin)));
  return (
    <>
      {measured.map(({ text, verdict }) => (
        <Text key={text} variant="fine">
          {`${text}. ${verdict}`.trim()}
        </Text>
      ))}
      {blanks.slice(0, mostSupplies - measured.length).map(({ name, pins }) => (
        <Blank key={name} label={`${name}, pin ${pins.join(' and ')}`} />
      ))}
      {rails.length === 0 && measured.length === 0 ? <Blank label="Supply" /> : null}
    </>
  );
}

function Blank({ label }: { label: string }) {
  const styles = useStyles();
  return (
    <View style={styles.blank}>
      <Text variant="fine">{label}</Text>
      <View style={styles.line} />
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  page: {
    gap: t.space.md,
    position: 'absolute',
    top: 0,
    left: -t.measure.page * 2,
    width: t.measure.prose,
    backgroundColor: t.colours.sheet,
  },
  head: {
    flexDirection: 'row',
    justifyContent: 'space-between',
    alignItems: 'flex-end',
    gap: t.space.lg,
    paddingBottom: t.space.sm,
    borderBottomWidth: t.line.ink,
    borderBottomColor: t.colours.ink,
  },
  words: { flex: 1, minWidth: 0 },
  blanks: { flexDirection: 'row', gap: t.space.lg },
  blank: {
    flexGrow: 1,
    flexBasis: 'auto',
    maxHeight: t.space.xl,
    flexDirection: 'row',
    alignItems: 'flex-end',
    gap: t.space.sm,
    minHeight: t.space.xl,
  },
  line: { flex: 1, minWidth: t.space.huge, borderBottomWidth: t.line.thin, borderBottomColor: t.colours.ink },
  answer: { gap: t.space.xs, paddingVertical: t.space.sm },
  columns: { flexDirection: 'row', gap: t.space.xl },
  left: { flexBasis: 0, flexGrow: 5, minWidth: 0, gap: t.space.xs },
  right: { flexBasis: 0, flexGrow: 3, minWidth: 0, gap: t.space.sm },
  suspects: { gap: t.space.xs },
  suspect: { flexDirection: 'row', alignItems: 'baseline', gap: t.space.sm },
  step: { flexDirection: 'row', gap: t.space.sm, alignItems: 'flex-start' },
  box: {
    width: t.space.lg,
    height: t.space.lg,
    marginTop: t.space.hair,
    borderWidth: t.line.thin,
    borderColor: t.colours.ink,
  },
  cautions: {
    gap: t.space.hair,
    paddingTop: t.space.sm,
    borderTopWidth: t.line.thin,
    borderTopColor: t.colours.ink,
  },
}));
