import { useInfiniteQuery, useQueryClient } from '@tanstack/react-query';
import { useLocalSearchParams } from 'expo-router';
import { useEffect, useRef, useState } from 'react';
import { View } from 'react-native';
import { boardName, layoutListQuery, layoutQuery } from '@/components/api/layouts';
import { problemWords } from '@/components/api/problem';
import { makeStyles } from '@/components/theme';
import { FileButton } from '@/components/ui/file-button';
import { SelectField } from '@/components/ui/select-field';
import { Text } from '@/components/ui/text';
import { tooLarge } from './check-text';
import type { KeptText } from './kept-text';

type StartFromProps = {
  /** Nothing is written yet. */
  empty: boolean;
  ready: boolean;
  onPut: (next: KeptText, what: string) => void;
};

/** Ways to fill the field: a file, or a published board to start from. */
export function StartFrom({ empty, ready, onPut }: StartFromProps) {
  const styles = useStyles();
  const [problem, setProblem] = useState<string | null>(null);
  const take = async (file: File) => {
    setProblem(tooLarge(file.size));
    if (tooLarge(file.size) !== null) return;
    try {
      const text = await file.text();
      // Some editors put a mark before the first character, which is no JSON.
      onPut({ text: text.replace(/^\uFEFF/, ''), instead: null }, `${file.name} is in the field.`);
    } catch {
      setProblem(`${file.name} cannot be read.`);
    }
  };
  return (
    <View style={styles.all}>
      <View style={styles.row}>
        <FileButton
          label="Choose a file"
          inputLabel="Layout document as a file"
          accept=".json,application/json"
          onFile={(file) => void take(file)}
        />
        <View style={styles.choice}>
          <BoardChoice empty={empty} ready={ready} onPut={onPut} onProblem={setProblem} />
        </View>
      </View>
      {problem === null ? null : (
        <Text role="alert" variant="smallStrong" tone="pencil">
          {problem}
        </Text>
      )}
    </View>
  );
}

type BoardChoiceProps = StartFromProps & { onProblem: (problem: string | null) => void };

function BoardChoice({ empty, ready, onPut, onProblem }: BoardChoiceProps) {
  const queryClient = useQueryClient();
  const { from } = useLocalSearchParams<{ from?: string }>();
  const { data } = useInfiniteQuery(layoutListQuery());
  const boards = data?.pages.flatMap(({ items }) => items) ?? [];
  const start = async (slug: string) => {
    onProblem(null);
    try {
      const { document } = await queryClient.fetchQuery(layoutQuery(slug));
      const text = `${JSON.stringify(document, null, 2)}\n`;
      onPut({ text, instead: null }, `${boardName(document.board)} is in the field, to be changed.`);
    } catch (error) {
      onProblem(problemWords(error));
    }
  };
  // A link that names a board fills an empty field, once. What somebody was writing stays until he chooses himself.
  const began = useRef(false);
  useEffect(() => {
    if (!ready || began.current || from === undefined) return;
    began.current = true;
    if (empty) void start(from);
    // eslint-disable-next-line react-hooks/exhaustive-deps -- once, when it is known what was left here
  }, [ready]);
  return (
    <SelectField
      label="Start from a published board"
      value=""
      options={[
        { value: '', label: 'Choose…' },
        ...boards.map((card) => ({ value: card.slug, label: boardName(card) })),
      ]}
      onChange={(slug) => {
        if (slug !== '') void start(slug);
      }}
    />
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.sm },
  row: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-end', gap: t.space.md },
  choice: { flexGrow: 1, flexShrink: 1, flexBasis: t.target * 4 },
}));
