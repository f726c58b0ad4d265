import type { z } from 'zod';
import type { dryRunSchema, issuedSchema } from '../../lib/wire';
import { query, request } from '../http/request';
import type { Source } from './source';

export type DryRun = z.infer<typeof dryRunSchema>;
export type Issued = z.infer<typeof issuedSchema>;
export interface DeckChoice {
  technique?: string | undefined;
  cycle?: string | undefined;
}

const path = (eventId: string, parameters: Record<string, string | boolean | undefined>): string => `/events/${encodeURIComponent(eventId)}/advisories${query(parameters)}`;
const headers = (source: Source): Record<string, string> => ({ 'x-file-name': encodeURIComponent(source.name) });

/** Reads and checks; stores nothing. */
export async function readForecast(eventId: string, source: Source, choice: DeckChoice): Promise<DryRun> {
  const response = await request(path(eventId, { dryRun: true, ...choice }), { method: 'POST', body: source.body, contentType: source.contentType, headers: headers(source) });
  return (await response.json()) as DryRun;
}

/** Issues what was read. The key makes a repeated press the same advisory. */
export async function issueForecast(eventId: string, source: Source, choice: DeckChoice, key: string): Promise<Issued> {
  const response = await request(path(eventId, { ...choice }), { method: 'POST', body: source.body, contentType: source.contentType, headers: { ...headers(source), 'idempotency-key': key } });
  return (await response.json()) as Issued;
}
