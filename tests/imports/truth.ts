import { readFileSync } from 'node:fs';
import path from 'node:path';
import { z } from 'zod';
import type { Reading } from '#shared/contracts/import-reading.ts';
import { linesOf } from './support.ts';

/** The truth beside each sample (`NAME.truth.json`), as far as it is compared here. */
const sourceSchema = z.object({ sheet: z.string().nullable(), row: z.int(), col: z.int().optional() });
const truthSchema = z.object({
  canonical: z.object({
    rebuilds: z.array(
      z.object({
        ref: z.string(),
        year: z.int(),
        make: z.string().nullable(),
        model: z.string(),
        vehicleClass: z.string().nullable(),
        damage: z.string().nullable(),
        titleBrand: z.string().nullable(),
        bought: z.string().nullable(),
        ready: z.string().nullable(),
        sold: z.string().nullable(),
        purchaseCents: z.int().nullable(),
        salePriceCents: z.int().nullable(),
        odometer: z.int().nullable(),
        acceptable: z.object({ make: z.array(z.string().nullable()).optional() }).optional(),
      }),
    ),
    lines: z.array(
      z.object({
        rebuildRef: z.string(),
        date: z.string().nullable(),
        category: z.string(),
        description: z.string(),
        vendor: z.string().nullable(),
        amountCents: z.int(),
        foreseen: z.boolean().nullable(),
        estimate: z.boolean(),
        lenient: z.array(z.string()).optional(),
        source: sourceSchema,
      }),
    ),
    hours: z.array(
      z.object({
        rebuildRef: z.string(),
        date: z.string(),
        person: z.string(),
        hours: z.number(),
        task: z.string(),
        source: sourceSchema,
      }),
    ),
  }),
  rejects: z.array(z.object({ sheet: z.string().nullable(), row: z.int(), col: z.int(), reason: z.string() })),
  undecidable: z.array(
    z.object({
      source: sourceSchema,
      acceptable: z.array(
        z.object({
          outcome: z.string(),
          reason: z.array(z.string()).optional(),
          flagged: z.boolean().optional(),
          lines: z
            .array(z.object({ amountCents: z.int(), category: z.string(), date: z.string().nullable() }))
            .optional(),
        }),
      ),
    }),
  ),
  nonData: z.array(z.object({ sheet: z.string().nullable(), row: z.int(), kind: z.string() })),
  blankRows: z.array(z.object({ rows: z.array(z.tuple([z.int(), z.int()])) })),
  statedTotals: z.array(z.object({ statedCents: z.int(), importedCents: z.int(), source: sourceSchema })),
  control: z.object({
    rowsRead: z.int(),
    totalCents: z.int(),
    totalSaleCents: z.int(),
    totalCentsByCategory: z.record(z.string(), z.int()),
    estimateCents: z.int(),
  }),
});
export type Truth = z.infer<typeof truthSchema>;

export function truthOf(name: string): Truth {
  const file = path.resolve(import.meta.dirname, '../fixtures/spreadsheets', `${name}.truth.json`);
  return truthSchema.parse(JSON.parse(readFileSync(file, 'utf8')));
}

/** The lines of the truth in the form that `readLines` gives, refs replaced by year and model. */
export function trueLines(truth: Truth, lenient: readonly string[]) {
  const nameOf = new Map(truth.canonical.rebuilds.map((rebuild) => [rebuild.ref, `${rebuild.year} ${rebuild.model}`]));
  return truth.canonical.lines.map((line) => ({
    rebuild: nameOf.get(line.rebuildRef),
    category: line.category,
    cents: line.amountCents,
    isEstimate: line.estimate,
    ...(lenient.includes('date') ? {} : { date: line.date }),
    ...(lenient.includes('description') ? {} : { what: line.description }),
    ...(lenient.includes('vendor') ? {} : { vendor: line.vendor }),
    foreseen: line.foreseen === null ? null : line.foreseen ? 'foreseen' : 'surprise',
    sheet: line.source.sheet,
    row: line.source.row,
    col: line.source.col,
  }));
}

/** The costs that a reading holds, purchases among them, without the fields that the truth is lenient about. */
export function readLines(reading: Reading, lenient: readonly string[]) {
  return linesOf(reading)
    .filter((line) => ['entry', 'purchase', 'estimate'].includes(line.kind))
    .map((line) => ({
      rebuild: rebuildName(reading, line.rebuild),
      category: line.kind === 'purchase' ? 'purchase' : line.category,
      cents: line.cents,
      isEstimate: line.kind === 'estimate',
      ...(lenient.includes('date') ? {} : { date: line.on }),
      ...(lenient.includes('description') ? {} : { what: line.what }),
      ...(lenient.includes('vendor') ? {} : { vendor: line.vendor }),
      foreseen: line.foreseen,
      sheet: sheetOf(reading, line),
      row: line.row,
      col: line.col,
    }));
}

export function trueHours(truth: Truth) {
  const nameOf = new Map(truth.canonical.rebuilds.map((rebuild) => [rebuild.ref, `${rebuild.year} ${rebuild.model}`]));
  return truth.canonical.hours.map((line) => ({
    rebuild: nameOf.get(line.rebuildRef),
    on: line.date,
    person: line.person,
    seconds: line.hours * 3600,
    what: line.task,
    sheet: line.source.sheet,
    row: line.source.row,
  }));
}

export function readHoursLines(reading: Reading) {
  return linesOf(reading)
    .filter(({ kind }) => kind === 'hours')
    .map(({ rebuild, on, person, seconds, what, sheet, row }) => ({
      rebuild: rebuildName(reading, rebuild),
      on,
      person,
      seconds,
      what,
      sheet: sheetOf(reading, { sheet }),
      row,
    }));
}

/** The name of the sheet that something stands on; null in a text file. */
export function sheetOf(reading: Reading, at: { readonly sheet: number }): string | null {
  return reading.sheets.find(({ number }) => number === at.sheet)?.name ?? null;
}

function rebuildName(reading: Reading, place: number | null): string | null {
  const found = place === null ? undefined : reading.rebuilds[place];
  return found ? `${found.year} ${found.model}` : null;
}

/** Facts of the rebuilds: the truth's, with a make left out where the truth accepts none. */
export function trueFacts(truth: Truth, reading: Reading) {
  return truth.canonical.rebuilds.map((rebuild) => {
    const found = reading.rebuilds.find((one) => one.year === rebuild.year && one.model === rebuild.model);
    const mayLackMake = rebuild.acceptable?.make?.includes(found?.make ?? null) ?? false;
    return {
      year: rebuild.year,
      make: mayLackMake ? (found?.make ?? null) : rebuild.make,
      model: rebuild.model,
      className: rebuild.vehicleClass,
      damageName: rebuild.damage,
      titleBrand: rebuild.titleBrand,
      boughtOn: rebuild.bought,
      roadworthyOn: rebuild.ready,
      soldOn: rebuild.sold,
      purchaseCents: rebuild.purchaseCents,
      saleCents: rebuild.salePriceCents,
      odometer: rebuild.odometer,
    };
  });
}

export function readFacts(reading: Reading) {
  return reading.rebuilds.map((found) => ({
    year: found.year,
    make: found.make,
    model: found.model,
    className: found.className,
    damageName: found.damageName,
    titleBrand: found.titleBrand,
    boughtOn: found.dates.boughtOn ?? null,
    roadworthyOn: found.dates.roadworthyOn ?? null,
    soldOn: found.dates.soldOn ?? null,
    purchaseCents: found.purchaseCents,
    saleCents: found.saleCents,
    odometer: found.odometer,
  }));
}
