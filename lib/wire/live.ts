import * as z from 'zod';
import { impactSchema } from '../impact';
import { storedAdvisorySchema } from './advisories';
import { eventSchema } from './events';
import type { logEntrySchema } from './log';

/** What a revision says on the wire: the whole impact less its bulk, which is fetched over HTTP. */
export const impactNoticeSchema = impactSchema;
export type ImpactNotice = z.infer<typeof impactNoticeSchema>;

export const joinSchema = z.object({ eventId: z.string().min(1), revision: z.number().int().nonnegative().nullable() });
export const leaveSchema = z.object({ eventId: z.string().min(1) });
export const seenSchema = z.object({ eventId: z.string().min(1), revision: z.number().int().nonnegative() });

/** Everything a screen needs to show an event from nothing. */
export const snapshotSchema = z.object({
  event: eventSchema,
  advisory: storedAdvisorySchema.nullable(),
  impact: impactSchema.nullable(),
  computing: z.object({ runId: z.string(), advisoryId: z.string() }).nullable(),
});
export type Snapshot = z.infer<typeof snapshotSchema>;

export const failure = z.object({ ok: z.literal(false), code: z.enum(['unauthorized', 'forbidden', 'not-found', 'bad-message', 'failed']), message: z.string() });
export const joinAckSchema = z.union([
  z.object({ ok: z.literal(true), snapshot: snapshotSchema }),
  z.object({ ok: z.literal(true), missed: z.array(impactNoticeSchema) }),
  failure,
]);
export type JoinAck = z.infer<typeof joinAckSchema>;
export const plainAckSchema = z.union([z.object({ ok: z.literal(true) }), failure]);
export type PlainAck = z.infer<typeof plainAckSchema>;

export const advisoryNoticeSchema = z.object({ eventId: z.string(), advisory: storedAdvisorySchema });
export const progressSchema = z.object({ eventId: z.string(), runId: z.string(), done: z.number(), of: z.number() });
export const presenceSchema = z.object({
  eventId: z.string(),
  screens: z.array(z.object({ id: z.string(), name: z.string(), role: z.string(), revision: z.number().int().nullable() })),
});
export const clockSchema = z.object({ eventId: z.string(), now: z.iso.datetime(), rate: z.number() });
export const failedSchema = z.object({ eventId: z.string(), runId: z.string(), advisoryId: z.string(), message: z.string() });

export type AdvisoryNotice = z.infer<typeof advisoryNoticeSchema>;
export type Progress = z.infer<typeof progressSchema>;
export type Presence = z.infer<typeof presenceSchema>;
export type ClockNotice = z.infer<typeof clockSchema>;
export type RunFailed = z.infer<typeof failedSchema>;

export interface ServerToClient {
  advisory: (notice: AdvisoryNotice) => void;
  progress: (notice: Progress) => void;
  impact: (notice: ImpactNotice) => void;
  log: (entry: z.infer<typeof logEntrySchema>) => void;
  presence: (notice: Presence) => void;
  clock: (notice: ClockNotice) => void;
  /** A run that ended in an error; the last good revision stays. */
  failed: (notice: RunFailed) => void;
}

export interface ClientToServer {
  join: (message: z.infer<typeof joinSchema>, ack: (answer: JoinAck) => void) => void;
  leave: (message: z.infer<typeof leaveSchema>, ack?: (answer: PlainAck) => void) => void;
  seen: (message: z.infer<typeof seenSchema>, ack?: (answer: PlainAck) => void) => void;
}

export const LIVE_NAMESPACE = '/live';
