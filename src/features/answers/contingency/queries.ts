import { queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import { answersApi } from '#shared/contracts/answers.ts';
import type { ruleForCarQuerySchema } from '#shared/contracts/answers-rule-for-car.ts';
import { call } from '../../../lib/api.ts';
import { ANSWERS_KEY } from '../queries.ts';

export type AskedCar = z.input<typeof ruleForCarQuerySchema>;

/** The rule for a car, by the ids of this shop's lists. */
export const ruleForCarQuery = (car: AskedCar) =>
  queryOptions({
    queryKey: [...ANSWERS_KEY, 'rule-for-car', car],
    queryFn: ({ signal }) => call(answersApi.ruleForCar, { query: car, signal }),
  });

/** How the rule of a year held; null = the latest that can be judged. */
export const ruleReviewQuery = (year: number | null) =>
  queryOptions({
    queryKey: [...ANSWERS_KEY, 'rule-review', year],
    queryFn: ({ signal }) => call(answersApi.ruleReview, { query: year === null ? {} : { year }, signal }),
  });
