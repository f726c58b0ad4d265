import { gzipSync } from 'node:zlib';
import type { Feature, FeatureCollection, MultiPolygon } from 'geojson';
import { areaAtOrAbove } from '../../lib/hazard';
import type { Grid, PlaceHazard } from '../../lib/hazard';
import { THRESHOLDS_KT } from '../../lib/units';

/** What every swath says of itself. */
const NOTE = 'One-minute sustained wind at 10 m over open water or open coast; land lowers it. Planning aid: official warnings come first.';

const CHANCE_LEVELS = [0.05, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9] as const;
const ARRIVAL_STEP_HOURS = 6;

function collection(features: Feature<MultiPolygon>[]): Uint8Array {
  const body: FeatureCollection<MultiPolygon> = { type: 'FeatureCollection', features };
  return gzipSync(JSON.stringify(body), { level: 1 });
}

function areas(grid: Grid, values: Float32Array, levels: readonly number[], properties: (level: number) => Record<string, unknown>): Feature<MultiPolygon>[] {
  return levels.flatMap((level) => {
    const geometry = areaAtOrAbove(grid, values, level);
    return geometry ? [{ type: 'Feature', geometry, properties: { ...properties(level), note: NOTE } } satisfies Feature<MultiPolygon>] : [];
  });
}

/** Values by grid index, from values by place. */
function onGrid(gridIndex: Uint32Array, value: (place: number) => number): Float32Array {
  const values = new Float32Array(gridIndex.length);
  for (let i = 0; i < gridIndex.length; i++) values[gridIndex[i]] = value(i);
  return values;
}

/** Where the forecast track brings each threshold; higher ones lie inside lower ones. */
export function peakSwath(grid: Grid, gridIndex: Uint32Array, hazard: PlaceHazard): Uint8Array {
  const values = onGrid(gridIndex, (i) => hazard.peakKt[i]);
  return collection(areas(grid, values, THRESHOLDS_KT, (thresholdKt) => ({ product: 'peak', thresholdKt })));
}

/** Where 34 kt has arrived by each sixth hour of the forecast. */
export function arrivalSwath(grid: Grid, gridIndex: Uint32Array, hazard: PlaceHazard, issuedAtMs: number, lastLead: number): Uint8Array {
  const never = lastLead + ARRIVAL_STEP_HOURS;
  // Contours rise with the value: sooner is higher.
  const values = onGrid(gridIndex, (i) => -(Number.isNaN(hazard.arrival[i * 3]) ? never : hazard.arrival[i * 3]));
  const leads = Array.from({ length: Math.floor(lastLead / ARRIVAL_STEP_HOURS) }, (_, k) => -(k + 1) * ARRIVAL_STEP_HOURS);
  return collection(
    areas(grid, values, leads, (level) => ({ product: 'arrival', thresholdKt: 34, leadHours: -level, by: new Date(issuedAtMs - level * 3_600_000).toISOString().replace('.000Z', 'Z') })),
  );
}

/** Where at least each share of the members brings a threshold. */
export function chanceSwath(grid: Grid, gridIndex: Uint32Array, counts: Uint16Array, threshold: 0 | 1 | 2, members: number): Uint8Array {
  const values = onGrid(gridIndex, (i) => counts[i * 3 + threshold] / members);
  return collection(areas(grid, values, CHANCE_LEVELS, (chance) => ({ product: `chance${THRESHOLDS_KT[threshold]}`, thresholdKt: THRESHOLDS_KT[threshold], chance })));
}
