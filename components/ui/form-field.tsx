import { Controller, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { Field, type FieldProps } from './field';

type FormFieldProps<Values extends FieldValues> = Omit<
  FieldProps,
  'value' | 'onChangeText' | 'error' | 'ref' | 'defaultValue'
> & {
  control: Control<Values>;
  name: FieldPath<Values>;
};

/** A Field held by react-hook-form; its error comes from the form. */
export function FormField<Values extends FieldValues>({ control, name, onBlur, ...props }: FormFieldProps<Values>) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <Field
          {...props}
          ref={field.ref}
          value={field.value}
          onChangeText={field.onChange}
          onBlur={(event) => {
            field.onBlur();
            onBlur?.(event);
          }}
          error={fieldState.error?.message}
        />
      )}
    />
  );
}
