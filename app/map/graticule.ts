import type { Position } from 'geojson';
import { unproject } from './mercator';
import type { Camera, Size } from './mercator';

const STEPS_DEG = [0.1, 0.25, 0.5, 1, 2, 5, 10, 20, 30] as const;

/** Degrees between lines so that they stand at least `leastPx` apart. */
export function graticuleStep(camera: Camera, leastPx = 110): number {
  const pixelsPerDegree = (512 * 2 ** camera.zoom) / 360;
  return STEPS_DEG.find((step) => step * pixelsPerDegree >= leastPx) ?? STEPS_DEG[STEPS_DEG.length - 1];
}

export interface Graticule {
  step: number;
  /** Decimals a label needs. */
  decimals: number;
  lats: number[];
  /** May run past 180: the lines in view, west to east. */
  lons: number[];
}

/** The lines in view. */
export function graticule(camera: Camera, size: Size): Graticule {
  const step = graticuleStep(camera);
  const [, north] = unproject(camera, size, 0, 0);
  const [, south] = unproject(camera, size, 0, size.height);
  const halfLon = (size.width / 2) * (360 / (512 * 2 ** camera.zoom));
  const lines = (from: number, to: number): number[] => {
    const first = Math.ceil(from / step - 1e-9);
    const last = Math.floor(to / step + 1e-9);
    return Array.from({ length: Math.max(0, Math.min(400, last - first + 1)) }, (_, i) => Number(((first + i) * step).toFixed(4)));
  };
  return { step, decimals: step >= 1 ? 0 : step >= 0.5 ? 1 : 2, lats: lines(south, north), lons: lines(camera.lon - halfLon, camera.lon + halfLon) };
}

/** Lines to draw for a box: meridians and parallels are straight on this map, so that each is one piece. */
export function graticuleLines({ step, west, east, south, north }: { step: number; west: number; east: number; south: number; north: number }): [Position, Position][] {
  const between = (from: number, to: number): number[] => Array.from({ length: Math.floor(to / step + 1e-9) - Math.ceil(from / step - 1e-9) + 1 }, (_, i) => (Math.ceil(from / step - 1e-9) + i) * step);
  return [
    ...between(west, east).map((lon): [Position, Position] => [[lon, south], [lon, north]]),
    ...between(south, north).map((lat): [Position, Position] => [[west, lat], [east, lat]]),
  ];
}
