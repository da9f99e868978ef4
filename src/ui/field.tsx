import { type ReactNode, useId } from 'react';

export type FieldProps = {
  label: string;
  /** Hides the label from the eye only: rows of a table have their heading. */
  hideLabel?: boolean | undefined;
  hint?: ReactNode;
  error?: string | undefined;
};

/** Ids and aria attributes that tie one control to its label, hint and error. */
export function useField({ hint, error }: Pick<FieldProps, 'hint' | 'error'>, id?: string) {
  const made = useId();
  const base = id ?? made;
  const described = [hint ? `${base}-hint` : '', error ? `${base}-error` : ''].filter(Boolean).join(' ');
  return {
    id: base,
    control: {
      id: base,
      'aria-invalid': error ? (true as const) : undefined,
      'aria-describedby': described || undefined,
    },
  };
}

/** The frame of one field: label above, hint and error below. The error stands outside the label, so the name stays clean. */
export function FieldFrame(props: FieldProps & { id: string; children: ReactNode; className?: string | undefined }) {
  const { id, label, hideLabel, hint, error, children, className } = props;
  return (
    <div className={`field ${className ?? ''}`}>
      <label htmlFor={id} className={hideLabel ? 'sr-only' : 'field-label'}>
        {label}
      </label>
      {children}
      {hint && (
        <div id={`${id}-hint`} className="field-hint">
          {hint}
        </div>
      )}
      {error && (
        <div id={`${id}-error`} className="field-error">
          {error}
        </div>
      )}
    </div>
  );
}
