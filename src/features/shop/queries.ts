import { queryOptions } from '@tanstack/react-query';
import { shopApi } from '#shared/contracts/shop.ts';
import { call } from '../../lib/api.ts';

/** The shop and how it counts. */
export const shopQuery = () => queryOptions({ queryKey: ['shop'], queryFn: () => call(shopApi.get) });
