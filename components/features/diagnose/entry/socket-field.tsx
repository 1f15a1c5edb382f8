import { Field } from '@/components/ui/field';
import type { Bench } from '../bench';
import { socketProblem } from './small-drafts';

type SocketFieldProps = {
  bench: Bench;
  label: string;
  value: string;
  onChange: (socket: string) => void;
  optional?: boolean;
};

/** A socket by its label, written or tapped on the sketch. */
export function SocketField({ bench, label, value, onChange, optional }: SocketFieldProps) {
  return (
    <Field
      mono
      label={label}
      optional={optional}
      hint="Tap it on the sketch, or write its label."
      value={value}
      onChangeText={onChange}
      error={socketProblem(bench, value) ?? undefined}
    />
  );
}
