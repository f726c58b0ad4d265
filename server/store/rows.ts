import { impactSchema } from '../../lib/impact';
import type { Impact } from '../../lib/impact';
import { layerSchema, logEntrySchema, storedAdvisorySchema } from '../../lib/wire';
import type { Layer, LogEntry, StoredAdvisory } from '../../lib/wire';
import type { EventRecord } from './model';
import type { Tables } from './tables';

/** Columns of an advisory and a layer without their bytes. */
export const ADVISORY_COLUMNS = ['id', 'event_id', 'sequence', 'body', 'format', 'warnings', 'received_at', 'received_by', 'supersedes'] as const;
export const LAYER_COLUMNS = ['id', 'event_id', 'kind', 'name', 'version', 'rows', 'classes', 'received_at', 'received_by'] as const;

type Row<T extends keyof Tables, C extends keyof Tables[T] = keyof Tables[T]> = Pick<Tables[T], C>;

export const eventOf = (row: Row<'events'>): EventRecord => ({
  id: row.id,
  name: row.name,
  timeZone: row.time_zone,
  exercise: row.exercise === 1,
  demo: row.demo === 1,
  clock: row.clock === null ? null : (JSON.parse(row.clock) as EventRecord['clock']),
  createdAt: row.created_at,
  revision: row.revision,
  advisoryId: row.advisory_id,
});

export const advisoryOf = (row: Row<'advisories', (typeof ADVISORY_COLUMNS)[number]>): StoredAdvisory =>
  storedAdvisorySchema.parse({
    ...(JSON.parse(row.body) as object),
    id: row.id,
    eventId: row.event_id,
    sequence: row.sequence,
    format: row.format,
    receivedAt: row.received_at,
    receivedBy: row.received_by,
    supersedes: row.supersedes,
    warnings: JSON.parse(row.warnings),
  });

export const layerOf = (row: Row<'layers', (typeof LAYER_COLUMNS)[number]>): Layer =>
  layerSchema.parse({
    id: row.id,
    eventId: row.event_id,
    kind: row.kind,
    name: row.name,
    version: row.version,
    rows: row.rows,
    classes: JSON.parse(row.classes),
    receivedAt: row.received_at,
    receivedBy: row.received_by,
  });

export const impactOf = (row: Row<'impacts', 'body'>): Impact => impactSchema.parse(JSON.parse(row.body));

export const logOf = (row: Row<'log'>): LogEntry =>
  logEntrySchema.parse({
    id: row.id,
    eventId: row.event_id,
    sequence: row.sequence,
    kind: row.kind,
    text: row.text,
    zoneId: row.zone_id,
    by: row.made_by,
    at: row.at,
    recordedAt: row.recorded_at,
  });
