import type { Choice } from '#shared/contracts/import-reading.ts';
import type { ChangedCell, ChangeKind } from './changed-cells.ts';
import { type ChangedRow, type Decision, mainKind, type Share } from './changed-rows.ts';

type Answers = ReadonlyMap<string, string>;

export const AGAIN_ID = 'earlier';

/** Do rows that came in before count again? Asked for certain where only a few of another file's rows come back. */
export function againChoice(shares: readonly Share[], answers: Answers): Choice {
  const rows = shares.reduce((sum, { sameRows }) => sum + sameRows, 0);
  const names = [...new Set(shares.map(({ match }) => `“${match.past.fileName}”`))].join(' and ');
  const isSure = shares.every((share) => share.isSure);
  return {
    id: AGAIN_ID,
    kind: 'duplicate',
    column: null,
    question: `${rows === 1 ? '1 row' : `${rows} rows`} came in with ${names} already. Do they count again?`,
    options: [
      { value: 'once', label: 'no: only the new rows come in' },
      { value: 'twice', label: 'yes: they happened again' },
    ],
    preset: 'once',
    answer: answers.get(AGAIN_ID) ?? null,
    mustAsk: !isSure,
    why: isSure ? 'This file carries that one on.' : 'Only a few of its rows are the same, in every cell.',
  };
}

const WORDS: Readonly<Record<ChangeKind, string>> = {
  amount: 'another amount',
  place: 'another vehicle or kind of cost',
  date: 'another day',
  text: 'other words',
};

const idOf = (kind: ChangeKind) => `changed-row:${kind}`;

export function decisionFor(kind: ChangeKind, answers: Answers): Decision {
  const answer = answers.get(idOf(kind));
  return answer === 'new' || answer === 'both' ? answer : 'keep';
}

/** One question per kind of change, with the first row as an example. */
export function changeChoices(changes: readonly ChangedRow[], answers: Answers): Choice[] {
  const byKind = new Map<ChangeKind, { count: number; change: ChangedRow; cell: ChangedCell }>();
  for (const change of changes) {
    for (const kind of kindsOf(change)) {
      const before = byKind.get(kind);
      const cell = change.cells.find((one) => one.kind === kind) as ChangedCell;
      byKind.set(kind, before ? { ...before, count: before.count + 1 } : { count: 1, change, cell });
    }
  }
  return [...byKind].map(([kind, { count, change, cell }]): Choice => {
    const { twin, now, line } = change;
    const cellOf = (cells: readonly string[]) => (cells[cell.col - 1] ?? '').trim() || 'nothing';
    return {
      id: idOf(kind),
      kind: 'changed-row',
      column: null,
      question: `${count === 1 ? '1 row stands' : `${count} rows stand`} in “${twin.match.past.fileName}” with ${WORDS[kind]}. Row ${line} says ${cellOf(now)}, then it said ${cellOf(twin.old ?? [])}. What counts?`,
      options: [
        { value: 'keep', label: 'what is booked' },
        { value: 'new', label: 'the new, in place of what is booked' },
        { value: 'both', label: 'both' },
      ],
      preset: 'keep',
      answer: answers.get(idOf(kind)) ?? null,
      mustAsk: kind === 'amount' || kind === 'place',
      why: 'All else on the row is the same, or it stands at the same place in the list.',
    };
  });
}

/** Rows with one vehicle each are asked cell by cell; what was blank then is new, and no question. */
function kindsOf({ plan, cells }: ChangedRow): ChangeKind[] {
  if (plan.shape !== 'vehicles') return [mainKind(cells)];
  return [...new Set(cells.filter(({ isAdded }) => !isAdded).map(({ kind }) => kind))];
}
