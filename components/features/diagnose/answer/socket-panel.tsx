import { View } from 'react-native';
import { heldWords } from '@/components/board/words';
import { makeStyles } from '@/components/theme';
import { Button, ButtonLink } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { percentWords } from '@/components/ui/percent';
import { Text } from '@/components/ui/text';
import { sentenceCase } from '@/lib/layout/words';
import type { Diagnosis } from '@/shared';
import type { Bench } from '../bench';
import { laneName, lanesOf } from '../marks';
import type { ChangeDraft } from '../runs/change-draft';
import { ShareBar } from './share-bar';

type SocketPanelProps = {
  bench: Bench;
  slug: string;
  diagnosis: Diagnosis;
  /** Label of the socket; null: closed. */
  socket: string | null;
  onClose: () => void;
  /** Something was done with its chip. */
  onChange: (draft: ChangeDraft) => void;
};

/** Codes of a chip that stand at once; a chip of eight bits in three formats has two dozen. */
const mostCodes = 12;

/** A socket that was tapped: what it holds, which codes would blame it, how far it is suspected. */
export function SocketPanel({ bench, slug, diagnosis, socket, onClose, onChange }: SocketPanelProps) {
  const styles = useStyles();
  const at = socket === null ? undefined : bench.index.socketByLabel.get(socket);
  if (socket === null || at === undefined) return null;
  const place = diagnosis.places.find((one) => one.socket === socket);
  const codes = codesOf(bench, at);
  return (
    <Dialog open onClose={onClose} title={socket}>
      <Text>{`${sentenceCase(heldWords(bench.index, at))}. ${stateOf(bench, diagnosis, at)}`}</Text>
      {place === undefined ? (
        <Text tone="soft">Not suspected.</Text>
      ) : (
        <View style={styles.part}>
          <Text variant="strong">{`Suspected with ${percentWords(place.probability)}`}</Text>
          <ShareBar label="the chip" share={place.chip} />
          <ShareBar label="contacts, solder, trace" share={place.contact} />
        </View>
      )}
      <View style={styles.part}>
        <Text variant="strong">Codes that would blame it</Text>
        {codes.length === 0 ? <Text tone="soft">No report of this board can name it alone.</Text> : null}
        {codes.slice(0, mostCodes).map(({ format, text }) => (
          <View key={format + text} style={styles.code}>
            <View style={styles.text}>
              <Text variant="codeSmall">{text}</Text>
            </View>
            <View style={styles.format}>
              <Text variant="small" tone="soft">
                {format}
              </Text>
            </View>
          </View>
        ))}
      </View>
      <View style={styles.row}>
        <Button label="I swapped it" onPress={() => onChange({ kind: 'swap', sockets: [socket, ''] })} />
        <Button label="I fitted another" onPress={() => onChange({ kind: 'known-good', sockets: [socket, ''] })} />
        <Button label="I reseated it" onPress={() => onChange({ kind: 'reseat', sockets: [socket, ''] })} />
        <ButtonLink kind="quiet" href={`/boards/${slug}`} label="The board’s page" />
      </View>
    </Dialog>
  );
}

function codesOf({ index, formats }: Bench, socket: number): { format: string; text: string }[] {
  return formats.flatMap(({ compiled }) => {
    const texts = lanesOf(index, socket).flatMap((lane) => {
      const written = compiled.write([lane]);
      return written.ok ? [written.text] : [];
    });
    return [...new Set(texts)].map((text) => ({ format: compiled.name, text }));
  });
}

function stateOf({ index }: Bench, { lanes }: Diagnosis, socket: number): string {
  const own = lanesOf(index, socket).map((lane) => laneName(index, lane));
  const states = lanes
    .filter(({ bank, bit }) => own.some((lane) => lane.bank === bank && lane.bit === bit))
    .map(({ state }) => state);
  if (states.length === 0) return '';
  if (states.includes('failed')) return 'It did not answer.';
  if (states.includes('mixed')) return 'It failed and answered in the same run.';
  return states.includes('untested') ? 'It was not tested.' : 'It answered.';
}

const useStyles = makeStyles((t) => ({
  part: { gap: t.space.xs },
  code: { flexDirection: 'row', gap: t.space.md, alignItems: 'baseline' },
  text: { flexBasis: 0, flexGrow: 3, minWidth: 0 },
  format: { flexBasis: 0, flexGrow: 2, minWidth: 0 },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
