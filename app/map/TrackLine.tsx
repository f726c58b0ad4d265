import styles from './Map.module.css';
import type { Camera, Size } from './mercator';
import { project } from './mercator';
import type { TrackView } from './trackView';

/** Where the storm was (solid) and is forecast to go (dotted), its points, and the centre now. */
export function TrackLine({ track, camera, size }: { track: TrackView; camera: Camera; size: Size }) {
  const line = (places: [number, number][]): string =>
    places
      .map(([lon, lat], i) => {
        const [x, y] = project(camera, size, lon, lat);
        return `${i === 0 ? 'M' : 'L'}${x.toFixed(1)} ${y.toFixed(1)}`;
      })
      .join('');
  const now = track.now && project(camera, size, ...track.now);
  return (
    <g className={styles.track}>
      <path d={line(track.past)} className={styles.trackUnder} />
      <path d={line(track.past)} className={styles.trackPast} />
      <path d={line(track.ahead)} className={styles.trackUnder} />
      <path d={line(track.ahead)} className={styles.trackAhead} />
      {track.points
        .filter((point) => point.ahead)
        .map((point) => {
          const [x, y] = project(camera, size, point.lon, point.lat);
          return <circle key={point.id} cx={x} cy={y} r={4.5} className={styles.trackPoint} />;
        })}
      {now && <circle cx={now[0]} cy={now[1]} r={8.5} className={styles.trackNow} />}
    </g>
  );
}
