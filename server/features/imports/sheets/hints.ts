import type { SheetHint } from './sheet.ts';

// A thousand hints of one kind in one column say no more than these, and how many more there are.
const MOST_ALIKE = 100;
const LONGEST = 1000;

/** Gathers what stands beside the cells of one sheet; call `finish` when all of it has been seen. */
export function hintKeeper() {
  const hints: SheetHint[] = [];
  const alike = new Map<string, { readonly first: SheetHint; count: number }>();
  const columns = new Set<number>();
  let hidden: { first: number; last: number } | null = null;

  function add(hint: SheetHint): void {
    const key = `${hint.kind} ${hint.col}`;
    const seen = alike.get(key) ?? { first: hint, count: 0 };
    alike.set(key, seen);
    if (++seen.count <= MOST_ALIKE) hints.push({ ...hint, text: hint.text.slice(0, LONGEST) });
  }

  function endHidden(): void {
    if (!hidden) return;
    const { first, last } = hidden;
    const text =
      first === last
        ? `Row ${first} is hidden. It is read like the others.`
        : `Rows ${first} to ${last} are hidden. They are read like the others.`;
    add({ row: first, col: null, kind: 'hidden row', text });
    hidden = null;
  }

  return {
    hints: hints as readonly SheetHint[],
    comment: (row: number, col: number, text: string) => add({ row, col, kind: 'comment', text }),
    /** Hears of every row that holds something, in order. */
    row(line: number, isHidden: boolean): void {
      if (!isHidden) endHidden();
      else if (hidden) hidden.last = line;
      else hidden = { first: line, last: line };
    },
    hiddenColumn: (col: number) => void columns.add(col),
    /** A formula beside which no value is stored. */
    formula: (row: number, col: number, formula: string) =>
      add({
        row,
        col,
        kind: 'formula without a value',
        text: `“=${formula.slice(0, 200)}” has no stored value, and none is worked out here. Open the workbook in a spreadsheet program and save it, and it has one.`,
      }),
    /** A formula that takes its figure from another file. */
    link: (row: number, col: number, file: string) =>
      add({
        row,
        col,
        kind: 'link',
        text: `This figure comes from another file, “${file.slice(0, 200)}”. That file is not opened; the value stored here is taken.`,
      }),
    /** `widest`: the last column that holds anything. */
    finish(widest: number): void {
      endHidden();
      for (const col of columns) {
        if (col > widest) continue;
        add({ row: 0, col, kind: 'hidden column', text: 'This column is hidden. It is read like the others.' });
      }
      for (const { first, count } of alike.values()) {
        const more = count - MOST_ALIKE;
        if (more <= 0) continue;
        hints.push({ ...first, row: first.col === null ? first.row : 0, text: `${more} more like these, not listed.` });
      }
      hints.sort((a, b) => a.row - b.row || (a.col ?? 0) - (b.col ?? 0));
    },
  };
}
export type HintKeeper = ReturnType<typeof hintKeeper>;
