import { queryOptions } from '@tanstack/react-query';
import { answersApi } from '#shared/contracts/answers.ts';
import type { AnswerQuery, FilterQuery, YearQuery } from '#shared/contracts/answers-parts.ts';
import type { WhatPaysQuery } from '#shared/contracts/answers-what-pays.ts';
import type { LevelName } from '#shared/vocabulary.ts';
import { call } from '../../lib/api.ts';

/** Every answer's key begins so: what changes the books makes all of them old. */
export const ANSWERS_KEY = ['answers'] as const;

/** A shop year; without one, that which runs. */
export const yearQuery = (query: YearQuery) =>
  queryOptions({
    queryKey: [...ANSWERS_KEY, 'year', query],
    queryFn: ({ signal }) => call(answersApi.year, { query, signal }),
  });

export const whatPaysQuery = (query: WhatPaysQuery) =>
  queryOptions({
    queryKey: [...ANSWERS_KEY, 'what-pays', query],
    queryFn: ({ signal }) => call(answersApi.whatPays, { query, signal }),
  });

export const overrunsQuery = (query: AnswerQuery) =>
  queryOptions({
    queryKey: [...ANSWERS_KEY, 'overruns', query],
    queryFn: ({ signal }) => call(answersApi.overruns, { query, signal }),
  });

export const timeToSellQuery = (query: AnswerQuery) =>
  queryOptions({
    queryKey: [...ANSWERS_KEY, 'time-to-sell', query],
    queryFn: ({ signal }) => call(answersApi.timeToSell, { query, signal }),
  });

export const contingencyQuery = (filter: FilterQuery, level: LevelName) =>
  queryOptions({
    queryKey: [...ANSWERS_KEY, 'contingency', filter, level],
    queryFn: ({ signal }) => call(answersApi.contingency, { query: { ...filter, level }, signal }),
  });
