import data from './error-model.json';
import type { Basin } from './basin';

/** Mean forecast errors by lead and basin, with their sources. Leads in hours, distances in nautical miles, winds in kt. */
export interface ErrorModel {
  leadHours: number[];
  source: Record<string, string>;
  correlationOver12h: number;
  averageToGreatestRadius: number;
  sizeLogDeviation: number[];
  basins: Record<Basin, { meanTrackErrorNmi: number[]; meanAbsoluteIntensityErrorKt: number[] }>;
}

export const PUBLISHED_ERRORS: ErrorModel = data;

/** Standard deviations at one lead: of each track component (nmi), of intensity (kt), of the logarithm of size. */
export interface Deviations {
  trackNmi: number;
  intensityKt: number;
  sizeLog: number;
}

/** The deviation of each of two equal independent Gaussian components whose length has the given mean (Rayleigh distribution). */
export const componentDeviation = (meanLength: number): number => meanLength / Math.sqrt(Math.PI / 2);

/** The deviation of a Gaussian whose absolute value has the given mean (half-normal distribution). */
export const absoluteDeviation = (meanAbsolute: number): number => meanAbsolute / Math.sqrt(2 / Math.PI);

/** Linear between the leads of the table; held at both ends, save that errors go on growing at the last slope after the last lead. */
export function interpolateByLead(leads: readonly number[], values: readonly number[], leadHours: number): number {
  const last = leads.length - 1;
  if (leadHours <= leads[0]) return values[0];
  let i = 1;
  while (i < last && leads[i] < leadHours) i++;
  const slope = (values[i] - values[i - 1]) / (leads[i] - leads[i - 1]);
  const value = values[i - 1] + slope * (leadHours - leads[i - 1]);
  return leadHours > leads[last] ? Math.max(values[last], value) : value;
}

export function deviationsAt(model: ErrorModel, basin: Basin, leadHours: number): Deviations {
  const { meanTrackErrorNmi, meanAbsoluteIntensityErrorKt } = model.basins[basin];
  return {
    trackNmi: componentDeviation(interpolateByLead(model.leadHours, meanTrackErrorNmi, leadHours)),
    intensityKt: absoluteDeviation(interpolateByLead(model.leadHours, meanAbsoluteIntensityErrorKt, leadHours)),
    sizeLog: interpolateByLead(model.leadHours, model.sizeLogDeviation, leadHours),
  };
}
