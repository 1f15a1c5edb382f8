import { useLocalSearchParams, useRouter } from 'expo-router';
import { useRef } from 'react';
import { View } from 'react-native';
import { CautionNotice } from '@/components/features/cautions/caution-notice';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Page } from '@/components/ui/page';
import { Panel } from '@/components/ui/panel';
import { SelectField } from '@/components/ui/select-field';
import { Table, type Column } from '@/components/ui/table';
import { Text } from '@/components/ui/text';
import { builtInFamilies, findFamily } from '@/lib';
import type { ChipFamily } from '@/shared';
import { FamilyDetails } from './family-details';
import { familyChoice, gradeWords, organisationWords, packageOf, refreshWords, supplyWords } from './family-words';
import { FitResult } from './fit-result';
import { partsParams, readPartsLink, type PartsLink } from './parts-link';

const familyOf = (id: string) => findFamily({ families: [] }, id);

const choices = [
  { value: '', label: 'Choose a family' },
  ...builtInFamilies.map((family) => ({ value: family.id, label: familyChoice(family) })),
];

/** The RAM chip families, and whether a chip of one fits into a socket for another. Its state is in the link. */
export function PartsScreen() {
  const styles = useStyles();
  const { link, change } = usePartsLink();
  const phone = useBreakpoint() === 'phone';
  const family = familyOf(link.family);
  const details = useRef<View>(null);
  const column = phone ? null : styles.column;
  const showFamily = (id: string) => {
    change({ family: id });
    // Its pins lie far up the page from the table.
    details.current?.focus();
  };
  const columns = useColumns(showFamily);
  return (
    <Page title="RAM chips" lead="What each family wants at its pins, and whether one fits where another was.">
      <View style={phone ? styles.stacked : styles.beside}>
        <Panel title="Will this fit?" style={column}>
          <Fit link={link} change={change} />
        </Panel>
        <View ref={details} tabIndex={-1} style={column}>
          <Panel title="One family">
            <SelectField
              label="Family"
              options={choices}
              value={link.family}
              onChange={(chosen) => change({ family: chosen })}
            />
            {family === null ? (
              <Text tone="soft">Choose a family to see its pins.</Text>
            ) : (
              <FamilyDetails family={family} />
            )}
          </Panel>
        </View>
      </View>
      <Panel
        title="All families"
        note="Usual speeds are common practice, without a source. The data sheet comes first."
      >
        <Table
          caption="RAM chip families"
          hideCaption
          columns={columns}
          rows={builtInFamilies}
          rowKey={({ id }) => id}
          isMarked={({ id }) => id === link.family}
        />
      </Panel>
    </Page>
  );
}

function Fit({ link, change }: { link: PartsLink; change: (next: Partial<PartsLink>) => void }) {
  const styles = useStyles();
  const [socket, chip] = [familyOf(link.socket), familyOf(link.chip)];
  return (
    <View style={styles.fit}>
      <SelectField
        label="The socket is wired for"
        options={choices}
        value={link.socket}
        onChange={(chosen) => change({ socket: chosen })}
      />
      <SelectField
        label="The chip at hand"
        options={choices}
        value={link.chip}
        onChange={(chosen) => change({ chip: chosen })}
      />
      <View style={styles.start}>
        <Button
          kind="plain"
          label="Turn round"
          aria-label="Turn round: the chip’s socket, the socket’s chip"
          disabled={link.socket === '' && link.chip === ''}
          onPress={() => change({ socket: link.chip, chip: link.socket })}
        />
      </View>
      {socket === null || chip === null ? (
        <Text tone="soft">Choose what the socket is wired for and the chip that you have.</Text>
      ) : (
        <FitResult socket={socket} chip={chip} />
      )}
      <CautionNotice id="wrong-rail" />
    </View>
  );
}

function useColumns(show: (id: string) => void): readonly Column<ChipFamily>[] {
  const styles = useStyles();
  return [
    {
      key: 'name',
      header: 'Family',
      share: 4,
      cell: ({ name, alsoCalled }) => (
        <View>
          <Text variant="strong">{name}</Text>
          <Text variant="mono">{alsoCalled.join(', ')}</Text>
        </View>
      ),
    },
    { key: 'organisation', header: 'Words × bits', cell: organisationWords, mono: true, share: 2 },
    { key: 'pins', header: 'Pins', cell: (family) => String(packageOf(family)) },
    { key: 'supplies', header: 'Supplies', cell: supplyWords, share: 4 },
    { key: 'refresh', header: 'Refresh', cell: refreshWords, share: 3 },
    { key: 'grades', header: 'Usual speeds', cell: gradeWords, share: 3 },
    {
      key: 'show',
      header: 'Every pin',
      share: 2,
      cell: ({ id, name }) => (
        <View style={styles.start}>
          <Button kind="plain" label="Show" aria-label={`Show the pins of ${name}`} onPress={() => show(id)} />
        </View>
      ),
    },
  ];
}

function usePartsLink() {
  const router = useRouter();
  const params = useLocalSearchParams<Record<string, string>>();
  const link = readPartsLink(params);
  const change = (next: Partial<PartsLink>) => {
    const whole = { ...link, ...next };
    router.setParams(Object.fromEntries(partsParams.map((name) => [name, whole[name] || undefined])));
  };
  return { link, change };
}

const useStyles = makeStyles((t) => ({
  beside: { flexDirection: 'row', alignItems: 'flex-start', gap: t.space.xxl },
  stacked: { gap: t.space.xl },
  column: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0 },
  fit: { gap: t.space.md },
  start: { alignItems: 'flex-start' },
}));
