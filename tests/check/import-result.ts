import type { Aside, Choice, Reading } from '#shared/contracts/import-reading.ts';
import type { Import, ImportRow } from '#shared/contracts/imports.ts';
import type { EntryRow } from '#shared/contracts/ledger.ts';
import type { HoursRow } from '#shared/contracts/hours.ts';
import type { RebuildDetail, RebuildRow } from '#shared/contracts/rebuilds.ts';
import type { OwnServer } from './own-server.ts';

/** Where a row stands, sheets by their names; a text file's only sheet has none. */
type From = (at: { sheet: number | null; row: number | null }) => { sheet: string | null; row: number | null };
const placer = (reading: Reading): From => {
  const names = new Map(reading.sheets.map(({ number, name }) => [number, name]));
  return ({ sheet, row }) => ({ sheet: names.get(sheet ?? 1) ?? null, row });
};
const imported = (line: { importSheet: number | null; importRow: number | null }) => ({
  sheet: line.importSheet,
  row: line.importRow,
});

type Page<T> = { readonly rows: readonly T[]; readonly next: string | null };
const ASKED_KINDS = new Set([
  'date-order',
  'columns',
  'vehicle',
  'duplicate',
  'sheets',
  'own-labor',
  'sale',
  'amount-column',
  'changed-row',
  'overlap',
]);

/** What an import came to, asked of the API alone, in the result format of the samples' README. */
export async function importResult(server: OwnServer, file: string, done: Import, asked: readonly Choice[]) {
  const { reading } = done;
  if (!reading || done.state !== 'committed') throw new Error(`${file} was not booked`);
  const rows = await all<ImportRow>(server, `/api/imports/${done.id}/rows`);
  const entries = await all<EntryRow>(server, `/api/entries?import=${done.id}`);
  const hours = await all<HoursRow>(server, `/api/hours?import=${done.id}`);
  const list = await all<RebuildRow>(server, '/api/rebuilds');
  const details: RebuildDetail[] = [];
  for (const { id } of list) details.push(await server.get(`/api/rebuilds/${id}`));
  const from = placer(reading);
  const isTotal = (line: HoursRow) => line.workedOn === null && line.workerId === null;
  return {
    file,
    status: 'imported',
    rebuilds: details.map((detail) => rebuildOf(from, detail, hours.filter(isTotal))),
    lines: [
      ...entries.map((entry) => lineOf(from, entry)),
      ...purchasesOf(from, reading, details),
      ...estimatesOf(from, reading, details),
    ],
    hours: hours.filter((line) => !isTotal(line)).map((line) => hoursOf(from, line)),
    rejects: reading.asides.map((aside) => rejectOf(from, aside)),
    nonData: rows.filter(({ outcome }) => outcome === 'not data').map(from),
    flags: [...entries, ...hours].filter(({ isGuess }) => isGuess).map((line) => from(imported(line))),
    importedRows: rows.filter(({ outcome }) => outcome === 'taken').map(from),
    statedTotals: reading.statedTotals
      .filter(({ measure }) => measure === 'money')
      .map((total) => ({ ...from(total), statedCents: total.stated, importedCents: total.imported })),
    choicesAsked: asked
      .filter(({ kind, mustAsk }) => ASKED_KINDS.has(kind) && (mustAsk || kind !== 'vehicle'))
      .map(({ kind, column }) => ({ kind, column })),
    rowBasis: 'line',
    control: {
      rowsRead: reading.control.rowsRead,
      totalCents: reading.control.costCents,
      totalSaleCents: reading.control.saleCents,
    },
  };
}

async function all<T>(server: OwnServer, url: string): Promise<T[]> {
  const rows: T[] = [];
  let cursor: string | null = null;
  do {
    const next: string = cursor === null ? url : `${url}${url.includes('?') ? '&' : '?'}cursor=${cursor}`;
    const page: Page<T> = await server.get(next);
    rows.push(...page.rows);
    cursor = page.next;
  } while (cursor !== null);
  return rows;
}

