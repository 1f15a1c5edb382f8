import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Table } from '@/components/ui/table';
import { Text } from '@/components/ui/text';
import { addressWords, listWords, numbersWords, sentenceCase } from '@/lib/layout/words';
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
        <Text variant="subheading">Chips</Text>
        <DetailLines
          label="Chips"
          lines={familyCounts(document).map(({ id, name, sockets }) => ({
            key: id,
            name: `${sockets} ${sockets === 1 ? 'socket' : 'sockets'}`,
            value: name,
          }))}
        />
      </View>
      <Rails document={document} />
      <Inputs document={document} />
      <Windows document={document} />
      {document.board.notes === undefined ? null : (
        <View style={styles.part}>
          <Text variant="subheading">Notes</Text>
          <Text style={styles.notes}>{document.board.notes}</Text>
        </View>
      )}
    </View>
  );
}

/** Banks that are listed one by one; more are told in a line. */
const mostBanks = 32;

function Banks({ document: { memory } }: { document: LayoutDocument }) {
  const bits = (bank: Bank) => (bank.bits === undefined ? `0 to ${memory.dataBits - 1}` : numbersWords(bank.bits));
  return (
    <Table
      caption={memory.banks.length > mostBanks ? `The first ${mostBanks} of ${memory.banks.length} banks` : 'Banks'}
      columns={[
        { key: 'bank', header: 'Bank', share: 2, cell: (bank) => sentenceCase(bankTitle(bank)) },
        { key: 'words', header: 'Words', cell: ({ words }) => wordsCount(words) },
        { key: 'bits', header: 'Bits', cell: bits },
        { key: 'lines', header: 'Data lines', cell: ({ dataLines }) => dataLines ?? 'of the board' },
      ]}
      rows={memory.banks.slice(0, mostBanks)}
      rowKey={({ id }) => id}
    />
  );
}

function Rails({ document }: { document: LayoutDocument }) {
  const styles = useStyles();
  const { rails } = document;
  return (
    <View style={styles.part}>
      <Text variant="subheading">Rails at the pins</Text>
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
      <Text variant="subheading">Row and column inputs</Text>
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

function Windows({ document }: { document: LayoutDocument }) {
  const { addressMap } = document;
  if (addressMap.windows.length === 0) return null;
  const at = (address: number) => addressWords(addressMap, address);
  const how = ({ interleave, lanes }: AddressWindow) =>
    [interleave.length > 0 && 'the banks take turns', lanes && `${lanes.length} addresses a word`]
      .filter(Boolean)
      .join(', ');
  const all = addressMap.windows.length;
  return (
    <Table
      caption={`${all > mostWindows ? `The first ${mostWindows} of ${all} address windows` : 'Addresses'}, ${addressMap.notation}`}
      columns={[
        {
          key: 'range',
          header: 'From, to',
          mono: true,
          share: 2,
          cell: ({ range }) => `${at(range.from)} ${at(range.to)}`,
        },
        { key: 'banks', header: 'Banks', share: 1, cell: ({ banks }) => listWords(banks, 8) },
        {
          key: 'register',
          header: 'While',
          cell: ({ register }) => (register === undefined ? 'always' : `${register.name} is ${register.value}`),
        },
        { key: 'how', header: 'How', share: 1.4, cell: how },
      ]}
      rows={addressMap.windows.slice(0, mostWindows)}
      rowKey={({ range, register }) => `${range.from}/${range.to}/${register?.value ?? ''}`}
    />
  );
}

const useStyles = makeStyles((t) => ({
  facts: { gap: t.space.xl, paddingTop: t.space.lg },
  part: { gap: t.space.sm },
  notes: { maxWidth: t.measure.prose },
}));
