import { queryOptions } from '@tanstack/react-query';
import { answersApi } from '#shared/contracts/answers.ts';
import type { FilterQuery } from '#shared/contracts/answers-parts.ts';
import type { LevelName } from '#shared/vocabulary.ts';
import { call } from '../../lib/api.ts';

/** Every answer's key begins so: what changes the books makes all of them old. */
export const ANSWERS_KEY = ['answers'] as const;

/** A shop year; null = the one that runs. */
export const yearQuery = (year: number | null) =>
  queryOptions({
    queryKey: [...ANSWERS_KEY, 'year', year],
    queryFn: ({ signal }) => call(answersApi.year, { query: year === null ? {} : { year }, signal }),
  });

export const whatPaysQuery = (filter: FilterQuery) =>
  queryOptions({
    queryKey: [...ANSWERS_KEY, 'what-pays', filter],
    queryFn: ({ signal }) => call(answersApi.whatPays, { query: filter, signal }),
  });

export const overrunsQuery = (filter: FilterQuery) =>
  queryOptions({
    queryKey: [...ANSWERS_KEY, 'overruns', filter],
    queryFn: ({ signal }) => call(answersApi.overruns, { query: filter, signal }),
  });

export const timeToSellQuery = (filter: FilterQuery) =>
  queryOptions({
    queryKey: [...ANSWERS_KEY, 'time-to-sell', filter],
    queryFn: ({ signal }) => call(answersApi.timeToSell, { query: filter, signal }),
  });

export const contingencyQuery = (filter: FilterQuery, level: LevelName) =>
  queryOptions({
    queryKey: [...ANSWERS_KEY, 'contingency', filter, level],
    queryFn: ({ signal }) => call(answersApi.contingency, { query: { ...filter, level }, signal }),
  });