const rejectOf = (from: From, { sheet, row, col, reason }: Aside) => ({
  ...from({ sheet, row }),
  ...(col ? { col } : {}),
  reason,
});

function rebuildOf(from: From, detail: RebuildDetail, totals: readonly HoursRow[]) {
  const { rebuild, row } = detail;
  const own = totals.filter((line) => line.rebuildId === rebuild.id);
  return {
    ref: rebuild.tag,
    year: rebuild.year,
    make: rebuild.make,
    model: rebuild.model,
    vehicleClass: row.className,
    damage: row.damageName,
    titleBrand: rebuild.titleBrandBought,
    bought: rebuild.boughtOn,
    ready: rebuild.roadworthyOn,
    listed: rebuild.listedOn,
    sold: rebuild.soldOn,
    purchaseCents: rebuild.purchaseCents,
    salePriceCents: rebuild.saleCents,
    hours: own.length > 0 ? own.reduce((sum, line) => sum + line.seconds, 0) / 3600 : null,
    odometer: rebuild.odometer,
    source: from(imported(rebuild)),
  };
}

function lineOf(from: From, entry: EntryRow) {
  return {
    rebuildRef: entry.rebuildTag,
    date: entry.datedOn,
    category: entry.categoryName,
    description: entry.what,
    vendor: entry.vendor,
    amountCents: entry.cents,
    foreseen: entry.foreseen === null ? null : entry.foreseen === 'foreseen',
    estimate: false,
    flagged: entry.isGuess,
    source: { ...from(imported(entry)), ...(entry.importCol ? { col: entry.importCol } : {}) },
  };
}

/** Purchases are facts of a rebuild; their rows stand in the reading, as long as it shows all of them. */
function purchasesOf(from: From, reading: Reading, details: readonly RebuildDetail[]) {
  const lines = reading.firstRows.flatMap((row) => row.lines).filter(({ kind }) => kind === 'purchase');
  return details.flatMap(({ rebuild }) => {
    const own = lines.filter((line) => line.rebuild !== null && reading.rebuilds[line.rebuild]?.tag === rebuild.tag);
    if (own.reduce((sum, line) => sum + line.cents, 0) !== rebuild.purchaseCents) return [];
    return own.map((line) => ({
      rebuildRef: rebuild.tag,
      date: line.on,
      category: 'purchase',
      description: line.what,
      vendor: line.vendor,
      amountCents: line.cents,
      foreseen: null,
      estimate: false,
      flagged: line.isGuess,
      source: { ...from(line), col: line.col },
    }));
  });
}

/** Estimates are kept per category; their rows stand in the reading, as long as it shows all of them. */
function estimatesOf(from: From, reading: Reading, details: readonly RebuildDetail[]) {
  const shown = reading.firstRows.flatMap((row) => row.lines).filter(({ kind }) => kind === 'estimate');
  return details.flatMap(({ rebuild, categories }) =>
    categories
      .filter(({ estimateCents }) => (estimateCents ?? 0) > 0)
      .flatMap(({ name, estimateCents }) => {
        const own = shown.filter(
          (line) =>
            line.rebuild !== null && reading.rebuilds[line.rebuild]?.tag === rebuild.tag && line.category === name,
        );
        const isWhole = own.reduce((sum, line) => sum + line.cents, 0) === estimateCents;
        const whole = { on: rebuild.boughtOn, what: null, cents: estimateCents ?? 0, col: null };
        return (isWhole ? own : [{ ...whole, sheet: rebuild.importSheet, row: rebuild.importRow }]).map((line) => ({
          rebuildRef: rebuild.tag,
          date: line.on,
          category: name,
          description: line.what,
          vendor: null,
          amountCents: line.cents,
          foreseen: null,
          estimate: true,
          source: { ...from(line), ...(line.col ? { col: line.col } : {}) },
        }));
      }),
  );
}

function hoursOf(from: From, line: HoursRow) {
  return {
    rebuildRef: line.rebuildTag,
    date: line.workedOn,
    person: line.workerName,
    hours: line.seconds / 3600,
    task: line.task,
    flagged: line.isGuess,
    source: from(imported(line)),
  };
}
