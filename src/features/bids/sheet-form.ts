import { z } from 'zod';
import { type BidFields, bidFieldsSchema } from '#shared/contracts/bids.ts';
import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import { LEVELS } from '#shared/vocabulary.ts';
import { into, optionalCount, optionalPick, optionalText } from '../../lib/form-text.ts';
import { hoursToText, optionalHoursTextSchema } from '../../lib/hours-text.ts';
import { centsTextSchema, centsToText, optionalCentsTextSchema } from '../../lib/money-text.ts';
import { percentTextSchema, percentToText } from './percent-text.ts';

export const RULE_KINDS = ['in force', 'percent', 'two-part', 'flat', 'none'] as const;

/** The costs around a purchase that a field left empty says are nothing. */
const COSTS = [
  'transportCents',
  'titleCents',
  'sellingCents',
  'holdingCentsPerDay',
  'wantedProfitCents',
  'paidLaborCents',
  'wantedCentsPerHour',
] as const;

/** A sheet as its fields hold it. `amounts` is keyed by category; the fee table is edited in its own dialog. */
export type SheetForm = z.input<ReturnType<typeof sheetFormSchema>>;

type Decimal = '.' | ',';

/** Typed text to a sheet. A category left empty has no line; a cost, hours or days left empty are none. */
export function sheetFormSchema(decimal: Decimal) {
  const cost = optionalCentsTextSchema(decimal).transform((cents) => cents ?? 0);
  const hours = optionalHoursTextSchema.transform((seconds) => seconds ?? 0);
  return z
    .object({
      name: z.string(),
      year: optionalCount,
      make: optionalText,
      model: optionalText,
      vin: optionalText,
      odometer: optionalCount,
      titleBrand: optionalText,
      seller: optionalText,
      classId: optionalPick,
      damageId: optionalPick,
      secondDamageId: optionalPick,
      isSeen: z.string().transform((seen) => (seen === '' ? null : seen === 'yes')),
      expectedSaleCents: centsTextSchema(decimal),
      countedSaleCents: optionalCentsTextSchema(decimal),
      amounts: z.record(z.string(), optionalCentsTextSchema(decimal)),
      ruleKind: z.enum(RULE_KINDS),
      level: z.enum(LEVELS),
      flatPercent: optionalCount,
      days: optionalCount.transform((days) => days ?? 0),
      ownSeconds: hours,
      paidSeconds: hours,
      paidLaborCents: cost,
      wantedCentsPerHour: cost,
      transportCents: cost,
      titleCents: cost,
      sellingCents: cost,
      holdingCentsPerDay: cost,
      wantedProfitCents: cost,
      taxPercent: percentTextSchema(decimal),
      feeSteps: bidFieldsSchema.shape.feeSteps,
      feeFlatCents: z.int(),
      bidStepCents: z.int(),
      ticks: z.array(z.string()),
      notes: optionalText,
    })
    .transform(({ amounts, ruleKind, level, flatPercent, taxPercent, ...rest }) => ({
      ...rest,
      tax: taxPercent,
      rule:
        ruleKind === 'flat'
          ? { kind: ruleKind, percent: flatPercent ?? 0 }
          : ruleKind === 'percent' || ruleKind === 'two-part'
            ? { kind: ruleKind, level }
            : { kind: ruleKind },
      lines: Object.entries(amounts).flatMap(([categoryId, cents]) => (cents === null ? [] : [{ categoryId, cents }])),
    }))
    .transform(into(bidFieldsSchema));
}

/** What is typed as a sheet to work with, before it has a name or a sale too; null while a field cannot be read. */
export function readSheet(values: SheetForm, schema: ReturnType<typeof sheetFormSchema>): BidFields | null {
  const name = values.name.trim() || 'no name yet';
  const found = schema.safeParse({ ...values, name, expectedSaleCents: values.expectedSaleCents.trim() || '0' });
  return found.success ? found.data : null;
}

/** The fields of a kept sheet as text; every category of the shop has its field. */
export function sheetForm(sheet: BidFields, basis: Pick<BidBasis, 'categories'>, decimal: Decimal): SheetForm {
  const money = (cents: number | null) => plainMoney(cents, decimal);
  const text = (value: string | number | null) => (value === null ? '' : String(value));
  const costs = Object.fromEntries(COSTS.map((cost) => [cost, money(sheet[cost] || null)]));
  return {
    name: sheet.name,
    year: text(sheet.year),
    make: text(sheet.make),
    model: text(sheet.model),
    vin: text(sheet.vin),
    odometer: text(sheet.odometer),
    titleBrand: text(sheet.titleBrand),
    seller: text(sheet.seller),
    classId: text(sheet.classId),
    damageId: text(sheet.damageId),
    secondDamageId: text(sheet.secondDamageId),
    isSeen: sheet.isSeen === null ? '' : sheet.isSeen ? 'yes' : 'no',
    expectedSaleCents: money(sheet.expectedSaleCents),
    countedSaleCents: money(sheet.countedSaleCents),
    amounts: {
      ...Object.fromEntries(basis.categories.map(({ id }) => [id, ''])),
      ...Object.fromEntries(sheet.lines.map((line) => [line.categoryId, money(line.cents)])),
    },
    ruleKind: sheet.rule.kind,
    level: 'level' in sheet.rule ? sheet.rule.level : '4/5',
    flatPercent: sheet.rule.kind === 'flat' ? text(sheet.rule.percent) : '',
    days: text(sheet.days || null),
    ownSeconds: hoursToText(sheet.ownSeconds || null),
    paidSeconds: hoursToText(sheet.paidSeconds || null),
    taxPercent: percentToText(sheet.tax, decimal),
    feeSteps: sheet.feeSteps.map(([from, fee]) => [from, fee]),
    feeFlatCents: sheet.feeFlatCents,
    bidStepCents: sheet.bidStepCents,
    ticks: [...sheet.ticks],
    notes: text(sheet.notes),
    ...(costs as Record<(typeof COSTS)[number], string>),
  };
}

const NO_CAR = {
  name: '',
  year: null,
  make: null,
  model: null,
  vin: null,
  odometer: null,
  titleBrand: null,
  seller: null,
  classId: null,
  damageId: null,
  secondDamageId: null,
  isSeen: null,
  expectedSaleCents: 0,
  countedSaleCents: null,
  lines: [],
  days: 0,
  ownSeconds: 0,
  paidSeconds: 0,
  paidLaborCents: 0,
  ticks: [],
  notes: null,
};

/** A sheet on which nothing is said of the car yet: the shop's fees and usual costs, wanted pay and rule. */
export function newSheet(basis: BidBasis, decimal: Decimal): SheetForm {
  const { version: _, ...feeTable } = basis.feeTable;
  const start: BidFields = {
    ...feeTable,
    ...NO_CAR,
    rule: basis.ruleInForce ? { kind: 'in force' } : { kind: 'two-part', level: '4/5' },
    wantedCentsPerHour: basis.wantedCentsPerHour ?? 0,
  };
  return { ...sheetForm(start, basis, decimal), expectedSaleCents: '' };
}

/** Cents as a field starts with them, the decimals left out where there are none. */
export function plainMoney(cents: number | null, decimal: Decimal): string {
  return centsToText(cents, decimal).replace(/[.,]00$/, '');
}
