import type { ShopBooks } from '../books.ts';
import type { Matched } from '../earlier/match-rows.ts';
import { fold } from '../cells/fold.ts';
import { type Draft, newDraft, tagMaker } from '../read/draft.ts';
import { keptText } from '../read/faulty-texts.ts';
import { isBlank, isHeadingAgain, totalLabel } from '../read/row-kinds.ts';
import { placeOf, vehicleName } from './vehicle-columns.ts';
import { existingFinder } from './existing-finder.ts';
import type { SurveyedTable } from './file-plan.ts';
import { readVehicle } from './vehicle-text.ts';

/** A vehicle that one sheet of a workbook gives a row of its own, and that other sheets may name. */
export interface KnownVehicle {
  readonly sheet: number;
  readonly row: number;
  readonly draft: Draft;
  /** Its stock number or whatever its row calls it. */
  readonly name: string;
  /** `2010 Toyota Corolla`; null = its row does not say. */
  readonly spelling: string | null;
}

/** The vehicles of the sheets with one vehicle per row, made before any row is read so that lists can refer to them. */
export function knownVehicles(tables: readonly SurveyedTable[], books: ShopBooks, { twins }: Matched): KnownVehicle[] {
  const tagFor = tagMaker(books.rebuilds.map((rebuild) => rebuild.tag));
  const finder = existingFinder(books.rebuilds);
  const thisYear = Number(books.today.slice(0, 4));
  const known: KnownVehicle[] = [];
  for (const { guess } of tables) {
    if (guess.shape !== 'vehicles') continue;
    const { columns, heading, sheet } = guess;
    const nameOf = vehicleName(columns);
    const isAgain = isHeadingAgain(heading.cells);
    const at = (cells: readonly string[], meaning: 'year' | 'make' | 'model' | 'vehicle') =>
      keptText(cells[placeOf(columns, meaning)] ?? '') ?? '';
    sheet.forEachRow((cells, row) => {
      if (row <= heading.last || isBlank(cells) || isAgain(cells)) return;
      const name = nameOf(cells);
      if (name === '' || totalLabel(cells)?.trim() === name) return;
      const words = [at(cells, 'year'), at(cells, 'make'), at(cells, 'model')].filter((word) => word !== '');
      const text = at(cells, 'vehicle') || (at(cells, 'model') ? words.join(' ') : '');
      const { year, make, model } = readVehicle(text, thisYear);
      const earlier = known.find((one) => one.sheet !== sheet.number && isSame(one, name, text));
      if (earlier) {
        known.push({ ...earlier, sheet: sheet.number, row });
        return;
      }
      const rebuildId = twins.get(sheet.number)?.get(row)?.rebuildId;
      const existing = books.rebuilds.find(({ id }) => id === rebuildId) ?? finder.byTag(name);
      const facts = text === '' ? {} : { year, make, model: year === null && make === null ? null : model };
      const draft = newDraft(existing ? existing.tag : tagFor(name), existing, row, { ...facts, sheet: sheet.number });
      known.push({ sheet: sheet.number, row, draft, name, spelling: text || null });
    });
  }
  return known;
}

/** Is it the vehicle of an earlier sheet? Numbers alone tell nothing: every year may count from 1. */
function isSame(earlier: KnownVehicle, name: string, spelling: string): boolean {
  const isNumber = /^\d{1,3}$/.test(name);
  if (spelling !== '' && earlier.spelling !== null) {
    return fold(spelling) === fold(earlier.spelling) && (isNumber || fold(name) === fold(earlier.name));
  }
  return !isNumber && fold(name) === fold(earlier.name);
}
