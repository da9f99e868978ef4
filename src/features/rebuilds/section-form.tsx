import type { ReactNode } from 'react';
import type { FieldErrors, FieldValues } from 'react-hook-form';
import { Button } from '../../ui/button.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';

type Props = {
  onSubmit: () => Promise<void>;
  /** Puts the fields back; null for people who only read. */
  onReset: () => void;
  isDirty: boolean;
  isBusy: boolean;
  errors: FieldErrors<FieldValues>;
  canWrite: boolean;
  children: ReactNode;
};

/** A part of the rebuild's page that is saved by itself: its buttons appear once something was changed. */
export function SectionForm({ onSubmit, onReset, isDirty, isBusy, errors, canWrite, children }: Props) {
  const count = Object.keys(errors).filter((name) => name !== 'root').length;
  return (
    <form
      noValidate
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        void onSubmit();
      }}
    >
      <fieldset disabled={!canWrite} className="contents">
        {children}
      </fieldset>
      {(isDirty || count > 0) && canWrite && (
        <div className="grid gap-3">
          <ErrorSummary message={errors.root?.['server']?.message as string | undefined} fields={count} />
          <div className="flex gap-3">
            <Button kind="main" type="submit" busy={isBusy}>
              Save
            </Button>
            <Button onClick={onReset}>Put back</Button>
          </div>
        </div>
      )}
    </form>
  );
}
