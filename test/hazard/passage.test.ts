import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { forecastHazard, makeBlocks, nodeLeads, placesAt, tabulateStorm } from '../../lib/hazard';
import type { PlaceHazard } from '../../lib/hazard';
import { makeTrack, stormAt } from '../../lib/track';
import type { Track } from '../../lib/track';
import { quadrantProfiles, windKtAt } from '../../lib/wind';
import { recurving } from './storms';

const track = makeTrack(recurving);

/** Places in a ragged cloud around the track, the same every run. */
const cloud = Array.from({ length: 400 }, (_, i) => ({ lat: 21 + ((i * 7919) % 1000) / 80, lon: -52 + ((i * 104729) % 1000) / 90 }));

function hazardAt(storm: Track, points: { lat: number; lon: number }[], stepHours: number): PlaceHazard {
  const places = placesAt(points.map((p) => p.lat), points.map((p) => p.lon), new Float32Array(points.length).fill(1));
  return forecastHazard(tabulateStorm(storm, nodeLeads(storm, stepHours)), places, makeBlocks(places, null, 32));
}

/** The readable reference: the wind field of lib/wind asked every two minutes. */
function bruteForce(storm: Track, { lat, lon }: { lat: number; lon: number }) {
  let peakKt = 0;
  const arrival = [NaN, NaN, NaN];
  const end = [NaN, NaN, NaN];
  for (let lead = storm.startLeadHours; lead <= storm.endLeadHours; lead += 1 / 30) {
    const state = stormAt(storm, lead)!;
    const { windKt } = windKtAt(state, quadrantProfiles(state), lat, lon);
    peakKt = Math.max(peakKt, windKt);
    [34, 50, 64].forEach((kt, t) => {
      if (windKt < kt) return;
      if (Number.isNaN(arrival[t])) arrival[t] = lead;
      end[t] = lead;
    });
  }
  return { peakKt, arrival, end };
}

/** A time is as good as the wind it stands on: where the wind grazes a threshold, minutes are hundredths of a knot. */
function expectSameTime(lead: number, reference: number, minutes: number, { lat, lon }: { lat: number; lon: number }, kt: number): void {
  if (Math.abs(lead - reference) * 60 < minutes) return;
  const state = stormAt(track, lead)!;
  expect(Math.abs(windKtAt(state, quadrantProfiles(state), lat, lon).windKt - kt)).toBeLessThan(0.25);
}

describe('the kernel against the wind field asked every two minutes', () => {
  const sample = cloud.filter((_, i) => i % 8 === 0);
  const fast = hazardAt(track, sample, 0.5);
  const slow = sample.map((place) => bruteForce(track, place));

  test('peaks agree within half a knot', () => {
    slow.forEach((place, i) => {
      if (place.peakKt >= 16) expect(Math.abs(fast.peakKt[i] - place.peakKt)).toBeLessThan(0.5);
    });
  });

  test('arrivals and ends agree within five minutes, or fall where the wind is within a quarter of a knot of the threshold', () => {
    slow.forEach((place, i) =>
      [34, 50, 64].forEach((kt, t) => {
        if (place.peakKt < kt + 0.25) return;
        expectSameTime(fast.arrival[i * 3 + t], place.arrival[t], 5, sample[i], kt);
        expectSameTime(fast.end[i * 3 + t], place.end[t], 5, sample[i], kt);
      }),
    );
  });

  test('some of these places are hit at each threshold, and some are not', () => {
    for (const kt of [34, 50, 64]) {
      expect(slow.filter((place) => place.peakKt >= kt).length).toBeGreaterThan(2);
      expect(slow.filter((place) => place.peakKt < kt).length).toBeGreaterThan(2);
    }
  });
});

describe('halving the step', () => {
  const coarse = hazardAt(track, cloud, 0.5);
  const fine = hazardAt(track, cloud, 0.25);

  test('moves peaks by less than half a knot', () => {
    cloud.forEach((_, i) => fine.peakKt[i] >= 16 && expect(Math.abs(coarse.peakKt[i] - fine.peakKt[i])).toBeLessThan(0.5));
  });

  test('moves times by less than three minutes, or to where the wind is within a quarter of a knot of the threshold', () => {
    cloud.forEach((place, i) => {
      for (let t = 0; t < 3; t++) {
        const kt = [34, 50, 64][t];
        if (Math.min(coarse.peakKt[i], fine.peakKt[i]) < kt + 0.1) continue;
        for (const side of ['arrival', 'end'] as const) expectSameTime(coarse[side][i * 3 + t], fine[side][i * 3 + t], 3, place, kt);
      }
    });
  });
});

test('a place is reached by a stronger wind later and left by it sooner', () => {
  const hazard = hazardAt(track, cloud, 0.5);
  cloud.forEach((_, i) => {
    for (let t = 1; t < 3; t++) {
      if (Number.isNaN(hazard.arrival[i * 3 + t])) continue;
      expect(hazard.arrival[i * 3 + t]).toBeGreaterThanOrEqual(hazard.arrival[i * 3 + t - 1]);
      expect(hazard.end[i * 3 + t]).toBeLessThanOrEqual(hazard.end[i * 3 + t - 1]);
    }
  });
});

test('how places are cut into blocks changes nothing', () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 200 }), (size) => {
      const places = placesAt(cloud.map((p) => p.lat), cloud.map((p) => p.lon), new Float32Array(cloud.length).fill(1));
      const table = tabulateStorm(track, nodeLeads(track, 1));
      expect(forecastHazard(table, places, makeBlocks(places, null, size))).toEqual(forecastHazard(table, places, makeBlocks(places, null, 37)));
    }),
    { numRuns: 5 },
  );
});

test('rougher ground lowers the wind in proportion and delays it', () => {
  const place = [{ lat: 25.4, lon: -47.2 }];
  const table = tabulateStorm(track, nodeLeads(track, 0.5));
  const at = (factor: number) => {
    const places = placesAt([place[0].lat], [place[0].lon], Float32Array.of(factor));
    return forecastHazard(table, places, makeBlocks(places, null));
  };
  const sea = at(1);
  const land = at(0.8);
  expect(land.peakKt[0] / sea.peakKt[0]).toBeCloseTo(0.8, 5);
  expect(land.arrival[0]).toBeGreaterThan(sea.arrival[0]);
});
