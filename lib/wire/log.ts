import * as z from 'zod';
import { instant } from '../advisory';

export const newLogEntrySchema = z.object({
  kind: z.enum(['decision', 'handover', 'note']),
  text: z.string().trim().min(1, 'say what was decided').max(4000),
  zoneId: z.string().max(120).optional(),
});
export const logEntrySchema = z.object({
  id: z.string(),
  eventId: z.string(),
  sequence: z.number().int().positive(),
  kind: z.enum(['decision', 'handover', 'note', 'system']),
  text: z.string(),
  zoneId: z.string().nullable(),
  by: z.string(),
  /** On the event's clock, and on the wall clock. */
  at: instant,
  recordedAt: instant,
});
export type LogEntry = z.infer<typeof logEntrySchema>;
