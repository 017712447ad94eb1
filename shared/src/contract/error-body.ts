import { z } from 'zod';

/** Body of every answer that says no. `facts` are the values a text for people needs; `requestId` finds it in the log. */
export const errorBodySchema = z.object({
  code: z.string(),
  message: z.string(),
  facts: z.record(z.string(), z.unknown()),
  requestId: z.string(),
});
export type ErrorBody = z.infer<typeof errorBodySchema>;
