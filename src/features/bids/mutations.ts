import { useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { type Bid, bidsApi, type buySchema, type outcomeSchema } from '#shared/contracts/bids.ts';
import type { FeeTableFields } from '#shared/contracts/bids-parts.ts';
import { ApiProblem } from '../../lib/api-problem.ts';
import { call } from '../../lib/api.ts';
import { useBooksChanged } from '../../lib/books-changed.ts';
import { keep } from '../../lib/kept.ts';
import { basisQuery, bidQuery } from './queries.ts';
import { deliver, type Errand, type Kept, letWait } from './waiting.ts';

export type Outcome = z.input<typeof outcomeSchema>;
export type Purchase = z.input<typeof buySchema>;

/**
 * Keeps a sheet: on the server, or without signal in this browser until there is one (null). Throws what the server
 * refuses, and when this browser keeps nothing.
 */
export function useKeepSheet(home: string) {
  const took = useTookSheet(home);
  return async (errand: Errand): Promise<Kept | null> => {
    try {
      const reply = await deliver(errand);
      await took(reply.bid);
      return reply;
    } catch (problem) {
      const isUnreachable = problem instanceof ApiProblem && problem.status === 0;
      if (isUnreachable && letWait(home, errand)) return null;
      throw problem;
    }
  };
}

/** What becomes of a kept sheet. */
export function useSheetOutcome(home: string) {
  const took = useTookSheet(home);
  const changed = useBooksChanged();
  const place = ({ id, version }: Bid) => ({ params: { bidId: id }, version });
  return {
    /** Not bought and why, or open again. */
    setOutcome: async (bid: Bid, body: Outcome) => took(await call(bidsApi.setOutcome, { ...place(bid), body })),
    /** Makes it a rebuild; resolves to its id. */
    buy: async (bid: Bid, body: Purchase, idempotencyKey: string) => {
      const reply = await call(bidsApi.buy, { ...place(bid), body, idempotencyKey });
      await took(reply.bid);
      await changed();
      return reply.rebuildId;
    },
  };
}

/** Saves the shop's fee table and usual costs over the version that was read. */
export function useChangeFeeTable() {
  const client = useQueryClient();
  return async (table: FeeTableFields, version: number): Promise<void> => {
    const { feeSteps, feeFlatCents, bidStepCents, tax, transportCents } = table;
    const { titleCents, sellingCents, holdingCentsPerDay, wantedProfitCents } = table;
    const usual = { tax, transportCents, titleCents, sellingCents, holdingCentsPerDay, wantedProfitCents };
    await call(bidsApi.changeFeeTable, { body: { feeSteps, feeFlatCents, bidStepCents, ...usual }, version });
    await client.invalidateQueries({ queryKey: basisQuery('').queryKey });
  };
}

/** Puts a sheet as the server has it where pages find it; the lists are read anew. */
function useTookSheet(home: string) {
  const client = useQueryClient();
  return async (bid: Bid): Promise<void> => {
    keep(`${home}sheet.${bid.id}`, bid);
    client.setQueryData(bidQuery(bid.id, home).queryKey, bid);
    await client.invalidateQueries({ queryKey: ['bids', 'list'] });
  };
}
