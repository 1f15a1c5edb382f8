import { useState } from 'react';
import type { Control, FieldPath, FieldValues } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { FormField } from '@/components/ui/form-field';

type PasswordFieldProps<Values extends FieldValues> = {
  control: Control<Values>;
  name: FieldPath<Values>;
  label: string;
  /** new: a password keeper offers one. current: it fills in the one it keeps. */
  kind: 'new' | 'current';
  hint?: string;
};

/** A field for a password, which can be shown: typing unseen with gloves on is how people lock themselves out. */
export function PasswordField<Values extends FieldValues>({ kind, label, ...field }: PasswordFieldProps<Values>) {
  const [shown, setShown] = useState(false);
  return (
    <FormField
      {...field}
      label={label}
      secureTextEntry={!shown}
      autoCapitalize="none"
      autoCorrect={false}
      spellCheck={false}
      autoComplete={kind === 'new' ? 'new-password' : 'current-password'}
      trailing={
        <Button
          kind="quiet"
          label={shown ? 'Hide' : 'Show'}
          aria-label={`${shown ? 'Hide' : 'Show'} ${label.toLowerCase()}`}
          onPress={() => setShown(!shown)}
        />
      }
    />
  );
}
