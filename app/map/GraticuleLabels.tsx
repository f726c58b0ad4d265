import { graticule } from './graticule';
import styles from './Map.module.css';
import type { Camera, Size } from './mercator';
import { nearestTurn, project } from './mercator';

const name = (degrees: number, decimals: number, positive: string, negative: string): string =>
  `${Math.abs(degrees).toFixed(decimals)}${degrees === 0 ? '' : ` ${degrees > 0 ? positive : negative}`}`;

/** Latitudes along the left edge above what lies at the bottom (px), longitudes along the top. */
export function GraticuleLabels({ camera, size, below }: { camera: Camera; size: Size; below: number }) {
  const { lats, lons, decimals } = graticule(camera, size);
  return (
    <g className={styles.degrees}>
      {lats.map((lat) => {
        const [, y] = project(camera, size, camera.lon, lat);
        return y < 40 || y > size.height - 12 - below ? null : (
          <text key={`lat${lat}`} x={8} y={y - 5}>
            {name(lat, decimals, 'N', 'S')}
          </text>
        );
      })}
      {lons.map((lon) => {
        const [x] = project(camera, size, lon, camera.lat);
        return x < 60 || x > size.width - 40 ? null : (
          <text key={`lon${lon}`} x={x + 5} y={16}>
            {name(nearestTurn(lon, 0), decimals, 'E', 'W')}
          </text>
        );
      })}
    </g>
  );
}
