import { z } from 'zod';
import type { Line, RebuildFrame } from '../../server/domain/facts-from-lines.ts';
import { isDay } from '#shared/day.ts';
import { OTHER_EXITS } from '#shared/vocabulary.ts';
import { bidSchema, ladderSchema, type Questions, wholeSeconds } from './portfolio-questions.ts';

/** A reference portfolio (definitions §18, format 1 or 2) in the words of the domain. */
export interface Portfolio extends Questions {
  readonly format: 1 | 2;
  readonly name: string;
  readonly asOf: string;
  readonly startMonth: number;
  readonly wantedCentsPerHour: number | null;
  readonly overhead: readonly { readonly on: string; readonly cents: number }[];
  readonly rebuilds: readonly PortfolioRebuild[];
}

export interface PortfolioRebuild {
  readonly frame: RebuildFrame;
  readonly lines: readonly Line[];
}

const day = z.string().refine(isDay, 'not a day');
const cents = z.int();
const hours = z.number().min(0).nullish();

const lineSchema = z.object({
  date: day.nullish(),
  category: z.string(),
  cents,
  foreseen: z.boolean().nullish(),
  extra: z.boolean().optional(),
  free_value_cents: cents.min(0).nullish(),
});

const projectSchema = z.object({
  id: z.string(),
  class: z.string().nullish(),
  damage: z.string().nullish(),
  bought: day.nullish(),
  ready: day.nullish(),
  listed: day.nullish(),
  sold: day.nullish(),
  purchase_cents: cents.nullish(),
  sale_cents: cents.nullish(),
  exit: z.object({ kind: z.enum(OTHER_EXITS), on: day, proceeds_cents: cents }).nullish(),
  seen: z.boolean().nullish(),
  hours,
  own_hours: hours,
  paid_hours: hours,
  estimates: z.record(z.string(), cents.min(0)),
  costs: z.array(lineSchema),
});
type Project = z.infer<typeof projectSchema>;

const portfolioSchema = z.object({
  format: z.union([z.literal(1), z.literal(2)]).default(1),
  portfolio: z.string(),
  as_of: day,
  year_start_month: z.int().min(1).max(12).default(1),
  wanted_cents_per_hour: z.number().nullish(),
  overhead: z.array(z.object({ date: day, cents })).default([]),
  ladder: z.array(ladderSchema).default([]),
  bids: z.array(bidSchema).default([]),
  projects: z.array(projectSchema),
});

/** Reads a portfolio; throws on what §1 and §18 refuse, with the reason. */
export function readPortfolio(json: unknown): Portfolio {
  const file = portfolioSchema.parse(json);
  const late = file.overhead.find(({ date }) => date > file.as_of);
  if (late) throw new RangeError(`overhead of ${late.date} is after the as-of day`);
  return {
    format: file.format,
    name: file.portfolio,
    asOf: file.as_of,
    startMonth: file.year_start_month,
    wantedCentsPerHour: file.wanted_cents_per_hour ?? null,
    overhead: file.overhead.map(({ date, cents: amount }) => ({ on: date, cents: amount })),
    ladder: file.ladder,
    bids: file.bids,
    rebuilds: file.projects.map((project) => {
      const refusal = whyRefused(project, file.as_of);
      if (refusal) throw new RangeError(`${project.id}: ${refusal}`);
      return { frame: frameOf(project), lines: project.costs.map(lineOf) };
    }),
  };
}

function whyRefused(project: Project, asOf: string): string | null {
  const { sold, sale_cents: sale, exit, costs } = project;
  if (sold && exit) return 'sold and another exit together';
  if (sold && (sale ?? null) === null) return 'sold without a price';
  if (!sold && (sale ?? null) !== null) return 'a price without a sale';
  if ((sold ?? exit?.on ?? asOf) > asOf) return 'an exit after the as-of day';
  const paidFree = costs.some((line) => (line.free_value_cents ?? null) !== null && line.cents !== 0);
  return paidFree ? 'a free line that was paid for' : null;
}

function frameOf(project: Project): RebuildFrame {
  const { sold, exit } = project;
  return {
    id: project.id,
    class: project.class ?? null,
    damage: project.damage ?? null,
    seen: project.seen ?? null,
    boughtOn: project.bought ?? null,
    readyOn: project.ready ?? null,
    listedOn: project.listed ?? null,
    exit: sold
      ? { kind: 'sold', on: sold, proceedsCents: project.sale_cents ?? 0 }
      : exit
        ? { kind: exit.kind, on: exit.on, proceedsCents: exit.proceeds_cents }
        : null,
    purchaseCents: project.purchase_cents ?? null,
    ownSeconds: seconds(project.own_hours === undefined ? project.hours : project.own_hours),
    paidSeconds: seconds(project.paid_hours),
    estimates: new Map(Object.entries(project.estimates)),
  };
}

function lineOf(line: Project['costs'][number]): Line {
  return {
    on: line.date ?? null,
    category: line.category,
    cents: line.cents,
    isForeseen: line.foreseen ?? null,
    isExtra: line.extra ?? false,
    freeCents: line.free_value_cents ?? null,
  };
}

function seconds(value: number | null | undefined): number | null {
  return value === null || value === undefined ? null : wholeSeconds(value);
}
