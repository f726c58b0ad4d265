import { formatDistance } from '../../lib/units';
import type { DistanceUnit } from '../../lib/units';
import styles from './Map.module.css';
import { kmPerPixel } from './mercator';
import type { Camera, Size } from './mercator';
import { scaleLength } from './scaleBar';

/** One bar, read in kilometres and in nautical miles (or the reader's unit). */
export function ScaleBar({ camera, size, unit }: { camera: Camera; size: Size; unit: DistanceUnit }) {
  const perPx = kmPerPixel(camera);
  const bar = scaleLength(perPx, 'km', 210);
  const x = size.width - bar.px - 28;
  const y = size.height - 24;
  // A short bar has no room for both above it.
  const below = bar.px < 150;
  return (
    <g className={styles.scale}>
      <path d={`M${x} ${y}H${x + bar.px}M${x} ${y - 4}v8M${x + bar.px} ${y - 4}v8`} className={styles.scaleUnder} />
      <path d={`M${x} ${y}H${x + bar.px}M${x} ${y - 4}v8M${x + bar.px} ${y - 4}v8`} />
      <text x={x} y={y - 9}>
        {formatDistance(bar.value, 'km')}
      </text>
      <text x={x + bar.px} y={below ? y + 16 : y - 9} textAnchor="end">
        {formatDistance(bar.value, unit === 'km' ? 'nmi' : unit)}
      </text>
    </g>
  );
}
