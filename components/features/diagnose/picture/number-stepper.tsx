import { useState } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';

type NumberStepperProps = {
  label: string;
  value: number;
  /** Both included. */
  least: number;
  most: number;
  /** What is taken while it is being written; the rest of the reach is taken when it is left, since 1 may become 191. */
  soon?: readonly [least: number, most: number];
  onChange: (value: number) => void;
};

/** A whole number, written or stepped. A number out of reach is told and not taken. */
export function NumberStepper({ label, value, least, most, soon = [least, most], onChange }: NumberStepperProps) {
  const styles = useStyles();
  const [typed, setTyped] = useState<string | null>(null);
  const number = typed === null || typed.trim() === '' ? NaN : Number(typed);
  const fits = (n: number) => Number.isInteger(n) && n >= least && n <= most;
  const step = (by: number) => {
    setTyped(null);
    onChange(value + by);
  };
  return (
    <View role="group" aria-label={label} style={styles.stepper}>
      <Field
        mono
        label={label}
        inputMode="numeric"
        value={typed ?? String(value)}
        error={typed !== null && !fits(number) ? `A whole number from ${least} to ${most}.` : undefined}
        onChangeText={(text) => {
          setTyped(text);
          const next = text.trim() === '' ? NaN : Number(text);
          if (fits(next) && next >= soon[0] && next <= soon[1]) onChange(next);
        }}
        onBlur={() => {
          setTyped(null);
          if (fits(number) && number !== value) onChange(number);
        }}
        trailing={
          <>
            <Button
              kind="quiet"
              label="−"
              aria-label={`− ${label}`}
              disabled={value <= least}
              onPress={() => step(-1)}
            />
            <Button kind="quiet" label="+" aria-label={`+ ${label}`} disabled={value >= most} onPress={() => step(1)} />
          </>
        }
      />
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  stepper: { flexGrow: 1, flexBasis: t.measure.beside },
}));
