import * as z from 'zod';
import { advisorySchema, formatSchema, inputErrorSchema, instant, warningSchema } from '../advisory';

/** An advisory as stored: immutable; a correction is a new one that supersedes it. */
export const storedAdvisorySchema = advisorySchema.extend({
  id: z.string(),
  eventId: z.string(),
  sequence: z.number().int().positive(),
  format: formatSchema,
  receivedAt: instant,
  receivedBy: z.string(),
  supersedes: z.string().nullable(),
  warnings: z.array(warningSchema),
});
export type StoredAdvisory = z.infer<typeof storedAdvisorySchema>;

/** Answer to a posted advisory. On a dry run `advisory` has no id and `revision` is the current one. */
export const issuedSchema = z.object({ advisory: storedAdvisorySchema, revision: z.number().int(), warnings: z.array(warningSchema) });
export const dryRunSchema = z.object({ advisory: advisorySchema, format: formatSchema, revision: z.number().int(), warnings: z.array(warningSchema) });

/** RFC 9457 problem details, with the places in the input that are wrong. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string().optional(),
  instance: z.string().optional(),
  errors: z.array(inputErrorSchema).optional(),
});
export type Problem = z.infer<typeof problemSchema>;
