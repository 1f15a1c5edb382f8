import { useMemo, useRef, useState } from 'react';
import { View } from 'react-native';
import { useSubmitLayout } from '@/components/api/layout-versions';
import { benchOf } from '@/components/features/diagnose/bench';
import { makeStyles } from '@/components/theme';
import { useAnnouncer } from '@/components/ui/announcer';
import { Notice } from '@/components/ui/notice';
import { Page } from '@/components/ui/page';
import { Panel } from '@/components/ui/panel';
import { Split } from '@/components/ui/split';
import { EmptyState } from '@/components/ui/states';
import { Text } from '@/components/ui/text';
import { useDebounced } from '@/components/ui/use-debounced';
import type { VersionRow } from '@/shared/api/layouts';
import { checkText } from './check-text';
import { Documents } from './documents';
import type { KeptText } from './kept-text';
import { OwnVersions } from './own-versions';
import { Preview } from './preview';
import { problemCount, ProblemList } from './problem-list';
import { StartFrom } from './start-from';
import { SubmitBar } from './submit-bar';
import { TextArea, type TextAreaHandle } from './text-area';
import { useWriting } from './use-writing';

/** Time in ms after the last key before the text is checked: a large layout takes a tenth of a second. */
const pause = 250;

/** A layout document, written or brought as a file, checked while it is written, and sent. */
export function ImportPage({ personId }: { personId: string }) {
  const styles = useStyles();
  const { toast } = useAnnouncer();
  const writing = useWriting(personId);
  const { text, instead } = writing;
  const settled = useDebounced(text, pause);
  const checked = useMemo(() => checkText(settled), [settled]);
  const bench = useMemo(() => (checked.document === null ? null : benchOf(checked.document)), [checked.document]);
  const area = useRef<TextAreaHandle>(null);
  const submit = useSubmitLayout();
  const [sent, setSent] = useState<VersionRow | null>(null);

  const put = (next: KeptText, what: string) => {
    const before = writing.replace(next);
    submit.reset();
    setSent(null);
    const undo = { label: 'Put the old text back', onPress: () => void writing.replace(before) };
    toast({ text: what, ...(before.text.trim() === '' || before.text === next.text ? {} : { action: undo }) });
  };
  const send = () => {
    const now = checkText(text);
    if (now.sent === null || now.errors > 0) return;
    submit.mutate(
      { document: now.sent, instead },
      {
        onSuccess: ({ version }) => {
          setSent(version);
          writing.replace({ text: '', instead: null });
        },
      },
    );
  };

  return (
    <Page title="Add a board" hideTitle width="full">
      <Split
        mainLabel="Layout document"
        asideLabel="Preview"
        main={
          <>
            <View style={styles.head}>
              <Text variant="title" level={1}>
                Add a board
              </Text>
              <Text tone="soft">
                Paste a layout document or choose a file. It is checked while you write, and kept on this device until
                it is sent.
              </Text>
            </View>
            {sent === null ? null : <Sent version={sent} />}
            <StartFrom empty={text.trim() === ''} ready={writing.ready} onPut={put} />
            <TextArea
              ref={area}
              label="Layout document, JSON"
              value={text}
              onChange={writing.type}
              describedBy="document-check"
              invalid={checked.errors > 0}
            />
            <View id="document-check" role="status">
              <Text
                variant="strong"
                tone={checked.errors > 0 ? 'pencil' : checked.problems.length > 0 ? 'mark' : 'tick'}
              >
                {problemCount(checked)}
              </Text>
            </View>
            <SubmitBar
              checked={checked}
              settled={settled === text}
              instead={instead}
              busy={submit.isPending}
              failure={submit.error}
              onSend={send}
              onNew={() => put({ text, instead: null }, 'It will be sent as a new version.')}
            />
            <ProblemList checked={checked} onShow={(place) => area.current?.show(place)} />
          </>
        }
        aside={
          <>
            {bench === null ? (
              <EmptyState title={text.trim() === '' ? 'The sketch appears here.' : 'There is no sketch yet.'}>
                {text.trim() === ''
                  ? 'As soon as board, memory and sockets can be read, the board is drawn, and codes can be tried on it.'
                  : 'Board, memory and sockets have to be without errors of form first.'}
              </EmptyState>
            ) : (
              <Preview bench={bench} leftOut={checked.leftOut} />
            )}
            <OwnVersions onPut={put} />
            <Panel title="The document">
              <Documents />
            </Panel>
          </>
        }
      />
    </Page>
  );
}

function Sent({ version: { maker, name, revision, number } }: { version: VersionRow }) {
  return (
    <Notice kind="good" live title={`Version ${number} is with the moderators.`}>
      {`${maker} ${name}, rev ${revision}. You get a mail when one of them has decided; its state is under “What you have sent”.`}
    </Notice>
  );
}

const useStyles = makeStyles((t) => ({ head: { gap: t.space.xs } }));
