/** The id of a question about one column: `date-order:3`, and `date-order:2.3` on the second sheet of a workbook. */
export const placedId = (kind: string, sheet: number, col: number) =>
  sheet === 1 ? `${kind}:${col}` : `${kind}:${sheet}.${col}`;
