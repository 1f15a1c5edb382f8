import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm, type DefaultValues, type FieldValues, type Path, type UseFormReturn } from 'react-hook-form';
import type { z } from 'zod';
import { ApiProblem } from '@/components/api/problem';

type ApiFormOptions<Values extends FieldValues, Output, Answer> = {
  /** Schema of the request, shared with the server. */
  schema: z.ZodType<Output, Values>;
  empty: DefaultValues<Values>;
  /** Sends what was filled in. */
  send: (output: Output) => Promise<Answer>;
  onDone: (answer: Answer, output: Output) => void;
  /** Field that an error code belongs to, where the server names none. */
  fieldOf?: Partial<Record<string, Path<Values>>>;
};

/** A form whose request went wrong as a whole: the error, which no single field can mend. */
export type ApiForm<Values extends FieldValues> = {
  form: UseFormReturn<Values>;
  submit: () => void;
  busy: boolean;
  failure: unknown;
  clearFailure: () => void;
};

/**
 * A form that is checked by the shared schema here and by the server after.
 * Field problems of either go under their fields, and the first of them gets the focus; what was typed stays.
 */
export function useApiForm<Values extends FieldValues, Output, Answer>({
  schema,
  empty,
  send,
  onDone,
  fieldOf = {},
}: ApiFormOptions<Values, Output, Answer>): ApiForm<Values> {
  const form = useForm<Values, unknown, Output>({
    resolver: zodResolver(schema),
    defaultValues: empty,
    // Complain only once the person has finished; take the complaint back as soon as it is mended.
    mode: 'onSubmit',
    reValidateMode: 'onChange',
  });
  const [failure, setFailure] = useState<unknown>(null);
  const [busy, setBusy] = useState(false);

  const refuse = (error: unknown) => {
    const placed = placeProblems<Values>(error, fieldOf, form.getValues());
    for (const [at, { name, message }] of placed.entries()) {
      form.setError(name, { type: 'server', message }, { shouldFocus: at === 0 });
    }
    if (placed.length === 0) setFailure(error);
  };

  const submit = form.handleSubmit(async (output) => {
    setFailure(null);
    setBusy(true);
    try {
      onDone(await send(output), output);
    } catch (error) {
      refuse(error);
    } finally {
      setBusy(false);
    }
  });

  return {
    form: form as unknown as UseFormReturn<Values>,
    submit: () => {
      if (!busy) void submit();
    },
    busy,
    failure,
    clearFailure: () => setFailure(null),
  };
}

type PlacedProblem<Values extends FieldValues> = { name: Path<Values>; message: string };

function placeProblems<Values extends FieldValues>(
  error: unknown,
  fieldOf: Partial<Record<string, Path<Values>>>,
  values: Values,
): PlacedProblem<Values>[] {
  if (!(error instanceof ApiProblem)) return [];
  const own = fieldOf[error.code];
  if (own !== undefined) return [{ name: own, message: error.message }];
  return error.fields.flatMap(({ pointer, message }) => {
    const name = pointer.slice(1);
    return name in values ? [{ name: name as Path<Values>, message }] : [];
  });
}
