import { useLocalSearchParams, useRouter } from 'expo-router';
import { useEffect, useRef, useState } from 'react';
import type { TextInput } from 'react-native';
import { useBreakpoint } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Page } from '@/components/ui/page';
import { DeviceBoards } from './device-boards-list';
import { FoundBoards } from './found-boards';
import { RevisionStep } from './revision-step';
import { useBoardSearch } from './use-board-search';

/** Look-up, first step: which board is on the bench. The second is the board's workspace. */
export function LookupScreen() {
  const router = useRouter();
  const { board } = useLocalSearchParams<{ board?: string }>();
  const [text, setText] = useState('');
  const search = useBoardSearch(text);
  const family = search.families.find(({ revisions }) => revisions.some(({ slug }) => slug === board));
  const phone = useBreakpoint() === 'phone';
  const field = useRef<TextInput>(null);
  const choosing = board === undefined;
  useEffect(() => {
    // On a phone the keyboard would cover the recent boards, which are what is wanted most of the time.
    if (!phone && choosing) field.current?.focus();
  }, [phone, choosing]);

  if (family !== undefined) return <RevisionStep family={family} kept={search.kept} />;
  return (
    <Page
      title="Which board is on the bench?"
      lead="Then type what it reported, and read which chip to pull."
      width="prose"
    >
      <Field
        ref={field}
        label="Board"
        hint="Maker, name or revision, or a word from the marks on the copper."
        value={text}
        onChangeText={setText}
        inputMode="search"
        autoCorrect={false}
        autoComplete="off"
        trailing={text === '' ? undefined : <Button kind="quiet" label="Clear" onPress={() => setText('')} />}
      />
      {text.trim() === '' ? <DeviceBoards kept={search.kept} /> : null}
      <FoundBoards
        search={search}
        text={text}
        onBoard={({ revisions }) => router.push({ pathname: '/', params: { board: revisions[0]?.slug } })}
      />
    </Page>
  );
}
