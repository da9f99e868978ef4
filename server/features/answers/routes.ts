import type { z } from 'zod';
import type { Contract } from '#shared/contract.ts';
import { answersApi } from '#shared/contracts/answers.ts';
import { sendKept } from '../../books/kept-replies.ts';
import { type Context, type Ready, type Route, route } from '../../platform/http.ts';
import { contingencyAnswer } from './contingency.ts';
import type { AnswerInput } from './input.ts';
import { overrunsAnswer } from './overruns.ts';
import { keptAnswer } from './read-model.ts';
import { ruleForCar } from './rule-for-car.ts';
import { ruleReview } from './rule-review.ts';
import { timeToSellAnswer } from './time-to-sell.ts';
import { whatPaysAnswer } from './what-pays.ts';
import { yearAnswer } from './year.ts';

export const answersRoutes: Route[] = [
  route(answersApi.year, (ctx) => reply(ctx, (input) => yearAnswer(input, ctx.query))),
  route(answersApi.whatPays, (ctx) => reply(ctx, (input) => whatPaysAnswer(input, ctx.query))),
  route(answersApi.overruns, (ctx) => reply(ctx, (input) => overrunsAnswer(input, ctx.query))),
  route(answersApi.timeToSell, (ctx) => reply(ctx, (input) => timeToSellAnswer(input, ctx.query))),
  route(answersApi.contingency, (ctx) => reply(ctx, (input) => contingencyAnswer(input, ctx.query))),
  route(answersApi.ruleForCar, (ctx) => reply(ctx, (input) => ruleForCar(input, ctx.query))),
  route(answersApi.ruleReview, (ctx) => reply(ctx, (input) => ruleReview(input, ctx.query))),
];

/** The kept text of this question, or the answer worked out now and checked by its contract. */
async function reply<C extends Contract>(
  ctx: Context<C>,
  workOut: (input: AnswerInput) => z.input<C['response']>,
): Promise<Ready> {
  const { contract, query, services } = ctx;
  const asked = {
    shopId: ctx.actor.shopId,
    today: await ctx.today(),
    question: `${contract.path} ${JSON.stringify(query)}`,
  };
  const kept = await keptAnswer(services.database, asked, (input) =>
    JSON.stringify(contract.response.parse(workOut(input))),
  );
  return sendKept(ctx, kept);
}
