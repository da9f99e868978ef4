import { useId } from 'react';

type Props<Value extends string> = {
  label: string;
  options: readonly { value: Value; label: string }[];
  value: Value;
  onChange: (value: Value) => void;
};

/** One of a few, all in view (`1 in 2 | 2 in 3 | …`): a radio group. `label` (for the ear), `options`, `value`, `onChange`. */
export function Segmented<Value extends string>({ label, options, value, onChange }: Props<Value>) {
  const name = useId();
  return (
    <fieldset className="segmented">
      <legend className="sr-only">{label}</legend>
      {options.map((option) => (
        <label key={option.value} className="segment">
          <input type="radio" name={name} checked={option.value === value} onChange={() => onChange(option.value)} />
          {option.label}
        </label>
      ))}
    </fieldset>
  );
}

/** One of several as chips that wrap; `large` for the phone pages. Props as Segmented; `hideLabel` keeps the label for the ear. */
export function ChipChoice<Value extends string>(
  props: Omit<Props<Value>, 'value'> & { value: Value | null; large?: boolean; hideLabel?: boolean },
) {
  const name = useId();
  return (
    <fieldset className={props.large ? 'chips-large' : ''}>
      <legend className={props.hideLabel ? 'sr-only' : 'field-label mb-1.5'}>{props.label}</legend>
      <div className="flex flex-wrap gap-2">
        {props.options.map((option) => (
          <label key={option.value} className="chip">
            <input
              type="radio"
              name={name}
              checked={option.value === props.value}
              onChange={() => props.onChange(option.value)}
            />
            {option.label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}

/** Any of several as chips (filters). `values` are the chosen ones; `onChange` gets the new list. */
export function Chips<Value extends string>(props: {
  label: string;
  options: readonly { value: Value; label: string }[];
  values: readonly Value[];
  onChange: (values: Value[]) => void;
}) {
  const { label, options, values, onChange } = props;
  const toggle = (value: Value) =>
    onChange(values.includes(value) ? values.filter((one) => one !== value) : [...values, value]);
  return (
    <fieldset>
      <legend className="sr-only">{label}</legend>
      <div className="flex flex-wrap gap-2">
        {options.map((option) => (
          <label key={option.value} className="chip">
            <input type="checkbox" checked={values.includes(option.value)} onChange={() => toggle(option.value)} />
            {option.label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
