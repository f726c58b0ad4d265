import * as z from 'zod';
import { THRESHOLD_KEYS } from '../units';

/** An instant, ISO 8601 in UTC with `Z`. */
export const instant = z.iso.datetime({ offset: false, error: 'expected a UTC time such as 2031-09-19T09:00:00Z' });

export const STAGES = ['disturbance', 'depression', 'tropical', 'subtropical', 'post-tropical', 'remnant-low', 'dissipated'] as const;
export const stageSchema = z.enum(STAGES);
export type Stage = z.infer<typeof stageSchema>;

const radiusNmi = z.number().min(0, 'a radius cannot be negative').max(1200, 'a radius above 1200 nmi is not believable');
export const quadrantRadii = z.object({ ne: radiusNmi, se: radiusNmi, sw: radiusNmi, nw: radiusNmi });
export type QuadrantRadii = z.infer<typeof quadrantRadii>;

/** One forecast position. Winds in kt, pressure in hPa, radii in nautical miles, angles in degrees (north and east positive). */
export const pointSchema = z.object({
  validAt: instant,
  lat: z.number().min(-90, 'latitude lies between -90 and 90').max(90, 'latitude lies between -90 and 90'),
  lon: z.number().min(-180, 'longitude lies between -180 and 180').max(180, 'longitude lies between -180 and 180'),
  maxWindKt: z.number().min(0, 'wind cannot be negative').max(250, 'a sustained wind above 250 kt is not believable'),
  gustKt: z.number().min(0).max(320).optional(),
  minPressureHpa: z.number().min(800).max(1080).optional(),
  radiusMaxWindNm: z.number().min(1).max(300).optional(),
  eyeDiameterNm: z.number().min(1).max(300).optional(),
  /** A radius of 0: this wind does not reach into that quadrant. An absent ring: not given. */
  radiiNm: z.partialRecord(z.enum(THRESHOLD_KEYS), quadrantRadii).optional(),
  stage: stageSchema.optional(),
});
export type Point = z.infer<typeof pointSchema>;

export const stormSchema = z.object({ id: z.string().min(1).max(40).optional(), name: z.string().trim().min(1, 'the storm needs a name').max(80) });

/** More points than any forecast has; a file with more holds something else. */
export const MOST_POINTS = 400;

/** One issued forecast, as data. The first point is the position at or just before issue. */
export const advisorySchema = z.object({
  storm: stormSchema,
  number: z.string().trim().min(1).max(20),
  centre: z.string().trim().min(1).max(120),
  issuedAt: instant,
  nextDueAt: instant.optional(),
  /** Forecast time by which the storm is gone, where the centre gives one without a position. */
  dissipatesAt: instant.optional(),
  averaging: z.enum(['1-min', '10-min']),
  points: z.array(pointSchema).min(1, 'an advisory needs at least one point').max(MOST_POINTS, `an advisory has at most ${MOST_POINTS} points`),
});
export type Advisory = z.infer<typeof advisorySchema>;

/** What is wrong with an input and where. Lines and columns count from 1. */
export const inputErrorSchema = z.object({
  path: z.string().optional(),
  line: z.number().int().optional(),
  column: z.number().int().optional(),
  message: z.string(),
});
export type InputError = z.infer<typeof inputErrorSchema>;

/** Something to look at before issuing; never stops an advisory. */
export const warningSchema = inputErrorSchema.extend({ code: z.string() });
export type Warning = z.infer<typeof warningSchema>;

export const FORMATS = ['bulletin', 'deck', 'geojson', 'csv', 'json'] as const;
export const formatSchema = z.enum(FORMATS);
export type Format = z.infer<typeof formatSchema>;

export type Reading =
  | { ok: true; format: Format; advisory: Advisory; warnings: Warning[] }
  | { ok: false; format: Format | null; errors: InputError[] };
