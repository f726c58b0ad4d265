import type { BulkName } from './model';

/** Rows as both engines hold them: JSON as text, instants as ISO text, yes and no as 1 and 0. */
export interface Tables {
  events: {
    id: string;
    name: string;
    time_zone: string;
    exercise: number;
    demo: number;
    clock: string | null;
    created_at: string;
    revision: number;
    advisory_id: string | null;
  };
  advisories: {
    id: string;
    event_id: string;
    sequence: number;
    storm: string;
    number: string;
    issued_at: string;
    body: string;
    format: string;
    warnings: string;
    received_at: string;
    received_by: string;
    supersedes: string | null;
    idempotency_key: string | null;
    source: Uint8Array;
    content_type: string;
    file_name: string | null;
  };
  layers: {
    id: string;
    event_id: string;
    kind: string;
    name: string;
    version: number;
    rows: number;
    classes: string;
    received_at: string;
    received_by: string;
    source: Uint8Array;
    content_type: string;
    file_name: string | null;
  };
  impacts: { event_id: string; revision: number; advisory_id: string; stage: string; body: string };
  bulk: { event_id: string; revision: number; name: BulkName; bytes: Uint8Array };
  log: {
    id: string;
    event_id: string;
    sequence: number;
    kind: string;
    text: string;
    zone_id: string | null;
    made_by: string;
    at: string;
    recorded_at: string;
    idempotency_key: string | null;
  };
}
