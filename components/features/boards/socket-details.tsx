import { useMemo } from 'react';
import { View } from 'react-native';
import type { PickTarget } from '@/components/board/sketch-types';
import { heldWords, partWordings } from '@/components/board/words';
import type { Bench } from '@/components/features/diagnose/bench';
import { lanesOf } from '@/components/features/diagnose/marks';
import { partsLink } from '@/components/features/parts/parts-link';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Link } from '@/components/ui/link';
import { Text } from '@/components/ui/text';
import { servedLanes } from '@/lib';
import { sentenceCase } from '@/lib/layout/words';
import type { ChipFamily, Socket } from '@/shared';
import { railWords, wordsCount } from './board-facts';
import { DetailLines } from './detail-lines';
import { SocketAddresses } from './socket-addresses';
import { codesOfSocket, type SocketCodes } from './socket-codes';
import { SocketPicture } from './socket-picture';

type SocketDetailsProps = { bench: Bench; label: string; onPick: (target: PickTarget) => void };

/** A socket that was tapped: what it holds, its chip, the codes that would name it, what it shares with others. */
export function SocketDetails({ bench, label, onPick }: SocketDetailsProps) {
  const styles = useStyles();
  const phone = useBreakpoint() === 'phone';
  const at = bench.index.socketByLabel.get(label);
  const codes = useMemo(() => (at === undefined ? [] : codesOfSocket(bench, at)), [bench, at]);
  const socket = at === undefined ? undefined : bench.document.sockets[at];
  if (at === undefined || socket === undefined) return null;
  const family = bench.index.familyOfSocket[at] ?? null;
  return (
    <View style={styles.all}>
      <View>
        {phone ? null : (
          <Text variant="codeLarge" level={2} role="heading">
            {label}
          </Text>
        )}
        <Text>{sentenceCase(`${heldWords(bench.index, at)}.`)}</Text>
      </View>
      <View style={styles.part}>
        <Text variant="subheading">Codes that name it</Text>
        <DetailLines
          label="Codes that name it"
          lines={codes.map((one) => ({ key: one.id, name: one.name, value: <Codes codes={one} /> }))}
        />
        {codes.length === 0 ? <Text tone="soft">No report format of this board is known.</Text> : null}
      </View>
      <SocketAddresses document={bench.document} at={at} />
      <SocketPicture index={bench.index} at={at} />
      <View style={styles.part}>
        <Text variant="subheading">Chip</Text>
        <DetailLines label="Chip" lines={chipLines({ bench, socket, family })} />
        <Link href={partsLink({ socket: socket.family })} variant="smallStrong" standalone>
          Will another chip fit?
        </Link>
      </View>
      <Served bench={bench} at={at} onPick={onPick} />
    </View>
  );
}

/** Codes of a chip that stand at once; a chip of eight bits has eight. */
const mostCodes = 16;

function Codes({ codes: { texts, oneOfMany, reason } }: { codes: SocketCodes }) {
  if (reason !== null) {
    return (
      <Text variant="small" tone="soft">
        {reason}
      </Text>
    );
  }
  return (
    <>
      <Text variant="code">{texts.slice(0, mostCodes).join('   ')}</Text>
      {texts.length > mostCodes ? <Text variant="fine">{`and ${texts.length - mostCodes} more`}</Text> : null}
      {oneOfMany ? (
        <Text variant="fine" tone="soft">
          for example; any address of its words
        </Text>
      ) : null}
    </>
  );
}

type ChipFacts = { bench: Bench; socket: Socket; family: ChipFamily | null };

function chipLines({ bench, socket, family }: ChipFacts) {
  const { rails } = bench.document;
  const measured = rails.filter(({ sockets }) => sockets === undefined || sockets.includes(socket.label));
  const line = (name: string, value: string) => ({ key: name, name, value });
  return [
    line('family', family?.name ?? `${socket.family}, which nobody has described`),
    ...(family && family.alsoCalled.length > 0 ? [line('also called', family.alsoCalled.join(', '))] : []),
    ...(family
      ? [line('size', `${wordsCount(family.words)} words of ${family.width} bit${family.width === 1 ? '' : 's'}`)]
      : []),
    ...(family?.rows
      ? [line('refresh', `${family.rows} rows${family.refreshMs ? ` in ${family.refreshMs} ms` : ''}`)]
      : []),
    line('pin 1 mark', `${socket.pin1.replace('-', ' ')}, the socket upright`),
    line('fixed', socket.soldered ? 'soldered in' : 'in a socket'),
    ...measured.map((rail) => line(`pin${rail.pins.length === 1 ? '' : 's'} ${rail.pins.join(', ')}`, railWords(rail))),
    ...(measured.length === 0 ? supplyLines(family) : []),
  ];
}

/** Without rails noted on this board, what the family asks for at its pins. */
function supplyLines(family: ChipFamily | null) {
  const supplies = family?.pins.filter(({ does }) => does === 'supply' || does === 'ground') ?? [];
  return supplies.map(({ pin, name }) => ({ key: `pin ${pin}`, name: `pin ${pin}`, value: `${name}, by its family` }));
}

function Served({ bench, at, onPick }: { bench: Bench; at: number; onPick: (target: PickTarget) => void }) {
  const styles = useStyles();
  const { index, document } = bench;
  const parts = useMemo(() => {
    const own = new Set(lanesOf(index, at));
    return document.sharedParts.filter((part) => servedLanes(index, part).some((lane) => own.has(lane)));
  }, [index, document, at]);
  return (
    <View style={styles.part}>
      <Text variant="subheading">Shared with others</Text>
      {parts.length === 0 ? <Text tone="soft">No shared part that serves it is known.</Text> : null}
      <View style={styles.parts}>
        {parts.map((part) => (
          <Button
            key={part.label}
            kind="plain"
            label={`${part.label}, ${partWordings(part)[0] ?? ''}`}
            onPress={() => onPick({ kind: 'shared-part', label: part.label })}
          />
        ))}
      </View>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.xl },
  part: { gap: t.space.sm },
  parts: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
