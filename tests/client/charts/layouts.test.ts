import { describe, expect, test } from 'vitest';
import { type BackTestBar, backTestLayout, ruleRuns } from '../../../src/charts/back-test-layout.ts';
import { cellTone } from '../../../src/charts/cell-tone.ts';
import { dotStripLayout, stripDomain } from '../../../src/charts/dot-strip-layout.ts';
import { GRADE_MARGIN, gradeLineLayout } from '../../../src/charts/grade-line-layout.ts';
import { rangeLinesLayout } from '../../../src/charts/range-lines-layout.ts';
import { stepLineLayout } from '../../../src/charts/step-line-layout.ts';
import { survivalLayout } from '../../../src/charts/survival-layout.ts';
import { waterfallLayout } from '../../../src/charts/waterfall-layout.ts';

describe('kept, added up through the year', () => {
  const year = (start: string, end: string, cents: number[]) => ({
    points: cents.map((amount, at) => ({ on: `${start.slice(0, 4)}-0${at + 2}-01`, cents: amount, label: 'B-1' })),
    start,
    end,
    knownTo: null,
  });

  test('begins at zero, steps at each sale and runs on to the last known day', () => {
    const now = { ...year('2026-01-01', '2027-01-01', [50_000, 20_000]), knownTo: '2026-07-02' };
    const shapes = stepLineLayout(now, null, { width: 431, height: 300 });
    expect(shapes.now[0]).toEqual({ x: 52, y: shapes.y.scale(0) });
    expect(shapes.now).toHaveLength(4);
    // 2 July is day 182 of 365: half way across 431 − 52 − 14 = 365 pixels.
    expect(shapes.now.at(-1)).toEqual({ x: 52 + 182, y: shapes.y.scale(20_000) });
  });

  test('lays the year before over the same days, leap year or not', () => {
    const now = year('2025-01-01', '2026-01-01', [10_000]);
    const before = year('2024-01-01', '2025-01-01', [10_000]);
    const shapes = stepLineLayout(now, before, { width: 600, height: 300 });
    expect(shapes.before?.at(-1)?.x).toBe(shapes.now.at(-1)?.x);
  });

  test('a loss lies below the zero line', () => {
    const shapes = stepLineLayout(year('2026-01-01', '2027-01-01', [-30_000]), null, { width: 600, height: 300 });
    expect(shapes.now.at(-1)?.y).toBeGreaterThan(shapes.y.scale(0));
  });

  test('of nothing but zero names zero once', () => {
    const shapes = stepLineLayout(year('2026-01-01', '2027-01-01', []), null, { width: 600, height: 300 });
    expect(shapes.y.ticks.map((tick) => tick.value)).toEqual([0]);
  });

  test('names fewer months where there is little room', () => {
    const series = year('2026-01-01', '2027-01-01', [1]);
    const months = (width: number) =>
      stepLineLayout(series, null, { width, height: 300 }).months.map((month) => month.label);
    expect(months(360)).toEqual(['Jan', 'Apr', 'Jul', 'Oct']);
    expect(months(900)).toHaveLength(12);
  });
});

describe('where each sale dollar went', () => {
  const size = { width: 1000, labelRoom: 0, figureRoom: 0, rowHeight: 20 };

  test('each cost ends where the one before began, down to what was kept', () => {
    const { bars } = waterfallLayout(
      [
        { label: 'Sold for', cents: 1000, kind: 'total' },
        { label: 'Purchase', cents: 600, kind: 'less' },
        { label: 'Parts', cents: 300, kind: 'less' },
        { label: 'Kept', cents: 100, kind: 'kept' },
      ],
      size,
    );
    expect(bars.map((bar) => [bar.x, bar.width])).toEqual([
      [0, 1000],
      [400, 600],
      [100, 300],
      [0, 100],
    ]);
  });

  test('a loss is drawn left of zero', () => {
    const { bars, zero } = waterfallLayout(
      [
        { label: 'Sold for', cents: 1000, kind: 'total' },
        { label: 'Purchase', cents: 1500, kind: 'less' },
        { label: 'Lost', cents: -500, kind: 'kept' },
      ],
      size,
    );
    expect((bars[2]?.x ?? 0) + (bars[2]?.width ?? 0)).toBeCloseTo(zero);
  });
});

describe('cells of the grid', () => {
  test('empty, too few, and four strengths either way', () => {
    expect(cellTone({ value: null, n: 0 }, 100)).toBe('none');
    expect(cellTone({ value: null, n: 3 }, 100)).toBe('few');
    expect([10, 30, 60, 100].map((value) => cellTone({ value, n: 5 }, 100))).toEqual([
      'gain-1',
      'gain-2',
      'gain-3',
      'gain-4',
    ]);
    expect(cellTone({ value: -100, n: 5 }, 100)).toBe('loss-4');
  });
});

describe('dots by category', () => {
  const row = (rates: number[]) => ({
    label: 'parts',
    n: rates.length,
    dots: rates.map((rate) => ({ rate, label: 'B-1' })),
    middle: 0.1,
    low: -0.1,
    high: 0.3,
    surpriseShare: null,
  });
  const size = { width: 800, labelRoom: 100, figureRoom: 100, rowHeight: 40, stripAt: 20 };

  test('one far rebuild does not flatten the rest: it is cut at the edge and says so', () => {
    const rates = [...Array.from({ length: 60 }, (_, at) => at / 100 - 0.2), 9];
    expect(stripDomain([row(rates)]).high).toBeLessThan(0.6);
    const { rows } = dotStripLayout([row(rates)], size);
    expect(rows[0]?.placed.filter((dot) => dot.isCut).map((dot) => dot.rate)).toEqual([9]);
  });

  test('equal dots do not hide each other', () => {
    const { rows } = dotStripLayout([row([0.1, 0.1, 0.1])], size);
    expect(new Set(rows[0]?.placed.map((dot) => dot.y)).size).toBe(3);
  });

  test('300 rebuilds are dots in every category that they occur in', () => {
    const many = row(Array.from({ length: 300 }, () => 0));
    const { rows } = dotStripLayout([many, many], size);
    expect(rows.map((one) => one.placed.length)).toEqual([300, 300]);
  });

  test('above 300 rebuilds only the lines are drawn', () => {
    const { rows } = dotStripLayout([row(Array.from({ length: 301 }, () => 0))], size);
    expect(rows[0]?.placed).toEqual([]);
    expect(rows[0]?.middleX).not.toBeNull();
  });
});

