import * as z from 'zod';
import { advisorySchema } from '../../lib/advisory';
import { assetRowSchema, impactSchema, zoneRowSchema } from '../../lib/impact';
import { dryRunSchema, eventSchema, identitySchema, issuedSchema, keySchema, layerSchema, layerStoredSchema, listOf, logEntrySchema, madeKeySchema, personSchema, problemSchema, storedAdvisorySchema } from '../../lib/wire';

/** Names of the parts in the API's description. */
export const named = z.registry<{ id: string }>();
for (const [id, schema] of Object.entries({
  Advisory: advisorySchema,
  StoredAdvisory: storedAdvisorySchema,
  Issued: issuedSchema,
  DryRun: dryRunSchema,
  Event: eventSchema,
  Impact: impactSchema,
  ZoneRow: zoneRowSchema,
  AssetRow: assetRowSchema,
  Layer: layerSchema,
  LayerStored: layerStoredSchema,
  LogEntry: logEntrySchema,
  Key: keySchema,
  MadeKey: madeKeySchema,
  Identity: identitySchema,
  Person: personSchema,
  Problem: problemSchema,
})) {
  named.add(schema, { id });
}

const MOST_ROWS = 1000;

/** A part of a list. */
export const page = {
  offset: z.coerce.number().int().min(0).default(0),
  limit: z.coerce.number().int().min(1).max(MOST_ROWS).default(100),
};
export const pageQuery = z.strictObject(page);

/** A revision of an event; without it, the newest. Stores count them in 32 bits. */
export const revision = z.coerce.number().int().positive().max(2 ** 31 - 1).optional();

const id = z.string().min(1).max(100);
export const eventPath = z.object({ id });
export const advisoryPath = z.object({ id, advisoryId: id });
export const layerPath = z.object({ id, layerId: id });

/** What every route may answer besides its own: a problem document. */
export const refusals = { default: { description: 'A problem document (RFC 9457)', content: { 'application/problem+json': { schema: problemSchema } } } };

export const answers = <S extends 200 | 201, T extends z.ZodType>(status: S, schema: T) => ({ [status]: schema, ...refusals }) as Record<S, T> & typeof refusals;
export const listAnswer = <T extends z.ZodType>(item: T) => ({ 200: listOf(item), ...refusals });

/** An answer that is a file of one of these types. */
export const fileAnswer = (description: string, ...contentTypes: string[]) => ({
  200: { description, content: Object.fromEntries(contentTypes.map((type) => [type, { schema: type.includes('json') ? z.unknown() : z.string() }])) },
  ...refusals,
});
