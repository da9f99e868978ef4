import type { Choice } from '#shared/contracts/import-reading.ts';
import { looksLikeMoney } from '../cells/money.ts';
import { filled, isBlank, isHeadingAgain, totalLabel } from '../read/row-kinds.ts';
import type { Sheet } from '../sheets/sheet.ts';
import { placedId } from './placed-id.ts';
import type { TableGuess } from './table-guess.ts';
import { placeOf } from './vehicle-columns.ts';

const FEWEST_BLOCKS = 2;

/**
 * A list that names each vehicle on the first of its rows only is read as if the name stood on all of them. Where a
 * total or a blank row parts the blocks that is plain; else it is asked. Other lists stay as they are.
 */
export function carryNames(guess: TableGuess, answers: ReadonlyMap<string, string>): TableGuess {
  const at = Math.max(placeOf(guess.columns, 'vehicle'), placeOf(guess.columns, 'stock number'));
  if ((guess.shape !== 'expenses' && guess.shape !== 'hours') || at < 0) return guess;
  const blocks = blocksOf(guess, at);
  if (blocks === null) return guess;
  const column = guess.columns.find(({ col }) => col === at + 1);
  const id = placedId('names-above', guess.sheet.number, at + 1);
  const answer = answers.get(id) ?? null;
  const choice: Choice = {
    id,
    kind: 'vehicle',
    column: column?.heading ?? null,
    question: `${blocks.unnamed} rows name no vehicle. Do they belong to the one above them?`,
    options: [
      { value: 'above', label: 'yes: to the vehicle named above' },
      { value: 'aside', label: 'no: put them aside' },
    ],
    preset: 'above',
    answer,
    mustAsk: !blocks.areParted,
    why: blocks.areParted
      ? 'Each vehicle is named once, and a total or a blank row parts it from the next.'
      : 'Each vehicle is named once, and most rows name none.',
  };
  const isCarried = answer === 'above' || (answer === null && blocks.areParted);
  return {
    ...guess,
    sheet: isCarried ? namedSheet(guess, at) : guess.sheet,
    choices: [...guess.choices, choice],
  };
}

/** How a list names its vehicles; null = not in blocks: some stand on several rows, or most rows name theirs. */
function blocksOf({ sheet, heading, columns }: TableGuess, at: number) {
  const figures = columns.filter(({ meaning }) => FIGURES.has(meaning)).map(({ col }) => col - 1);
  const isAgain = isHeadingAgain(heading.cells);
  let [named, unnamed, parted] = [0, 0, 0];
  let [before, isEnd, areBlocks] = ['', true, true];
  sheet.forEachRow((cells, line) => {
    if (line <= heading.last || isAgain(cells)) return;
    if (isBlank(cells) || totalLabel(cells) !== undefined) {
      isEnd = true;
      return;
    }
    if (!figures.some((place) => looksLikeMoney(cells[place] ?? ''))) return;
    const name = (cells[at] ?? '').trim();
    if (name !== '') {
      if (name === before) areBlocks = false;
      named++;
      if (isEnd) parted++;
      before = name;
    } else if (before === '') areBlocks = false;
    else unnamed++;
    isEnd = false;
  });
  if (!areBlocks || named < FEWEST_BLOCKS || unnamed < named) return null;
  return { unnamed, areParted: parted === named };
}

const FIGURES: ReadonlySet<string> = new Set(['amount', 'credit', 'estimate', 'hours']);

/** The sheet with the vehicle's name on every row of its block; `asGiven` takes it out again. */
function namedSheet({ sheet, heading }: TableGuess, at: number): Sheet {
  const names = new Map<number, string>();
  const withName = (cells: readonly string[], name: string) =>
    Array.from({ length: Math.max(cells.length, at + 1) }, (_, place) => (place === at ? name : (cells[place] ?? '')));
  const rawRow = (line: number) => {
    const raw = sheet.rawRow?.(line);
    const name = names.get(line);
    return raw && name !== undefined ? withName(raw, name) : raw;
  };
  return {
    ...sheet,
    ...(sheet.rawRow ? { rawRow } : {}),
    asGiven: (line, cells) => (names.has(line) ? withName(cells, '') : cells),
    forEachRow(onRow, onPart) {
      let name = '';
      sheet.forEachRow((cells, line, isMalformed) => {
        const own = (cells[at] ?? '').trim();
        const isTotal = totalLabel(cells) !== undefined;
        if (isTotal || own !== '') name = isTotal || line <= heading.last ? '' : own;
        const isBare = own === '' && name !== '' && filled(cells) > 1 && !isMalformed;
        if (isBare) names.set(line, name);
        onRow(isBare ? withName(cells, name) : cells, line, isMalformed);
      }, onPart);
    },
  };
}
