import * as z from 'zod';
import { instant } from '../advisory';
import { LAYER_KINDS } from '../exposure';

export const layerSchema = z.object({
  id: z.string(),
  eventId: z.string(),
  kind: z.enum(LAYER_KINDS),
  name: z.string(),
  /** Rises by one each time a layer of this name and kind is brought in again. */
  version: z.number().int().positive(),
  rows: z.number().int(),
  classes: z.array(z.object({ class: z.string(), count: z.number().int() })),
  receivedAt: instant,
  receivedBy: z.string(),
});
export type Layer = z.infer<typeof layerSchema>;

export const rejectedRowSchema = z.object({ row: z.number().int(), column: z.string().optional(), message: z.string() });
export const layerStoredSchema = z.object({ layer: layerSchema, accepted: z.number().int(), rejected: z.array(rejectedRowSchema) });
