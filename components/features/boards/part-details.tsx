import { useMemo } from 'react';
import { View } from 'react-native';
import type { PickTarget } from '@/components/board/sketch-types';
import { partWordings } from '@/components/board/words';
import type { Bench } from '@/components/features/diagnose/bench';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Text } from '@/components/ui/text';
import { channelsOf, lanesWords, servedLanes } from '@/lib';
import { socketsOfLane } from '@/lib/layout/difference';
import { sentenceCase } from '@/lib/layout/words';
import { railWords, socketListWords } from './board-facts';
import { DetailLines } from './detail-lines';

type PartDetailsProps = { bench: Bench; label: string; onPick: (target: PickTarget) => void };

/** Sockets that stand as buttons; beyond that their names are listed. */
const mostButtons = 16;

/** A shared part that was tapped: what it is, what it serves, and which of its channels can fail alone. */
export function PartDetails({ bench, label, onPick }: PartDetailsProps) {
  const styles = useStyles();
  const phone = useBreakpoint() === 'phone';
  const { index, document } = bench;
  const part = document.sharedParts.find((one) => one.label === label);
  const facts = useMemo(() => {
    if (part === undefined) return null;
    const lanes = servedLanes(index, part);
    return {
      lanes,
      channels: channelsOf(index, part),
      sockets: [...new Set(lanes.flatMap((lane) => socketsOfLane(index, lane)))],
    };
  }, [index, part]);
  if (part === undefined || facts === null) return null;
  const rails = document.rails.filter(({ sharedPart }) => sharedPart === label);
  const { addressBits } = part.serves;
  const lines = [
    { key: 'serves', name: 'serves', value: sentenceCase(lanesWords(index, facts.lanes)) || 'no lane that is known' },
    ...(addressBits ? [{ key: 'address', name: 'address bits', value: addressBits.join(', ') }] : []),
    {
      key: 'channels',
      name: 'can fail alone',
      value:
        facts.channels.length === 0
          ? 'none of it: only as a whole'
          : channelWords(facts.channels.map(({ name }) => name)),
    },
    ...(rails.length > 0 ? [{ key: 'rails', name: 'rails', value: rails.map(railWords).join(', ') }] : []),
  ];
  return (
    <View style={styles.all}>
      <View>
        {phone ? null : (
          <Text variant="codeLarge" level={2} role="heading">
            {label}
          </Text>
        )}
        <Text>{`${sentenceCase(partWordings(part)[0] ?? '')}: a shared part, so its failure shows in every lane that it serves.`}</Text>
      </View>
      <DetailLines label={`What ${label} does`} lines={lines} />
      <View style={styles.part}>
        <Text variant="subheading">Sockets that it serves</Text>
        {facts.sockets.length > mostButtons ? (
          <Text variant="small">{sentenceCase(`${socketListWords(document, facts.sockets)}.`)}</Text>
        ) : (
          <View style={styles.sockets}>
            {facts.sockets.map((socket) => (
              <Button
                key={socket}
                kind="plain"
                label={socket}
                onPress={() => onPick({ kind: 'socket', label: socket })}
              />
            ))}
          </View>
        )}
      </View>
    </View>
  );
}

const addressBit = 'address bit ';

/** "D4, D5"; "address bits 0, 1, 2" rather than the word each time. */
function channelWords(names: readonly string[]): string {
  if (names.length < 2 || !names.every((name) => name.startsWith(addressBit))) return names.join(', ');
  return `address bits ${names.map((name) => name.slice(addressBit.length)).join(', ')}`;
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.xl },
  part: { gap: t.space.sm },
  sockets: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
