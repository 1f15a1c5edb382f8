import { useState } from 'react';
import { View } from 'react-native';
import { BoardSketch } from '@/components/board/board-sketch';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Text } from '@/components/ui/text';
import { AnswerCard } from './answer/answer-card';
import { Cautions } from './answer/cautions';
import { Expectations } from './answer/expectations';
import { NextChecks } from './answer/next-checks';
import { Questions } from './answer/questions';
import { SuspectList } from './answer/suspect-list';
import { EntryPanel } from './entry/entry-panel';
import { ReportStrip } from './runs/report-strip';
import { ChangePanel } from './runs/change-panel';
import { RunList } from './runs/run-list';
import { RevisionNote } from './revision-note';
import type { WorkspaceModel } from './use-workspace-model';
import { awaitsReport } from './workspace-runs';
import { WorkspaceTools } from './workspace-tools';

type ColumnsProps = { model: WorkspaceModel; onPrint: () => void };

/** The workspace in one column, two or three, by the room that the window gives. */
export function WorkspaceColumns({ model, onPrint }: ColumnsProps) {
  const breakpoint = useBreakpoint();
  if (breakpoint === 'phone') return <OneColumn model={model} onPrint={onPrint} />;
  return <SideBySide model={model} onPrint={onPrint} />;
}

/** The phone: one thing at a time, the answer first. */
function OneColumn({ model, onPrint }: ColumnsProps) {
  const styles = useStyles();
  const { step, view } = model.workspace;
  const [tools, setTools] = useState(view !== null);
  if (step.at === 'entry') {
    return (
      <View style={styles.column}>
        <EntryPanel
          model={model}
          between={
            <>
              <Sketch model={model} compact />
              {model.workspace.runs.length > 1 && awaitsReport(model.workspace.runs) ? <Checks model={model} /> : null}
              <RevisionNote document={model.bench.document} slug={model.workspace.slug} />
            </>
          }
          keysAtFoot
        />
      </View>
    );
  }
  if (step.at === 'change') {
    return (
      <View style={styles.column}>
        <ChangeStep model={model} />
        <Sketch model={model} compact />
      </View>
    );
  }
  return (
    <View style={styles.answer}>
      <ReportStrip model={model} />
      <AnswerCard bench={model.bench} runs={model.workspace.runs} diagnosis={model.diagnosis} />
      <View style={styles.column}>
        <Sketch model={model} compact={!tools} />
        <Button
          kind="quiet"
          label={tools ? 'Put the view tools away' : 'Turn, mirror, zoom, table'}
          aria-expanded={tools}
          onPress={() => setTools(!tools)}
          style={styles.start}
        />
        <Open model={model} />
        <Checks model={model} />
        <SuspectList diagnosis={model.diagnosis} onShow={model.open} />
        <Runs model={model} />
        <Cautions cautions={model.diagnosis.cautions} />
        <WorkspaceTools model={model} onPrint={onPrint} />
      </View>
    </View>
  );
}

/** Runs at the left, the sketch in the middle, the suspects at the right; on middling windows the sketch goes over the suspects. */
function SideBySide({ model, onPrint }: ColumnsProps) {
  const styles = useStyles();
  const wide = useBreakpoint() === 'wide';
  const { step } = model.workspace;
  const left = (
    <View role="region" aria-label="Runs" style={styles.left}>
      {model.workspace.runs.length > 0 ? <Runs model={model} /> : null}
      {step.at === 'entry' ? <EntryPanel model={model} /> : null}
      {step.at === 'change' ? <ChangeStep model={model} /> : null}
      <WorkspaceTools model={model} onPrint={onPrint} />
    </View>
  );
  const answer =
    model.diagnosis.evidence.length === 0 ? (
      <NoReportYet model={model} />
    ) : (
      <>
        {awaitsReport(model.workspace.runs) ? (
          <Text variant="small" tone="soft">
            As it stands before the report of this run:
          </Text>
        ) : null}
        <AnswerCard bench={model.bench} runs={model.workspace.runs} diagnosis={model.diagnosis} />
        <Open model={model} />
        <Checks model={model} />
        <SuspectList diagnosis={model.diagnosis} onShow={model.open} />
        <Cautions cautions={model.diagnosis.cautions} />
      </>
    );
  if (!wide) {
    return (
      <View style={styles.columns}>
        {left}
        <View style={styles.middle}>
          {answer}
          <Sketch model={model} />
        </View>
      </View>
    );
  }
  return (
    <View style={styles.columns}>
      {left}
      <View role="region" aria-label="Board" style={styles.middle}>
        <Sketch model={model} />
      </View>
      <View role="region" aria-label="Suspects and checks" style={styles.right}>
        {answer}
      </View>
    </View>
  );
}

