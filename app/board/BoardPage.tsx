'use client';
import { useMemo } from 'react';
import { useEventMs, useLive, useView } from '../live/EventContext';
import { ArrivalStrip } from './ArrivalStrip';
import { Deadlines } from './Deadlines';
import { Headline } from './Headline';
import { RunState } from './RunState';
import { ZoneTable } from './ZoneTable';
import { sortZones, zoneView } from './zoneView';

/** The forecast as a clock: counts, zones by slack, and the strip. The map beside them belongs to the layout. */
export function BoardPage() {
  const impact = useLive((state) => state.impact);
  const sort = useView((state) => state.sort);
  const nowMs = useEventMs();
  const zones = useMemo(() => (impact && nowMs !== null ? sortZones(impact.zones.map((row) => zoneView(row, impact.stage, nowMs)), sort) : []), [impact, nowMs, sort]);
  return (
    <>
      <Headline impact={impact}>
        <RunState />
      </Headline>
      <Deadlines zones={zones} />
      <ZoneTable zones={zones} impact={impact} />
      <ArrivalStrip zones={zones} impact={impact} nowMs={nowMs} />
    </>
  );
}
