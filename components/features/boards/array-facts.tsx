import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Link } from '@/components/ui/link';
import { Text } from '@/components/ui/text';
import { addressWords, listWords, numbersWords } from '@/lib/layout/words';
import type { AddressWindow, Bank, LayoutDocument } from '@/shared';
import { bankTitle, familyCounts, railWords, socketListWords, wordsCount } from './board-facts';
import { DetailLines } from './detail-lines';

/** What of the array is not seen on the sketch: banks, addresses, row and column inputs, rails. */
export function ArrayFacts({ document }: { document: LayoutDocument }) {
  const styles = useStyles();
  return (
    <View style={styles.facts}>
      <Banks document={document} />
      <View style={styles.part}>
        <Text variant="subheading" level={2}>
          Chips
        </Text>
        <DetailLines
          label="Chips"
          lines={familyCounts(document).map(({ id, name, sockets }) => ({
            key: id,
            name: `${sockets} ${sockets === 1 ? 'socket' : 'sockets'}`,
            value: name,
          }))}
        />
        <Link href="/parts" variant="smallStrong" standalone>
          RAM chips: will another fit?
        </Link>
      </View>
      <Rails document={document} />
      <Inputs document={document} />
      <Windows document={document} />
      {document.board.notes === undefined ? null : (
        <View style={styles.part}>
          <Text variant="subheading" level={2}>
            Notes
          </Text>
          <Text style={styles.notes}>{document.board.notes}</Text>
        </View>
      )}
    </View>
  );
}

/** Banks that are listed one by one; more are told in a line. */
const mostBanks = 32;

function Banks({ document: { memory } }: { document: LayoutDocument }) {
  const styles = useStyles();
  const facts = ({ words, bits, dataLines }: Bank) =>
    [
      `${wordsCount(words)} words`,
      `bits ${bits === undefined ? `0 to ${memory.dataBits - 1}` : numbersWords(bits)}`,
      dataLines && `data lines of their own: ${dataLines}`,
    ]
      .filter(Boolean)
      .join(', ');
  const all = memory.banks.length;
  return (
    <View style={styles.part}>
      <Text variant="subheading" level={2}>
        {all > mostBanks ? `The first ${mostBanks} of ${all} banks` : 'Banks'}
      </Text>
      <DetailLines
        label="Banks"
        lines={memory.banks
          .slice(0, mostBanks)
          .map((bank) => ({ key: bank.id, name: bankTitle(bank), value: facts(bank) }))}
      />
    </View>
  );
}

function Rails({ document }: { document: LayoutDocument }) {
  const styles = useStyles();
  const { rails } = document;
  return (
    <View style={styles.part}>
      <Text variant="subheading" level={2}>
        Rails at the pins
      </Text>
      {rails.length === 0 ? (
        <Text tone="soft">Nobody has noted them. Measure before another chip is fitted.</Text>
      ) : (
        <DetailLines
          label="Rails at the pins"
          lines={rails.map((rail) => ({
            key: rail.name,
            name: railWords(rail),
            value: `pin${rail.pins.length === 1 ? '' : 's'} ${listWords(rail.pins.map(String))} of ${socketListWords(
              document,
              rail.sockets,
            )}${rail.sharedPart === undefined ? '' : `, from ${rail.sharedPart}`}`,
          }))}
        />
      )}
    </View>
  );
}

function Inputs({ document: { multiplexing } }: { document: LayoutDocument }) {
  const styles = useStyles();
  if (multiplexing === undefined) return null;
  const order = (bits: readonly number[]) => (bits.length === 0 ? 'none' : `word bits ${bits.join(', ')}`);
  return (
    <View style={styles.part}>
      <Text variant="subheading" level={2}>
        Row and column inputs
      </Text>
      <DetailLines
        label="Row and column inputs"
        lines={[
          { key: 'row', name: 'row, from input 0', value: order(multiplexing.row) },
          { key: 'column', name: 'column, from input 0', value: order(multiplexing.column) },
        ]}
      />
    </View>
  );
}

const mostWindows = 24;

function Windows({ document: { addressMap } }: { document: LayoutDocument }) {
  const styles = useStyles();
  const all = addressMap.windows.length;
  if (all === 0) return null;
  const at = (address: number) => addressWords(addressMap, address);
  const facts = ({ banks, register, interleave, lanes }: AddressWindow) =>
    [
      `${banks.length === 1 ? 'bank' : 'banks'} ${listWords(banks, 8)}`,
      register && `while ${register.name} is ${register.value}`,
      interleave.length > 0 && 'taking turns',
      lanes && `${lanes.length} addresses a word`,
    ]
      .filter(Boolean)
      .join(', ');
  return (
    <View style={styles.part}>
      <Text variant="subheading" level={2}>
        {`${all > mostWindows ? `The first ${mostWindows} of ${all} address windows` : 'Addresses'}, ${addressMap.notation}`}
      </Text>
      <DetailLines
        label="Addresses"
        lines={addressMap.windows.slice(0, mostWindows).map((window, place) => ({
          key: String(place),
          name: `${at(window.range.from)} to ${at(window.range.to)}`,
          value: facts(window),
        }))}
      />
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  facts: { gap: t.space.xl, paddingTop: t.space.lg },
  part: { gap: t.space.sm },
  notes: { maxWidth: t.measure.prose },
}));
