'use client';
import type { Advisory, Point } from '../../lib/advisory';
import { formatLatLon, THRESHOLD_KEYS, UNKNOWN } from '../../lib/units';
import type { ThresholdKey } from '../../lib/units';
import { useFormats } from '../live/EventContext';
import ui from '../ui/ui.module.css';
import { words } from '../words';
import styles from './Forecasts.module.css';

const text = words.forecasts.points;
const radii = (point: Point, key: ThresholdKey): string => {
  const ring = point.radiiNm?.[key];
  return ring ? `${ring.ne} ${ring.se} ${ring.sw} ${ring.nw}` : UNKNOWN;
};

/** The points as they were read: nothing computed, a dash where the forecast gives nothing. */
export function PointsTable({ advisory }: { advisory: Advisory }) {
  const formats = useFormats();
  return (
    <div className={`${styles.wide} scroll`} tabIndex={0} role="region" aria-label={text.caption}>
      <table className={ui.table}>
        <caption>
          {text.caption} nmi. {text.notGiven}
        </caption>
        <thead>
          <tr>
            <th scope="col">{text.at}</th>
            <th scope="col">{text.position}</th>
            <th scope="col" className="number">{text.wind}</th>
            <th scope="col" className="number">{text.gust}</th>
            <th scope="col" className="number">{text.pressure}</th>
            <th scope="col">{text.r34}</th>
            <th scope="col">{text.r50}</th>
            <th scope="col">{text.r64}</th>
            <th scope="col">{text.stage}</th>
          </tr>
        </thead>
        <tbody>
          {advisory.points.map((point) => (
            <tr key={point.validAt}>
              <th scope="row" className={styles.cell}>
                {formats.dayTime(point.validAt)} <span className="dim">{formats.utc(point.validAt)}</span>
              </th>
              <td className={styles.cell}>{formatLatLon(point.lat, point.lon)}</td>
              <td className={`${styles.cell} number`}>{formats.wind(point.maxWindKt)}</td>
              <td className={`${styles.cell} number`}>{formats.wind(point.gustKt ?? null)}</td>
              <td className={`${styles.cell} number`}>{point.minPressureHpa === undefined ? UNKNOWN : `${point.minPressureHpa}\u00a0hPa`}</td>
              {THRESHOLD_KEYS.map((key) => (
                <td key={key} className={styles.cell}>
                  {radii(point, key)}
                </td>
              ))}
              <td className={styles.cell}>{point.stage ?? UNKNOWN}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
