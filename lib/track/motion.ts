import { dot, EARTH_RADIUS_KM, length } from '../geo';
import type { Vector } from '../geo';
import { kmToNmi } from '../units';

const DEG = 180 / Math.PI;

export interface Motion {
  motionKt: number;
  /** Degrees from true north. */
  motionTowardDeg: number;
}

/** Speed (kt) and direction of motion from a velocity (radians per hour) at a unit vector. A storm at rest keeps its heading. */
export function motionOf([x, y, z]: Vector, velocity: Vector, heading: Vector): Motion {
  const across = Math.hypot(x, y);
  // At a pole every direction is south or north: the meridian of longitude 0 is taken.
  const [cosLon, sinLon] = across > 0 ? [x / across, y / across] : [1, 0];
  const east: Vector = [-sinLon, cosLon, 0];
  const north: Vector = [-z * cosLon, -z * sinLon, across];
  const toward = Math.atan2(dot(heading, east), dot(heading, north)) * DEG;
  return { motionKt: kmToNmi(length(velocity) * EARTH_RADIUS_KM), motionTowardDeg: toward < 0 ? toward + 360 : toward };
}
