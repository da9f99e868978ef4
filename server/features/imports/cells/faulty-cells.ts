// A formula that failed (`#REF!`, `#N/A`, `#¡DIV/0!`, `Err:502`), one without a value (`=B3`), a column too narrow to show.
const FAULTY = /^(?:#[¡\p{Lu}/0]{2,12}[!?]|#(?:N\/[AD]|NV|ND)|Err:\d{3}|=[\p{L}\d$'"[({@+-].*|#{2,})$/su;

/** Does a cell hold a spreadsheet's fault instead of a value? Then it names nothing and counts for nothing. */
export function isFaulty(cell: string): boolean {
  const first = cell.charCodeAt(0);
  // `#`, `=`, `E`: most cells need no second look.
  return (first === 35 || first === 61 || first === 69) && FAULTY.test(cell.trim());
}
