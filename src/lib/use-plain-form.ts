import { type FormEvent, useState } from 'react';
import { ApiProblem } from './api-problem.ts';
import { fieldName } from './apply-problem.ts';

type Values<Name extends string> = Record<Name, string>;
export type FieldErrors<Name extends string> = Partial<Record<Name, string>>;

type Wish<Name extends string> = {
  /** The fields, by their `name`; their typed text is handed to the rest. */
  names: readonly Name[];
  /** What can be seen without asking: complaints by field. */
  check?: (values: Values<Name>) => FieldErrors<Name>;
  save: (values: Values<Name>) => Promise<unknown>;
};

/**
 * A small form without a form library: for the pages that a visitor meets first, and for one-field rows. A refused
 * save shows at the field that its pointer names; what no field answers for is `message`. Nothing typed is lost.
 */
export function usePlainForm<Name extends string>({ names, check, save }: Wish<Name>) {
  const [errors, setErrors] = useState<FieldErrors<Name>>({});
  const [message, setMessage] = useState<string>();
  const [isBusy, setBusy] = useState(false);

  const complain = (form: HTMLFormElement, found: FieldErrors<Name>) => {
    setErrors(found);
    const first = names.find((name) => found[name] !== undefined);
    const field = first && form.elements.namedItem(first);
    if (field instanceof HTMLElement) field.focus();
    return first !== undefined;
  };

  const submit = async (form: HTMLFormElement) => {
    if (isBusy) return;
    const fields = new FormData(form);
    const values = Object.fromEntries(names.map((name) => [name, String(fields.get(name) ?? '')])) as Values<Name>;
    setMessage(undefined);
    if (complain(form, check?.(values) ?? {})) return;
    setBusy(true);
    try {
      await save(values);
    } catch (refused) {
      if (!(refused instanceof ApiProblem)) throw refused;
      const { atFields, rest } = sorted(refused, names);
      complain(form, atFields);
      setMessage(rest);
    } finally {
      setBusy(false);
    }
  };

  const onSubmit = (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    void submit(event.currentTarget);
  };
  return { onSubmit, isBusy, errors, message };
}

function sorted<Name extends string>(problem: ApiProblem, names: readonly Name[]) {
  const atFields: FieldErrors<Name> = {};
  const homeless = problem.errors.length === 0 ? [problem.message] : [];
  for (const { pointer, detail } of problem.errors) {
    const name = names.find((one) => one === fieldName(pointer));
    if (name) atFields[name] ??= detail;
    else homeless.push(detail);
  }
  return { atFields, rest: homeless.join(' ') || undefined };
}