describe('each rebuild against its rule', () => {
  const bar = (rate: number, ruleRate: number | null, shortCents: number | null, year = 2024): BackTestBar => ({
    label: 'B-1',
    year,
    rate,
    ruleRate,
    shortCents,
  });
  const write = (cents: number) => String(cents);

  test('bars stand on zero, up for over and down for under', () => {
    const { bars, y } = backTestLayout([bar(0.4, 0.2, 100), bar(-0.2, 0.2, 0)], { width: 400, height: 300 }, write);
    expect((bars[0]?.y ?? 0) + (bars[0]?.height ?? 0)).toBeCloseTo(y.scale(0));
    expect(bars[1]?.y).toBeCloseTo(y.scale(0));
  });

  test('only the short ones are labelled, and a label that would collide gives way to the larger', () => {
    const bars = [bar(0.4, 0.2, 100), bar(0.4, 0.2, 900), bar(0.1, 0.2, 0), bar(0.9, null, null)];
    const { labels } = backTestLayout(bars, { width: 120, height: 300 }, write);
    expect(labels.map((label) => label.text)).toEqual(['-900']);
  });

  test('a year is named where it begins', () => {
    const bars = [bar(0, null, null, 2023), bar(0, null, null, 2023), bar(0, null, null, 2024)];
    const { years } = backTestLayout(bars, { width: 400, height: 300 }, write);
    expect(years.map((mark) => mark.year)).toEqual([2023, 2024]);
  });

  test('the rule is not drawn where there was none', () => {
    const runs = ruleRuns(
      [
        { x: 0, ruleY: null },
        { x: 10, ruleY: 5 },
        { x: 20, ruleY: null },
        { x: 30, ruleY: 7 },
      ],
      10,
    );
    expect(runs).toEqual([
      [
        { x: 10, y: 5 },
        { x: 20, y: 5 },
      ],
      [
        { x: 30, y: 7 },
        { x: 40, y: 7 },
      ],
    ]);
  });
});

test('ranges: a group without rebuilds has no line, and its words begin at zero', () => {
  const { rows, axis } = rangeLinesLayout(
    [
      { label: 'Front', n: 17, low: 0, high: 0.4, value: 0.29, note: 'add 29%' },
      { label: 'Theft', n: 1, low: null, high: null, value: null, note: 'too few yet' },
    ],
    { width: 600, labelRoom: 150, rowHeight: 30, lineAt: 15, noteRoom: 120 },
  );
  expect(rows[1]).toMatchObject({ lowX: null, highX: null, noteX: axis.scale(0) + 9 });
  expect(rows[0]?.noteX).toBe(axis.scale(0.4) + 9);
});

test('still unsold: every curve begins at all of them, and labels keep apart', () => {
  const group = (share: number) => ({
    label: 'SUV',
    n: 5,
    medianDays: null,
    steps: [{ day: 30, share, low: null, high: null }],
  });
  const { groups, y } = survivalLayout([group(0.5), group(0.5), group(0.49)], { width: 600, height: 300 });
  for (const one of groups) expect(one.line[0]?.y).toBe(y(1));
  const places = groups.map((one) => one.labelY).sort((a, b) => a - b);
  expect((places[1] ?? 0) - (places[0] ?? 0)).toBeGreaterThanOrEqual(17);
  expect((places[2] ?? 0) - (places[1] ?? 0)).toBeGreaterThanOrEqual(17);
  expect(groups[0]?.band).toEqual([]);
});

describe('the line of grades', () => {
  const grade = (label: string, rate: number | null) => ({
    label,
    note: '',
    share: 0.8,
    rate,
    ...(rate === null ? { low: null, high: null } : { low: rate - 0.2, high: Math.min(1, rate + 0.1) }),
  });
  const size = { width: 458, height: 258 };

  test('is always drawn over the whole of 0 to 100 %', () => {
    const { y } = gradeLineLayout([grade('2025', 0.75)], size);
    expect([y(0), y(1)]).toEqual([258 - GRADE_MARGIN.bottom, GRADE_MARGIN.top]);
  });

  test('joins the years that were judged and leaves out one with nothing to judge', () => {
    const { grades, line } = gradeLineLayout([grade('2024', 0.5), grade('2025', null), grade('2026', 1)], size);
    // 400 pixels for three: at most 150 each, so 133⅓, and their middles.
    expect(grades.map(({ x }) => Math.round(x))).toEqual([113, 246, 379]);
    expect(line.map(({ x }) => Math.round(x))).toEqual([113, 379]);
    expect(grades[1]).toMatchObject({ rateY: null, lowY: null, highY: null });
  });

  test('keeps its marks in a window without room', () => {
    expect(gradeLineLayout([grade('2025', 0.5)], { width: 20, height: 100 }).dash).toBeGreaterThan(0);
    expect(gradeLineLayout([], size).line).toEqual([]);
  });
});
