import type { Choice, Earlier } from '#shared/contracts/import-reading.ts';
import type { Plan } from '../read/plan.ts';
import { changedCells } from './changed-cells.ts';
import { type ChangedRow, type Decision, mainKind, type Share } from './changed-rows.ts';
import { AGAIN_ID, againChoice, changeChoices, decisionFor } from './earlier-choices.ts';
import type { Matched, SheetMatch, Twin } from './match-rows.ts';
import type { PastRow } from './past.ts';

type Answers = ReadonlyMap<string, string>;

export interface EarlierCell {
  readonly decision: Decision;
  readonly oldCol: number | null;
  /** It was blank then: there is nothing to replace. */
  readonly isAdded: boolean;
}

/** A row of today that came in before, and what is done with it now. */
export interface EarlierRow {
  readonly from: readonly PastRow[];
  /** The rebuild that it was booked to; null = not known, or none. */
  readonly rebuildId: string | null;
  readonly decision: Decision;
  /** In a sheet with one vehicle per row: the cells that changed. All others stay as they are booked. */
  readonly cells: ReadonlyMap<number, EarlierCell>;
}
export type EarlierRows = ReadonlyMap<number, EarlierRow>;

const NO_CELLS: EarlierRow['cells'] = new Map();

/** Every row that came in before, as if it were kept: enough for what must know them before questions are settled. */
export const earlierRows = ({ twins }: Matched, sheet: number, answers: Answers): EarlierRows =>
  answers.get(AGAIN_ID) === 'twice'
    ? new Map()
    : new Map([...(twins.get(sheet) ?? [])].map(([line, twin]) => [line, rowOf(twin, 'keep', NO_CELLS)]));

const rowOf = ({ from, rebuildId }: Twin, decision: Decision, cells: EarlierRow['cells']): EarlierRow => ({
  from,
  rebuildId,
  decision,
  cells,
});

/**
 * Settles what is done with rows that came in before. Equal ones are not taken again; changed ones are asked about, once
 * per kind of change, and left as they are booked meanwhile. Rows that only look like some of another file are new.
 */
export function settleEarlier(
  plans: readonly Plan[],
  matched: Matched,
  answers: Answers,
): { plans: Plan[]; choices: Choice[]; earlier: Earlier[] } {
  const all = plans.flatMap((plan) => changedRows(plan, matched));
  const shares = matched.matches.map((match) => shareOf(match, all));
  const sure = new Set(shares.filter(({ isSure }) => isSure).map(({ match }) => match));
  const found = shares.filter(({ match, sameRows }) => sameRows > 0 || sure.has(match));
  if (found.length === 0) return { plans: plans.map(withoutEarlier), choices: [], earlier: [] };
  const again = againChoice(found, answers);
  if (again.answer === 'twice') return { plans: plans.map(withoutEarlier), choices: [again], earlier: [] };
  const changes = all.filter(({ cells, twin }) => cells.length > 0 && sure.has(twin.match));
  const rows = new Map(plans.map((plan) => [plan, new Map(plan.earlier)]));
  for (const { plan, line, twin, cells } of all) {
    if (cells.length > 0 && !sure.has(twin.match)) rows.get(plan)?.delete(line);
  }
  for (const change of changes) rows.get(change.plan)?.set(change.line, settled(change, answers));
  return {
    plans: plans.map((plan) => ({ ...plan, earlier: rows.get(plan) ?? plan.earlier })),
    choices: [again, ...changeChoices(changes, answers)],
    earlier: earlierOf(found),
  };
}

const withoutEarlier = (plan: Plan): Plan => ({ ...plan, earlier: new Map() });

function changedRows(plan: Plan, { twins }: Matched): ChangedRow[] {
  const own = twins.get(plan.sheet.number);
  if (!own || [...own.values()].every(({ old }) => old === null)) return [];
  const changed: ChangedRow[] = [];
  plan.sheet.forEachRow((now, line) => {
    const twin = own.get(line);
    if (twin?.old) changed.push({ plan, line, twin, now, cells: changedCells(plan, twin.old, now) });
  });
  return changed;
}

function shareOf(match: SheetMatch, changes: readonly ChangedRow[]): Share {
  const own = changes.filter(({ twin }) => twin.match === match);
  const rewritten = own.filter(({ cells }) => cells.length === 0).length;
  // Rows with one vehicle each are known by its name.
  const known = own.filter(({ plan }) => plan.shape === 'vehicles').length;
  const sameRows = match.sameRows + rewritten;
  const changedRows = own.length - rewritten;
  return { match, sameRows, changedRows, isSure: Math.max(sameRows, match.sameRows + known) * 2 >= match.rows };
}

function settled({ plan, twin, cells }: ChangedRow, answers: Answers): EarlierRow {
  if (plan.shape !== 'vehicles') return rowOf(twin, decisionFor(mainKind(cells), answers), NO_CELLS);
  const settledCells = cells.map(({ col, kind, isAdded }): [number, EarlierCell] => [
    col,
    { decision: isAdded ? 'new' : decisionFor(kind, answers), oldCol: twin.oldCol(col), isAdded },
  ]);
  return rowOf(twin, 'keep', new Map(settledCells));
}

function earlierOf(shares: readonly Share[]): Earlier[] {
  const byImport = new Map<string, Earlier>();
  for (const { match, sameRows, changedRows, isSure } of shares) {
    const { importId, fileName, committedAt } = match.past;
    const before = byImport.get(importId) ?? { importId, fileName, committedAt, sameRows: 0, changedRows: 0 };
    byImport.set(importId, {
      ...before,
      sameRows: before.sameRows + sameRows,
      changedRows: before.changedRows + (isSure ? changedRows : 0),
    });
  }
  return [...byImport.values()];
}
