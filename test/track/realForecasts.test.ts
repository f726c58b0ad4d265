import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { readAdvisory } from '../../lib/advisory';
import type { Advisory } from '../../lib/advisory';
import { distanceKm, normaliseLon } from '../../lib/geo';
import { nmiToKm, THRESHOLD_KEYS, THRESHOLDS_KT } from '../../lib/units';
import { makeTrack, stormAt } from '../../lib/track';
import { profileKt, quadrantProfiles, windKtAt } from '../../lib/wind';

// Official forecast/advisory bulletins of 1991 to 2017, public domain (test/fixtures/bulletins/README.md).
const folder = new URL('../fixtures/bulletins/', import.meta.url);
const advisories = readdirSync(folder)
  .filter((name) => name.endsWith('.txt'))
  .flatMap((name): [string, Advisory][] => {
    const reading = readAdvisory(readFileSync(new URL(name, folder), 'utf8'));
    return reading.ok ? [[name, reading.advisory]] : [];
  });

test('twelve bulletins are read', () => {
  expect(advisories).toHaveLength(12);
});

describe.each(advisories)('%s', (_name, advisory) => {
  const track = makeTrack(advisory);

  test('is a storm at every hour: finite, moving no faster than twice its fastest leg', () => {
    const legs = advisory.points.slice(1).map((point, i) => distanceKm(advisory.points[i].lat, advisory.points[i].lon, point.lat, point.lon) / 1.852 / (track.leadHours[i + 1] - track.leadHours[i]));
    for (let lead = track.startLeadHours; lead <= track.endLeadHours; lead += 0.5) {
      const storm = stormAt(track, lead)!;
      for (const value of [storm.lat, storm.lon, storm.motionTowardDeg, storm.maxWindKt, storm.minPressureHpa, storm.radiusMaxWindKm]) expect(Number.isFinite(value)).toBe(true);
      expect(storm.motionKt).toBeLessThanOrEqual(2 * Math.max(...legs, 0) + 1e-9);
      expect(storm.radiusMaxWindKm).toBeGreaterThan(5);
      expect(storm.radiusMaxWindKm).toBeLessThan(250);
      const { windKt } = windKtAt(storm, quadrantProfiles(storm), storm.lat + 0.7, normaliseLon(storm.lon + 0.7));
      expect(windKt).toBeGreaterThan(0);
      expect(windKt).toBeLessThanOrEqual(storm.maxWindKt + 1e-9);
    }
  });

  test('its given radii are honoured to 0.1 kt', () => {
    advisory.points.forEach((point, i) => {
      const profiles = quadrantProfiles(stormAt(track, track.leadHours[i])!);
      THRESHOLD_KEYS.forEach((key, t) => {
        const ring = point.radiiNm?.[key];
        if (!ring || point.maxWindKt < THRESHOLDS_KT[t]) return;
        [ring.ne, ring.se, ring.sw, ring.nw].forEach((nmi, q) => {
          if (nmi > 0) expect(Math.abs(profileKt(profiles, q, nmiToKm(nmi)) - THRESHOLDS_KT[t])).toBeLessThan(0.1);
        });
      });
    });
  });
});
