import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { View } from 'react-native';
import { layoutFiltersQuery } from '@/components/api/layouts';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { SelectField } from '@/components/ui/select-field';
import type { LayoutFilters } from '@/shared/api/layouts';
import { familyLabel, type LibraryLink } from './library-link';

type LibraryFiltersProps = { link: LibraryLink; onChange: (change: LibraryLink) => void; onClear: () => void };

type FilterName = Exclude<keyof LibraryLink, 'q'>;

type Filter = {
  name: FilterName;
  label: string;
  any: string;
  values: (filters: LayoutFilters) => readonly string[];
  words?: (value: string) => string;
};

const filters: readonly Filter[] = [
  { name: 'maker', label: 'Maker', any: 'Any maker', values: ({ makers }) => makers },
  { name: 'kind', label: 'Kind', any: 'Any kind', values: ({ kinds }) => kinds },
  { name: 'family', label: 'Chips', any: 'Any chips', values: ({ families }) => families, words: familyLabel },
  {
    name: 'bits',
    label: 'Data bits',
    any: 'Any width',
    values: ({ bits }) => bits.map(String),
    words: (bits) => `${bits} ${bits === '1' ? 'bit' : 'bits'}`,
  },
];

/** What the library is narrowed by. A choice that the link holds is shown even before the server has named it. */
export function LibraryFilters({ link, onChange, onClear }: LibraryFiltersProps) {
  const styles = useStyles();
  const { data } = useQuery(layoutFiltersQuery);
  const phone = useBreakpoint() === 'phone';
  const [open, setOpen] = useState(false);
  const chosenCount = filters.filter(({ name }) => link[name] !== undefined).length;
  const narrowed = chosenCount > 0;
  // On a phone four lists would push the boards out of sight.
  if (phone && !open) {
    return (
      <View style={styles.row}>
        <Button
          kind="plain"
          label={narrowed ? `Filters, ${chosenCount} set` : 'Filters'}
          aria-expanded={false}
          onPress={() => setOpen(true)}
        />
        {narrowed ? <Button kind="quiet" label="Clear filters" onPress={onClear} /> : null}
      </View>
    );
  }
  return (
    <View role="group" aria-label="Narrow the list" style={styles.row}>
      {filters.map(({ name, label, any, values, words = (value) => value }) => {
        const chosen = link[name] ?? '';
        const known = data === undefined ? [] : values(data);
        const all = chosen === '' || known.includes(chosen) ? known : [chosen, ...known];
        return (
          <View key={name} style={styles.filter}>
            <SelectField
              label={label}
              value={chosen}
              onChange={(value) => onChange({ [name]: value === '' ? undefined : value })}
              options={[{ value: '', label: any }, ...all.map((value) => ({ value, label: words(value) }))]}
            />
          </View>
        );
      })}
      {narrowed ? <Button kind="quiet" label="Clear filters" onPress={onClear} /> : null}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  row: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-end', gap: t.space.md },
  filter: { flexGrow: 1, flexShrink: 1, flexBasis: t.target * 3 },
}));
