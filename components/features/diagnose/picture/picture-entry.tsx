import { useMemo, useState } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Chip } from '@/components/ui/chip';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { Text } from '@/components/ui/text';
import { lanesOfMarks, lanesWords, markWords, pictureWords, type LayoutIndex } from '@/lib';
import { sentenceCase } from '@/lib/layout/words';
import type { Picture, ScreenMap } from '@/shared';
import { ColourChoice } from './colour-choice';
import { ColumnStrip } from './column-strip';
import { MarkFields } from './mark-fields';
import {
  draftProblem,
  drawn,
  faultShapes,
  inHand,
  mostMarks,
  newDraft,
  pictureOf,
  withMark,
  withNewMark,
  withoutMark,
  withShape,
  type PictureDraft,
} from './picture-draft';
import { ScreenSketch } from './screen-sketch';

type PictureEntryProps = {
  index: LayoutIndex;
  onEvidence: (picture: Picture) => void;
  onClose: () => void;
  /** The picture that is being changed. */
  before?: Picture;
};

/** What is wrong with the picture, marked on a sketch of the screen. Only for boards with a screen map. */
export function PictureEntry({ index, ...rest }: PictureEntryProps) {
  const map = index.document.screenMap;
  if (map === undefined) return <Text tone="soft">It is not known how this board keeps its picture.</Text>;
  return <MapEntry index={index} map={map} {...rest} />;
}

/** Repeats of more columns than this are not drawn one by one. */
const mostEnlarged = 16;

/** Height of the sketch beyond which the questions under it would be out of sight, px. */
const greatestHeight = 300;

function MapEntry({ index, map, onEvidence, onClose, before }: PictureEntryProps & { map: ScreenMap }) {
  const styles = useStyles();
  const [draft, setDraft] = useState(() => newDraft(map, before));
  const hand = inHand(draft);
  const picture = useMemo(() => pictureOf(map, draft), [map, draft]);
  const tooMany = picture.marks.length > mostMarks ? `take marks out: at most ${mostMarks} can be sent.` : null;
  const problem = draftProblem(draft) ?? tooMany;
  return (
    <View style={styles.all}>
      <Text variant="small" tone="soft">
        {hints[hand.shape]}
      </Text>
      <SegmentedControl
        label="What is wrong"
        options={faultShapes}
        value={hand.shape}
        onChange={(shape) => setDraft(withShape(map, draft, shape))}
      />
      <ScreenSketch
        map={map}
        marks={draft.marks.map(({ mark }) => mark)}
        at={draft.at}
        label={`The screen. ${pictureWords(map, picture).text}`}
        onDraw={(from, to) => setDraft(withMark(draft, drawn(map, hand, [from, to])))}
        greatestHeight={greatestHeight}
      />
      <Strip draft={draft} onDraft={setDraft} />
      <ColourChoice map={map} mark={hand.mark} onChange={(mark) => setDraft(withMark(draft, { ...hand, mark }))} />
      <MarkFields map={map} draft={hand} onChange={(next) => setDraft(withMark(draft, next))} />
      <Marks map={map} draft={draft} onDraft={setDraft} />
      <Meaning index={index} map={map} picture={picture} problem={problem} />
      <View style={styles.row}>
        <Button
          kind="primary"
          label="Use this picture"
          disabled={problem !== null}
          onPress={() => onEvidence(picture)}
        />
        <Button label="Cancel" onPress={onClose} />
      </View>
    </View>
  );
}

const hints = {
  columns: 'Touch the screen where a column is wrong; go down to say from which line to which.',
  lines: 'Go down the screen over the lines that are wrong.',
  dots: 'Touch the dot that is wrong, or go over a group of them.',
  whole: 'The fault is all over the picture. Say below how it looks.',
} as const;

type DraftProps = { draft: PictureDraft; onDraft: (draft: PictureDraft) => void };

function Strip({ draft, onDraft }: DraftProps) {
  const { shape, mark } = inHand(draft);
  const name = shape === 'columns' ? 'column' : shape === 'lines' ? 'line' : null;
  const every = name === 'column' ? mark.everyX : mark.everyY;
  if (name === null || every === undefined || every < 2 || every > mostEnlarged) return null;
  const span = name === 'column' ? mark.x : mark.y;
  const choose = (first: number) => {
    const moved: [number, number] = [first, first + span[1] - span[0]];
    onDraft(withMark(draft, { shape, mark: { ...mark, ...(name === 'column' ? { x: moved } : { y: moved }) } }));
  };
  return <ColumnStrip name={name} every={every} span={span} onChoose={choose} />;
}

function Marks({ map, draft, onDraft }: DraftProps & { map: ScreenMap }) {
  const styles = useStyles();
  const several = draft.marks.length > 1;
  return (
    <View role="group" aria-label="Marks on the picture" style={styles.row}>
      {several
        ? draft.marks.map((_, at) => (
            <Chip
              key={at}
              label={`Mark ${at + 1}`}
              selected={at === draft.at}
              onPress={() => onDraft({ ...draft, at })}
            />
          ))
        : null}
      <Button
        kind="quiet"
        label="Another mark"
        disabled={draft.marks.length >= mostMarks}
        onPress={() => onDraft(withNewMark(map, draft))}
      />
      {several ? (
        <Button kind="quiet" label={`Take mark ${draft.at + 1} out`} onPress={() => onDraft(withoutMark(draft))} />
      ) : null}
      <Chip
        label="The rest of the picture is right"
        selected={draft.rest === 'right'}
        onPress={() => onDraft({ ...draft, rest: draft.rest === 'right' ? 'unknown' : 'right' })}
      />
    </View>
  );
}

type MeaningProps = { index: LayoutIndex; map: ScreenMap; picture: Picture; problem: string | null };

/** The marks in words, and the bits that they point to. */
function Meaning({ index, map, picture, problem }: MeaningProps) {
  const styles = useStyles();
  const read = useMemo(() => (problem === null ? lanesOfMarks(index, picture) : null), [index, picture, problem]);
  const lanes =
    read === null
      ? ''
      : lanesWords(
          index,
          read.failing.map(({ lane }) => lane),
        );
  return (
    <View role="status" style={styles.meaning}>
      {picture.marks.flatMap((mark, at) =>
        markWords(map, mark).map((words, n) => <Text key={`${at}/${n}`}>{`${sentenceCase(words)}.`}</Text>),
      )}
      {lanes === '' ? null : <Text variant="strong">{`That is ${lanes}.`}</Text>}
      {[...(problem === null ? [] : [sentenceCase(problem)]), ...(read?.problems ?? [])].map((words) => (
        <Text key={words} variant="smallStrong" tone="pencil">
          {words}
        </Text>
      ))}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  row: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: t.space.sm },
  meaning: { gap: t.space.xs },
}));
