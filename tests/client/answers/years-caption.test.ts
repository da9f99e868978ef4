import { expect, test } from 'vitest';
import { createFormatter } from '#shared/formatter.ts';
import { yearsCaption } from '../../../src/features/answers/year/years-table.tsx';

const format = createFormatter({ currency: 'USD', locale: 'en-US' });
const say = (...kept: number[]) =>
  yearsCaption(
    kept.map((cents, at) => ({ year: 2021 + at, keptCents: cents })),
    format,
  );

test('the picture of all years says how many kept money, what they kept together and which did best', () => {
  expect(say(577_300, -511_600, 1_940_600)).toBe(
    'Two of three years kept money: $20,063 was kept all together; the best was 2023, with $19,406.',
  );
});

test('where every year lost money none is called the best', () => {
  expect(say(-10_000, -20_000)).toBe('None of two years kept money: $300 was lost all together.');
});
