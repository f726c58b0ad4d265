import * as z from 'zod';
import { instant } from '../advisory';

const perThreshold = <T extends z.ZodType>(value: T) => z.object({ '34': value, '50': value, '64': value });

/** A count on the forecast track, and over the members (null until they are computed). */
export const spreadSchema = z.object({
  track: z.number(),
  mean: z.number().nullable(),
  p10: z.number().nullable(),
  p50: z.number().nullable(),
  p90: z.number().nullable(),
});
export type Spread = z.infer<typeof spreadSchema>;

/**
 * When a wind starts (or ends) at a place: on the forecast track, and by when it has come in 10, 50 and 90 % of the members
 * that bring it at all. Null: does not come, or comes in too few members to say.
 */
export const momentsSchema = z.object({
  track: instant.nullable(),
  early: instant.nullable(),
  median: instant.nullable(),
  late: instant.nullable(),
});
export type Moments = z.infer<typeof momentsSchema>;

export const chanceSchema = perThreshold(z.number().min(0).max(1).nullable());

/** What moved since the advisory before, stage for stage: null where either side has no value. */
export const zoneChangeSchema = z.object({
  maxWindKt: z.number().nullable(),
  people: perThreshold(z.number().nullable()),
  chance: perThreshold(z.number().nullable()),
  /** Later is positive. */
  arrivalHours: perThreshold(z.number().nullable()),
});
export type ZoneChange = z.infer<typeof zoneChangeSchema>;

export const zoneRowSchema = z.object({
  id: z.string(),
  name: z.string(),
  people: z.number(),
  maxWindKt: z.number(),
  gustKt: z.number(),
  /** Null: rain is not computed in this release. */
  rainMm: z.number().nullable(),
  chance: chanceSchema,
  peopleAtOrAbove: perThreshold(spreadSchema),
  arrival: perThreshold(momentsSchema),
  end: perThreshold(momentsSchema),
  clearanceHours: z.number().nullable(),
  startBy: instant.nullable(),
  /** Start-by less the event's clock when computed; screens count it down from `startBy`. */
  slackHours: z.number().nullable(),
  change: zoneChangeSchema.nullable(),
});
export type ZoneRow = z.infer<typeof zoneRowSchema>;

export const assetRowSchema = z.object({
  id: z.string(),
  layer: z.string(),
  class: z.string(),
  name: z.string(),
  lon: z.number(),
  lat: z.number(),
  people: z.number().nullable(),
  maxWindKt: z.number(),
  gustKt: z.number(),
  rainMm: z.number().nullable(),
  chance: chanceSchema,
  arrival: perThreshold(momentsSchema),
  end: perThreshold(momentsSchema),
});
export type AssetRow = z.infer<typeof assetRowSchema>;

export const classRowSchema = z.object({
  class: z.string(),
  count: z.number(),
  atOrAbove: perThreshold(spreadSchema),
  /** Change in the count on the forecast track since the advisory before. */
  change: perThreshold(z.number().nullable()).nullable(),
});
export type ClassRow = z.infer<typeof classRowSchema>;

export const totalsSchema = z.object({
  people: z.number(),
  peopleInZones: z.number(),
  assets: z.number(),
  peopleAtOrAbove: perThreshold(spreadSchema),
  assetsAtOrAbove: perThreshold(spreadSchema),
  maxWindKt: z.number(),
});
export type Totals = z.infer<typeof totalsSchema>;

export const changeSchema = z.object({
  sinceAdvisoryId: z.string(),
  sinceNumber: z.string(),
  /** On member means when both have them, else on the forecast track. */
  basis: z.enum(['track', 'members']),
  people: perThreshold(z.number()),
  assets: perThreshold(z.number()),
});
export type Change = z.infer<typeof changeSchema>;

/** Evacuation in one line: who must act, and who is next. */
export const evacuationSchema = z.object({
  zonesReached: perThreshold(z.number().int()),
  zonesWithoutClearance: z.number().int(),
  nextStartBy: z.object({ zoneId: z.string(), at: instant }).nullable(),
});

export const impactSchema = z.object({
  eventId: z.string(),
  revision: z.number().int().positive(),
  advisoryId: z.string(),
  stage: z.enum(['track', 'members']),
  members: z.number().int().nonnegative(),
  seed: z.number().int(),
  computedAt: instant,
  totals: totalsSchema,
  zones: z.array(zoneRowSchema),
  classes: z.array(classRowSchema),
  evacuation: evacuationSchema,
  /** The desks that follow; null says "not computed in this release". */
  restoration: z.null(),
  claims: z.null(),
  change: changeSchema.nullable(),
});
export type Impact = z.infer<typeof impactSchema>;