/** What stands in the place of the answer before there is one. */
function NoReportYet({ model: { bench, workspace } }: { model: WorkspaceModel }) {
  const styles = useStyles();
  return (
    <View style={styles.waiting}>
      <View style={styles.step}>
        <Text variant="heading" level={2}>
          The answer will stand here
        </Text>
        <Text tone="soft">Type what the board reports. The sockets that it can still mean stand out as you type.</Text>
      </View>
      <RevisionNote document={bench.document} slug={workspace.slug} />
    </View>
  );
}

function Sketch({ model, compact = false }: { model: WorkspaceModel; compact?: boolean }) {
  const { bench, marks, view, setView, picked, onPick } = model;
  return (
    <BoardSketch
      {...{ index: bench.index, marks, view, picked, onPick, compact }}
      onView={setView}
      showControls={!compact}
    />
  );
}

function Checks({ model }: { model: WorkspaceModel }) {
  const { bench, workspace, saw } = model;
  if (workspace.step.at === 'change') return null;
  if (awaitsReport(workspace.runs)) {
    return <Expectations bench={bench} runs={workspace.runs} onSaw={(outcome) => saw([], outcome)} />;
  }
  return (
    <NextChecks
      diagnosis={model.diagnosis}
      onDone={(done) => {
        if ('enter' in done) model.enter(done.enter.tab, done.enter.text);
        else model.begin(done.changes);
      }}
      onSaw={saw}
      onOther={() => model.beginChange()}
    />
  );
}

/** What is open in the evidence, and the answers to choose from. */
function Open({ model: { diagnosis, settled, settleBy } }: { model: WorkspaceModel }) {
  return (
    <Questions
      questions={diagnosis.questions}
      next={diagnosis.nextChecks[0]?.label ?? ''}
      settles={(answer) => settled(answer) !== null}
      onAnswer={settleBy}
    />
  );
}

function ChangeStep({ model }: { model: WorkspaceModel }) {
  const styles = useStyles();
  return (
    <View style={styles.step}>
      <Text variant="title">What was done?</Text>
      <ChangePanel
        bench={model.bench}
        draft={model.change}
        onDraft={model.setChange}
        onDone={model.finishChange}
        onCancel={() => model.workspace.goTo({ at: 'answer' })}
      />
    </View>
  );
}

function Runs({ model }: { model: WorkspaceModel }) {
  const styles = useStyles();
  const { bench, workspace, diagnosis } = model;
  return (
    <View style={styles.step}>
      <Text variant="heading" level={2}>
        Runs
      </Text>
      <RunList
        bench={bench}
        runs={workspace.runs}
        diagnosis={diagnosis}
        onEdit={(place) => workspace.goTo({ at: 'entry', place })}
        onTakeOut={model.takeOut}
        onRemoveRun={model.takeBack}
        onComplete={model.markWhole}
      />
      {workspace.step.at === 'answer' ? (
        <View style={styles.step}>
          <Button label="It reported more" onPress={() => workspace.goTo({ at: 'entry', place: null })} />
          <Button label="Something was done" onPress={() => model.beginChange()} />
        </View>
      ) : null}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  column: { padding: t.space.lg, gap: t.space.lg, flexGrow: 1 },
  answer: { flexGrow: 1 },
  columns: { flexDirection: 'row', flexGrow: 1, alignItems: 'stretch' },
  left: {
    flexBasis: 0,
    flexGrow: 22,
    minWidth: t.measure.sideLeast,
    maxWidth: t.measure.sideMost,
    padding: t.space.xl,
    gap: t.space.xl,
    borderRightWidth: t.line.thin,
    borderRightColor: t.colours.ruleStrong,
  },
  middle: {
    flexBasis: 0,
    flexGrow: 52,
    minWidth: 0,
    padding: t.space.xl,
    gap: t.space.lg,
    backgroundColor: t.colours.sheet,
  },
  right: {
    flexBasis: 0,
    flexGrow: 26,
    minWidth: t.measure.sideLeast,
    padding: t.space.xl,
    gap: t.space.xl,
    borderLeftWidth: t.line.thin,
    borderLeftColor: t.colours.ruleStrong,
  },
  step: { gap: t.space.md },
  waiting: { gap: t.space.xl },
  start: { alignSelf: 'flex-start' },
}));
