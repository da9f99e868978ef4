import { z } from 'zod';
import type { FeatureApi } from '../contract.ts';

export const healthApi = {
  get: {
    method: 'GET',
    path: '/api/health',
    summary: 'Is the server up, and can it read its books?',
    response: z.object({ status: z.literal('ok') }),
  },
  document: {
    method: 'GET',
    path: '/api/openapi.json',
    summary: 'This document',
    response: z.record(z.string(), z.unknown()),
  },
} as const satisfies FeatureApi;
