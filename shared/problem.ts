import { z } from 'zod';

/** One field that is wrong: `pointer` is a JSON pointer (RFC 6901) into the request body. */
export const fieldErrorSchema = z.object({ pointer: z.string(), detail: z.string() });

/** The one error body (RFC 9457, application/problem+json). */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string().optional(),
  requestId: z.string().optional(),
  errors: z.array(fieldErrorSchema).optional(),
});
export type Problem = z.infer<typeof problemSchema>;
export type FieldError = z.infer<typeof fieldErrorSchema>;
