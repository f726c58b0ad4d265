import type { LatLon } from './sphere';

/** Geocentric components: towards (0 N, 0 E), (0 N, 90 E) and the north pole. */
export type Vector = readonly [number, number, number];

const RAD = Math.PI / 180;
const DEG = 180 / Math.PI;

/** The unit vector of a place in degrees. */
export function unitVector(lat: number, lon: number): Vector {
  const cosLat = Math.cos(lat * RAD);
  return [cosLat * Math.cos(lon * RAD), cosLat * Math.sin(lon * RAD), Math.sin(lat * RAD)];
}

/** The place a vector of any length points to, degrees. */
export const fromUnitVector = ([x, y, z]: Vector): LatLon => ({ lat: Math.atan2(z, Math.hypot(x, y)) * DEG, lon: Math.atan2(y, x) * DEG });

export const dot = (a: Vector, b: Vector): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];

export const cross = (a: Vector, b: Vector): Vector => [a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]];

export const scale = (a: Vector, by: number): Vector => [a[0] * by, a[1] * by, a[2] * by];

export const add = (a: Vector, b: Vector): Vector => [a[0] + b[0], a[1] + b[1], a[2] + b[2]];

export const length = (a: Vector): number => Math.hypot(a[0], a[1], a[2]);
