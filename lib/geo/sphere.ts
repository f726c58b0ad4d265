/** Mean radius R1 of the earth (IUGG; Moritz, 2000, J. Geodesy 74, 128-133: 6 371 008.8 m). */
export const EARTH_RADIUS_KM = 6371.0088;

export interface LatLon {
  lat: number;
  lon: number;
}

const RAD = Math.PI / 180;
const DEG = 180 / Math.PI;

/** The same meridian in [-180, 180). */
export function normaliseLon(lon: number): number {
  if (lon >= -180 && lon < 180) return lon;
  const wrapped = (lon + 180) % 360;
  return (wrapped < 0 ? wrapped + 360 : wrapped) - 180;
}

/**
 * Great-circle distance (km) between two places in degrees. Keeps its precision from zero to the antipodes: the sphere's case
 * of Vincenty (1975), Survey Review 23, 88-93.
 */
export function distanceKm(aLat: number, aLon: number, bLat: number, bLon: number): number {
  const dLon = (bLon - aLon) * RAD;
  const sinA = Math.sin(aLat * RAD);
  const cosA = Math.cos(aLat * RAD);
  const sinB = Math.sin(bLat * RAD);
  const cosB = Math.cos(bLat * RAD);
  const cosLon = Math.cos(dLon);
  const across = cosB * Math.sin(dLon);
  // sin(b - a) and a half-angle, so that nearby places do not cancel.
  const along = Math.sin((bLat - aLat) * RAD) + 2 * sinA * cosB * Math.sin(dLon / 2) ** 2;
  return EARTH_RADIUS_KM * Math.atan2(Math.hypot(across, along), sinA * sinB + cosA * cosB * cosLon);
}

/** Initial bearing of the great circle from a to b, degrees from true north, 0 to 360. */
export function bearingDeg(aLat: number, aLon: number, bLat: number, bLon: number): number {
  const dLon = (bLon - aLon) * RAD;
  const cosB = Math.cos(bLat * RAD);
  const east = cosB * Math.sin(dLon);
  const north = Math.sin((bLat - aLat) * RAD) + 2 * Math.sin(aLat * RAD) * cosB * Math.sin(dLon / 2) ** 2;
  const bearing = Math.atan2(east, north) * DEG;
  return bearing < 0 ? bearing + 360 : bearing;
}

/** The place `distanceKm` along the great circle that leaves (lat, lon) at `bearingDeg`; longitude in [-180, 180). */
export function destination(lat: number, lon: number, bearingDeg: number, distanceKm: number): LatLon {
  const angle = distanceKm / EARTH_RADIUS_KM;
  const sinLat = Math.sin(lat * RAD);
  const cosLat = Math.cos(lat * RAD);
  const sin = Math.sin(angle);
  const cos = Math.cos(angle);
  const north = sin * Math.cos(bearingDeg * RAD);
  const east = sin * Math.sin(bearingDeg * RAD);
  // Components along the start's meridian plane, its east and the axis.
  const outward = cosLat * cos - sinLat * north;
  return {
    lat: Math.atan2(sinLat * cos + cosLat * north, Math.hypot(outward, east)) * DEG,
    lon: normaliseLon(lon + Math.atan2(east, outward) * DEG),
  };
}
