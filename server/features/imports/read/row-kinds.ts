import { looksLikeMoney } from '../cells/money.ts';
import { isTotalLabel } from '../words/headings.ts';
import { notData, type Plan, putAside, type RowRead } from './plan.ts';

/**
 * What any sheet may hold beside its data: blank rows, titles above the headings, headings again, broken rows. null =
 * a row of the table, to be read by its shape.
 */
export function rowOutsideTable(
  plan: Plan,
): (cells: readonly string[], line: number, isMalformed: boolean) => RowRead | null {
  const { line: headingLine, last, cells: heading } = plan.heading;
  const isAgain = isHeadingAgain(heading);
  return (cells, line, isMalformed) => {
    if (isBlank(cells)) return notData('blank');
    if (line >= headingLine && line <= last) return notData('heading');
    if (isMalformed) return putAside('malformed-row', null, null);
    if (line < headingLine) {
      const isTable = filled(cells) > 1 && cells.some(looksLikeMoney);
      return isTable ? putAside('not-a-data-row', null, null) : notData('title');
    }
    return isAgain(cells) ? notData('heading') : null;
  };
}

/** Does a row only repeat the headings, as on a new page or month? */
export function isHeadingAgain(heading: readonly string[]): (cells: readonly string[]) => boolean {
  const first = heading.findIndex((cell) => cell.trim() !== '');
  const firstHeading = heading[first]?.trim() ?? '';
  return (cells) =>
    cells[first]?.trim() === firstHeading && heading.every((cell, i) => (cells[i] ?? '').trim() === cell.trim());
}

export function isBlank(cells: readonly string[]): boolean {
  for (const cell of cells) if (cell !== '' && cell.trim() !== '') return false;
  return true;
}

/** Number of cells with something in them. */
export function filled(cells: readonly string[]): number {
  let count = 0;
  for (const cell of cells) if (cell !== '' && cell.trim() !== '') count++;
  return count;
}

/** The cell that labels a row as a total; undefined = none does. */
export function totalLabel(cells: readonly string[]): string | undefined {
  return cells.find((cell) => cell !== '' && isTotalLabel(cell));
}
