'use client';
import { useFormats } from '../live/EventContext';
import { words } from '../words';
import { placeLabels } from './labels';
import type { Label } from './labels';
import styles from './Map.module.css';
import { nearestTurn, project } from './mercator';
import type { Camera, Size } from './mercator';
import type { TrackView } from './trackView';
import type { Place } from './usePlaces';

/** Times along the track and names of towns, none over another nor under legend, buttons or scale. */
export function PlaceLabels({ track, places, camera, size, legend }: { track: TrackView | null; places: readonly Place[]; camera: Camera; size: Size; legend: Size }) {
  const formats = useFormats();
  const label = (id: string, text: string, lon: number, lat: number, priority: number, gap: number, height = 13): Label => {
    const [x, y] = project(camera, size, nearestTurn(lon, camera.lon), lat);
    return { id, text, x, y, priority, gap, size: height };
  };
  const times = track?.points.filter((point) => point.ahead).map((point, i) => label(point.id, `${formats.dayTime(point.atMs)}, ${formats.wind(point.maxWindKt)}`, point.lon, point.lat, 1e9 - i, 11)) ?? [];
  const now = track?.now ? [label('now', words.map.now, track.now[0], track.now[1], 2e9, 15)] : [];
  const towns = places.map((place) => label(`town-${place.name}`, place.name, place.lon, place.lat, place.people, 9));
  const dots = [...times, ...now].map(({ x, y }) => ({ left: x - 6, right: x + 6, top: y - 6, bottom: y + 6 }));
  const furniture = [
    { left: 0, right: legend.width, top: size.height - legend.height, bottom: size.height },
    { left: size.width - 150, right: size.width, top: 0, bottom: 44 },
    { left: size.width - 260, right: size.width, top: size.height - 48, bottom: size.height },
  ];
  const placed = placeLabels([...times, ...now, ...towns], size, [...dots, ...furniture]);
  const shown = new Set(placed.map((one) => one.id));
  return (
    <g className={styles.labels}>
      {towns
        .filter((town) => shown.has(town.id))
        .map((town) => (
          <rect key={town.id} x={town.x - 3.5} y={town.y - 3.5} width={7} height={7} className={styles.town} />
        ))}
      {placed.map((one) => (
        <text key={one.id} x={one.textX} y={one.textY} textAnchor={one.anchor} dominantBaseline="central" fontSize={one.size} data-strong={one.id === 'now'}>
          {one.text}
        </text>
      ))}
    </g>
  );
}
