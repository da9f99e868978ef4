/** What can be done with one row, as words at its end. `of` names the row for the ear. */
export function RowActs({ of, onChange, onVoid }: { of: string; onChange: () => void; onVoid: () => void }) {
  return (
    <span className="flex justify-end gap-3 whitespace-nowrap no-print">
      <button type="button" className="row-act" aria-label={`Change ${of}`} onClick={onChange}>
        Change
      </button>
      <button type="button" className="row-act" aria-label={`Void ${of}`} onClick={onVoid}>
        Void
      </button>
    </span>
  );
}
