import { infiniteQueryOptions, queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import { type Bid, bidSchema, bidsApi, type BidState } from '#shared/contracts/bids.ts';
import { type BidBasis, bidBasisSchema } from '#shared/contracts/bids-basis.ts';
import { call } from '../../lib/api.ts';
import { keep, kept } from '../../lib/kept.ts';

/** What sheets are worked out from, kept in this browser for where there is no signal. `home`: see `mine` in lib/kept. */
export const basisQuery = (home: string) =>
  queryOptions({
    queryKey: ['bids', 'basis'],
    queryFn: async ({ signal }): Promise<BidBasis> => {
      const basis = await call(bidsApi.basis, { signal });
      keep(`${home}basis`, basis);
      return basis;
    },
    ...fromKept(`${home}basis`, bidBasisSchema),
  });

/** One kept sheet; once opened, it opens without signal too. */
export const bidQuery = (bidId: string, home: string) =>
  queryOptions({
    queryKey: ['bids', 'one', bidId],
    queryFn: async ({ signal }): Promise<Bid> => {
      const bid = await call(bidsApi.get, { params: { bidId }, signal });
      keep(`${home}sheet.${bidId}`, bid);
      return bid;
    },
    ...fromKept(`${home}sheet.${bidId}`, bidSchema),
  });

/** Kept sheets, the latest first, page by page; null = in every state. */
export const bidsQuery = (state: BidState | null) =>
  infiniteQueryOptions({
    queryKey: ['bids', 'list', state],
    queryFn: ({ pageParam, signal }) =>
      call(bidsApi.list, {
        query: { ...(state ? { state } : {}), ...(pageParam ? { cursor: pageParam } : {}) },
        signal,
      }),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.next,
  });

/** Starts from what was kept, and asks the server at once all the same. */
function fromKept<S extends z.ZodType>(name: string, schema: S) {
  return {
    initialData: () => {
      const found = schema.safeParse(kept(name));
      return found.success ? found.data : undefined;
    },
    initialDataUpdatedAt: 0,
  };
}
