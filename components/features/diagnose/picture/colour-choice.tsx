import { Pressable, View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { useChipStyles } from '@/components/ui/chip';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { Text } from '@/components/ui/text';
import { colourChoices, colourName, fullColour } from '@/lib';
import { sentenceCase } from '@/lib/layout/words';
import type { PictureMark, ScreenMap } from '@/shared';

type ColourChoiceProps = {
  map: ScreenMap;
  mark: PictureMark;
  onChange: (mark: PictureMark) => void;
};

const ways = [
  { value: 'missing', label: 'Lit dots are missing' },
  { value: 'lit', label: 'Dark dots are lit' },
  { value: 'wrong', label: 'Both, or not sure' },
] as const satisfies readonly { value: PictureMark['looks']; label: string }[];

/** How a place looks, and on a screen of several planes which of them are wrong there: by the colour or by name. */
export function ColourChoice({ map, mark, onChange }: ColourChoiceProps) {
  const styles = useStyles();
  const { looks } = mark;
  return (
    <View style={styles.all}>
      <SegmentedControl
        label="How it looks there"
        options={ways}
        value={looks}
        onChange={(next) => onChange({ ...mark, looks: next })}
      />
      {map.planes.length > 1 ? <Planes map={map} mark={mark} onChange={onChange} /> : null}
    </View>
  );
}

function Planes({ map, mark, onChange }: ColourChoiceProps) {
  const styles = useStyles();
  const wrong = mark.planes ?? map.planes.map(({ name }) => name);
  const looks = mark.looks === 'lit' ? 'lit' : 'missing';
  const choices = colourChoices(map, looks);
  const names = (planes: readonly number[]) => planes.flatMap((at) => map.planes[at]?.name ?? []);
  const same = (planes: readonly number[]) =>
    planes.length === wrong.length && names(planes).every((name) => wrong.includes(name));
  const usual = looks === 'lit' ? colourName(map, []) : fullColour(map);
  const said = `${sentenceCase(usual)} shows as`;
  // In the order of the screen, so that the same planes always make the same evidence.
  const setPlanes = (planes: readonly string[]) =>
    onChange({ ...mark, planes: map.planes.flatMap(({ name }) => (planes.includes(name) ? [name] : [])) });
  return (
    <>
      <View style={styles.part}>
        <Text variant="label">{said}</Text>
        <SegmentedControl
          label={said}
          options={choices.map(({ shows }) => ({ value: shows, label: shows }))}
          value={choices.find(({ planes }) => same(planes))?.shows ?? ''}
          onChange={(shows) => setPlanes(names(choices.find((choice) => choice.shows === shows)?.planes ?? []))}
        />
      </View>
      <View role="group" aria-label="Planes that are wrong there" style={styles.part}>
        <Text variant="label">Planes that are wrong there</Text>
        <View style={styles.row}>
          {map.planes.map(({ name, colour }) => (
            <PlaneBox
              key={name}
              label={name.toLowerCase() === colour ? name : `${name}, ${colour}`}
              checked={wrong.includes(name)}
              onPress={() =>
                setPlanes(wrong.includes(name) ? wrong.filter((other) => other !== name) : [...wrong, name])
              }
            />
          ))}
        </View>
      </View>
    </>
  );
}

function PlaneBox({ label, checked, onPress }: { label: string; checked: boolean; onPress: () => void }) {
  const styles = useStyles();
  const chip = useChipStyles();
  return (
    <Pressable
      role="checkbox"
      aria-checked={checked}
      aria-label={label}
      onPress={onPress}
      style={[chip.chip, checked && styles.checked]}
    >
      <Text variant={checked ? 'smallStrong' : 'small'} tone={checked ? 'onPencil' : 'ink'}>
        {checked ? `× ${label}` : label}
      </Text>
    </Pressable>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  part: { gap: t.space.xs },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
  checked: { backgroundColor: t.colours.pencil, borderColor: t.colours.pencil },
}));
