import type { FeatureApi } from '../contract.ts';
import { contingencyAnswerSchema, contingencyQuerySchema } from './answers-contingency.ts';
import { ruleForCarQuerySchema, ruleForCarSchema } from './answers-rule-for-car.ts';
import { ruleReviewQuerySchema, ruleReviewSchema } from './answers-rule-review.ts';
import { overrunsAnswerSchema } from './answers-overruns.ts';
import { answerQuerySchema, yearQuerySchema } from './answers-parts.ts';
import { timeToSellAnswerSchema } from './answers-time-to-sell.ts';
import { whatPaysAnswerSchema, whatPaysQuerySchema } from './answers-what-pays.ts';
import { yearAnswerSchema } from './answers-year.ts';

/** The answers, each with all its figures, how many rebuilds they rest on, and what is left out and why. */
export const answersApi = {
  year: {
    method: 'GET',
    path: '/api/answers/year',
    summary: 'Did the work pay this year?',
    query: yearQuerySchema,
    response: yearAnswerSchema,
  },
  whatPays: {
    method: 'GET',
    path: '/api/answers/what-pays',
    summary: 'Which wrecks pay?',
    query: whatPaysQuerySchema,
    response: whatPaysAnswerSchema,
  },
  overruns: {
    method: 'GET',
    path: '/api/answers/overruns',
    summary: 'Where does the money run over?',
    query: answerQuerySchema,
    response: overrunsAnswerSchema,
  },
  timeToSell: {
    method: 'GET',
    path: '/api/answers/time-to-sell',
    summary: 'How long until the money is back?',
    query: answerQuerySchema,
    response: timeToSellAnswerSchema,
  },
  contingency: {
    method: 'GET',
    path: '/api/answers/contingency',
    summary: "How much cushion should next year's budgets carry?",
    query: contingencyQuerySchema,
    response: contingencyAnswerSchema,
  },
  ruleForCar: {
    method: 'GET',
    path: '/api/answers/rule-for-car',
    summary: 'What cushion does such a car ask for, and on which past rebuilds does that rest?',
    query: ruleForCarQuerySchema,
    response: ruleForCarSchema,
  },
  ruleReview: {
    method: 'GET',
    path: '/api/answers/rule-review',
    summary: 'Did the rule hold? Judged only on rebuilds bought after it was adopted',
    query: ruleReviewQuerySchema,
    response: ruleReviewSchema,
  },
} as const satisfies FeatureApi;
