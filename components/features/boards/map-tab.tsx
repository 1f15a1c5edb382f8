import { useMemo } from 'react';
import { View } from 'react-native';
import { BoardSketch } from '@/components/board/board-sketch';
import { noMarks, type PickTarget, type SketchMarks, type SocketMark } from '@/components/board/sketch-types';
import { useSketchView } from '@/components/board/use-sketch-view';
import type { Bench } from '@/components/features/diagnose/bench';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Split } from '@/components/ui/split';
import { Text } from '@/components/ui/text';
import { servedLanes } from '@/lib';
import { socketsOfLane } from '@/lib/layout/difference';
import { ArrayFacts } from './array-facts';
import { useBoardLink } from './board-link';
import { MarksToCompare } from './marks-to-compare';
import { OtherRevisions } from './other-revisions';
import { PartDetails } from './part-details';
import { SocketDetails } from './socket-details';

type MapTabProps = { bench: Bench; slug: string };

/** The board's sketch, and what is known of the socket or shared part that was tapped. */
export function MapTab({ bench, slug }: MapTabProps) {
  const styles = useStyles();
  const breakpoint = useBreakpoint();
  const [phone, wide] = [breakpoint === 'phone', breakpoint === 'wide'];
  const { at, change } = useBoardLink();
  const [view, setView] = useSketchView(bench.index);
  const picked = useMemo(() => targetOf(bench, at), [bench, at]);
  const marks = useMemo(() => marksOf(bench, picked), [bench, picked]);
  const pick = ({ label }: PickTarget) => change({ at: label === at ? undefined : label });
  const close = () => change({ at: undefined });
  const details = picked === null ? null : <Details bench={bench} target={picked} onPick={pick} />;
  // One under the other, the marks come first: they decide whether the sketch may be believed.
  const facts = <ArrayFacts document={bench.document} />;
  return (
    <>
      <Split
        mainLabel="Sketch"
        asideLabel={picked === null ? 'Compare the board' : picked.label}
        main={
          <>
            <BoardSketch
              index={bench.index}
              marks={marks}
              view={view}
              onView={setView}
              onPick={pick}
              picked={picked}
              label={`Sketch of ${bench.document.board.name}`}
            />
            <Text variant="small" tone="soft">
              Tap a socket to see what it holds and which codes would name it; tap a shared part to see what it serves.
            </Text>
            {wide ? facts : null}
          </>
        }
        aside={
          <View style={styles.aside}>
            {details !== null && !phone ? (
              <>
                {details}
                <Button label="Done with it" onPress={close} style={styles.close} />
              </>
            ) : (
              <>
                <MarksToCompare board={bench.document.board} />
                <OtherRevisions bench={bench} slug={slug} />
              </>
            )}
            {wide ? null : facts}
          </View>
        }
      />
      {phone && picked !== null ? (
        <Dialog open onClose={close} title={picked.label}>
          {details}
        </Dialog>
      ) : null}
    </>
  );
}

type DetailsProps = { bench: Bench; target: PickTarget; onPick: (target: PickTarget) => void };

function Details({ bench, target, onPick }: DetailsProps) {
  return target.kind === 'socket' ? (
    <SocketDetails bench={bench} label={target.label} onPick={onPick} />
  ) : (
    <PartDetails bench={bench} label={target.label} onPick={onPick} />
  );
}

function targetOf({ index, document }: Bench, label: string | null): PickTarget | null {
  if (label === null) return null;
  if (index.socketByLabel.has(label)) return { kind: 'socket', label };
  return document.sharedParts.some((part) => part.label === label) ? { kind: 'shared-part', label } : null;
}

/** With a shared part chosen, the sockets that it serves stand out. */
function marksOf({ index, document }: Bench, picked: PickTarget | null): SketchMarks {
  const part = picked?.kind === 'shared-part' && document.sharedParts.find(({ label }) => label === picked.label);
  if (!part) return noMarks;
  const served = new Set(servedLanes(index, part).flatMap((lane) => socketsOfLane(index, lane)));
  // Around all sockets the line would say nothing.
  if (served.size === document.sockets.length) return noMarks;
  const sockets = new Map(
    [...served].map((label): [string, SocketMark] => [label, { state: 'plain', outlined: true }]),
  );
  return { sockets, sharedParts: new Map(), outlinedMeans: `served by ${part.label}` };
}

const useStyles = makeStyles((t) => ({ aside: { gap: t.space.xl }, close: { alignSelf: 'flex-start' } }));
