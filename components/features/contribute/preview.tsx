import { useMemo, useState } from 'react';
import { View } from 'react-native';
import { BoardSketch } from '@/components/board/board-sketch';
import { noMarks, type SketchMarks, type SocketMark } from '@/components/board/sketch-types';
import { useSketchView } from '@/components/board/use-sketch-view';
import { CodeMeaning } from '@/components/features/boards/code-meaning';
import { ExampleList } from '@/components/features/boards/example-list';
import { arrayWords } from '@/components/features/boards/board-facts';
import type { Bench } from '@/components/features/diagnose/bench';
import { makeStyles } from '@/components/theme';
import { SelectField } from '@/components/ui/select-field';
import { Text } from '@/components/ui/text';
import { listWords, sentenceCase } from '@/lib/layout/words';

type PreviewProps = { bench: Bench; leftOut: readonly string[] };

/** The layout as it stands: its sketch, and what a code means on it. */
export function Preview({ bench, leftOut }: PreviewProps) {
  const styles = useStyles();
  const { board } = bench.document;
  const [view, setView] = useSketchView(bench.index);
  const [blamed, setBlamed] = useState<readonly string[]>([]);
  const [chosen, setChosen] = useState<string | null>(null);
  const format = bench.formats.find(({ definition }) => definition.id === chosen) ?? bench.formats[0];
  const marks = useMemo(() => marksOf(blamed), [blamed]);
  return (
    <View style={styles.all}>
      <View>
        <Text variant="heading">{`${board.maker} ${board.name}, rev ${board.revision}`}</Text>
        <Text
          variant="small"
          tone="soft"
        >{`${arrayWords(bench.document)}, ${bench.document.sockets.length} sockets.`}</Text>
        {leftOut.length === 0 ? null : (
          <Text variant="small" tone="mark">
            {sentenceCase(
              `${listWords(leftOut, 12)} cannot be read and ${leftOut.length === 1 ? 'is' : 'are'} left out here.`,
            )}
          </Text>
        )}
      </View>
      <BoardSketch index={bench.index} marks={marks} view={view} onView={setView} label={`Sketch of ${board.name}`} />
      {format === undefined ? (
        <Text tone="soft">There is no report format that can be tried.</Text>
      ) : (
        <>
          {bench.formats.length > 1 ? (
            <SelectField
              label="Report format to try"
              options={bench.formats.map(({ definition }) => ({ value: definition.id, label: definition.name }))}
              value={format.definition.id}
              onChange={(id) => {
                setChosen(id);
                setBlamed([]);
              }}
            />
          ) : null}
          <CodeMeaning key={format.definition.id} bench={bench} format={format} slug={null} onSockets={setBlamed} />
        </>
      )}
      <View style={styles.examples}>
        <Text variant="subheading">Worked examples</Text>
        <ExampleList bench={bench} />
      </View>
    </View>
  );
}

function marksOf(blamed: readonly string[]): SketchMarks {
  if (blamed.length === 0) return noMarks;
  const sockets = new Map(blamed.map((label): [string, SocketMark] => [label, { state: 'plain', outlined: true }]));
  return { sockets, sharedParts: new Map(), outlinedMeans: 'named by the code' };
}

const useStyles = makeStyles((t) => ({ all: { gap: t.space.lg }, examples: { gap: t.space.sm } }));
