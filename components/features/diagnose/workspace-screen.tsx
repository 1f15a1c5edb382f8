import { View } from 'react-native';
import { useShowBoardInHeader } from '@/components/features/shell/current-board';
import { rememberBoard } from '@/components/features/lookup/device-boards';
import { Notice } from '@/components/ui/notice';
import { Page } from '@/components/ui/page';
import { ApiProblem } from '@/components/api/problem';
import { boardName } from '@/components/api/layouts';
import { useEffect, useRef, type RefObject } from 'react';
import { makeStyles } from '@/components/theme';
import { SocketPanel } from './answer/socket-panel';
import type { Bench } from './bench';
import { PullSheet } from './paper/pull-sheet';
import { usePrint } from './paper/use-print';
import { useKeepAwake } from './use-keep-awake';
import { useWorkspace } from './use-workspace';
import { useWorkspaceModel } from './use-workspace-model';
import { WorkspaceColumns } from './workspace-columns';

/** Longest name in characters that leaves the header one line on a phone, or two. */
const longestName = 44;

type WorkspaceScreenProps = { bench: Bench; fromDevice: boolean; error: Error | null };

/** The workspace of a board that is there. */
export function WorkspaceScreen({ bench, fromDevice, error }: WorkspaceScreenProps) {
  const styles = useStyles();
  const { board } = bench.document;
  const workspace = useWorkspace();
  const model = useWorkspaceModel(bench, workspace);
  const { printing, print } = usePrint();
  const short = `${board.name}, rev ${board.revision}`;
  const { slug } = workspace;
  useKeepAwake();
  useShowBoardInHeader(short.length > longestName ? `${short.slice(0, longestName)}…` : short, slug);
  const body = useRef<View>(null);
  useFocusOnStep(workspace.revision, body);
  useEffect(() => rememberBoard({ slug, name: boardName(board) }), [slug, board]);

  const { runs, diagnosis, marks, view } = { runs: workspace.runs, ...model };
  const title = diagnosis.outcome === 'no-evidence' ? short : `${diagnosis.headline} ${short}`;
  return (
    <Page title={title} hideTitle width="full">
      <View dataSet={{ print: 'hide' }}>
        {workspace.problems.length === 0 ? null : (
          <Notice kind="problem" live title="Not all of this link could be read. What could be is kept.">
            {workspace.problems.slice(0, 3).join(' ')}
          </Notice>
        )}
        {fromDevice && error instanceof ApiProblem && error.status === 404 ? (
          <Notice kind="warning" title="This board is no longer published.">
            You see the copy that is kept on this device.
          </Notice>
        ) : null}
      </View>
      <View ref={body} tabIndex={-1} dataSet={{ print: 'hide' }} style={styles.body}>
        <WorkspaceColumns model={model} onPrint={print} />
      </View>
      <SocketPanel
        bench={bench}
        slug={slug}
        diagnosis={diagnosis}
        socket={model.opened}
        onClose={() => model.open(null)}
        onChange={model.beginChange}
      />
      {printing ? <PullSheet {...{ bench, runs, diagnosis, marks, view }} /> : null}
    </Page>
  );
}

/** After a step the button that was pressed is often gone; the focus then goes to the workspace, not to nowhere. */
function useFocusOnStep(revision: string, body: RefObject<View | null>): void {
  const shown = useRef(revision);
  useEffect(() => {
    if (shown.current === revision) return;
    shown.current = revision;
    if (document.activeElement !== null && document.activeElement !== document.body) return;
    (body.current as unknown as HTMLElement | null)?.focus({ preventScroll: true });
  }, [revision, body]);
}

const useStyles = makeStyles(() => ({ body: { flexGrow: 1 } }));
