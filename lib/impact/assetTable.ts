import type { Exposure } from '../exposure';
import type { PlaceHazard } from '../hazard';
import { MOMENTS } from '../hazard';
import { byThreshold } from '../units';
import { gustKt } from './gust';
import type { MemberSummary } from './members';
import type { AssetRow } from './model';
import { momentsOf } from './moments';

/** What the wind does to each asset, in columns: winds in kt, times in lead hours (NaN: never), `[asset * 3 + threshold]`. */
export interface AssetTable {
  issuedAtMs: number;
  members: number;
  peakKt: Float32Array;
  gustKt: Float32Array;
  arrival: Float32Array;
  end: Float32Array;
  /** Members in which each threshold is reached, and early, median and late arrival and end; empty before members are computed. */
  reached: Uint16Array;
  moments: Float32Array;
}

/** An asset takes the strongest wind, the first arrival and the last end of its places. */
export function assetTable(exposure: Exposure, hazard: PlaceHazard, members: MemberSummary | null, issuedAtMs: number): AssetTable {
  const { assets, places } = exposure;
  const table: AssetTable = {
    issuedAtMs,
    members: members?.members ?? 0,
    peakKt: new Float32Array(assets.count),
    gustKt: new Float32Array(assets.count),
    arrival: new Float32Array(assets.count * 3).fill(NaN),
    end: new Float32Array(assets.count * 3).fill(NaN),
    reached: members?.reached ?? new Uint16Array(0),
    moments: members?.moments ?? new Float32Array(0),
  };
  for (let asset = 0; asset < assets.count; asset++) {
    const from = assets.firstPlace[asset];
    for (let i = from; i < from + assets.placeCount[asset]; i++) {
      if (hazard.peakKt[i] > table.peakKt[asset]) table.peakKt[asset] = hazard.peakKt[i];
      table.gustKt[asset] = Math.max(table.gustKt[asset], gustKt(hazard.peakKt[i], places.surface[i]));
      for (let t = 0; t < 3; t++) {
        const a = asset * 3 + t;
        const p = i * 3 + t;
        if (!(table.arrival[a] <= hazard.arrival[p])) table.arrival[a] = Number.isNaN(hazard.arrival[p]) ? table.arrival[a] : hazard.arrival[p];
        if (!(table.end[a] >= hazard.end[p])) table.end[a] = Number.isNaN(hazard.end[p]) ? table.end[a] : hazard.end[p];
      }
    }
  }
  return table;
}

/** The columns of one asset that do not change with the forecast. */
export type AssetParticulars = Pick<AssetRow, 'id' | 'layer' | 'class' | 'name' | 'lon' | 'lat' | 'people'>;

export function assetRow(table: AssetTable, asset: number, particulars: AssetParticulars): AssetRow {
  const has = table.members > 0;
  const moments = (t: number, track: Float32Array, first: number) =>
    momentsOf(table.issuedAtMs, track[asset * 3 + t], has ? table.moments : null, (asset * 3 + t) * MOMENTS + first);
  return {
    ...particulars,
    maxWindKt: round1(table.peakKt[asset]),
    gustKt: round1(table.gustKt[asset]),
    rainMm: null,
    chance: byThreshold((t) => (has ? table.reached[asset * 3 + t] / table.members : null)),
    arrival: byThreshold((t) => moments(t, table.arrival, 0)),
    end: byThreshold((t) => moments(t, table.end, 3)),
  };
}

const round1 = (value: number): number => Math.round(value * 10) / 10;
