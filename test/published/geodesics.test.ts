import geodesic from 'geographiclib-geodesic';
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { bearingDeg, destination, distanceKm, EARTH_RADIUS_KM, normaliseLon } from '../../lib/geo';

// Reference: GeographicLib (Karney, 2013, Algorithms for geodesics, J. Geodesy 87, 43-55), npm geographiclib-geodesic.
const { Geodesic } = geodesic;
const sphere = new Geodesic.Geodesic(EARTH_RADIUS_KM * 1000, 0);
const ellipsoid = Geodesic.WGS84;

const lat = fc.double({ min: -85, max: 85, noNaN: true });
const lon = fc.double({ min: -180, max: 180, noNaN: true });
const bearing = fc.double({ min: 0, max: 360, noNaN: true });
const km = fc.double({ min: 1, max: 5000, noNaN: true });

test('on a sphere distance and bearing are GeographicLib\'s to the millimetre', () => {
  fc.assert(
    fc.property(lat, lon, lat, lon, (aLat, aLon, bLat, bLon) => {
      const { s12, azi1 } = sphere.Inverse(aLat, aLon, bLat, bLon);
      const distance = distanceKm(aLat, aLon, bLat, bLon);
      expect(distance * 1000).toBeCloseTo(s12!, 3);
      if (distance > 1 && distance < 19_000) expect(normaliseLon(bearingDeg(aLat, aLon, bLat, bLon) - azi1!)).toBeCloseTo(0, 6);
    }),
  );
});

test('on a sphere the destination is GeographicLib\'s', () => {
  fc.assert(
    fc.property(lat, lon, bearing, km, (fromLat, fromLon, azimuth, distance) => {
      const { lat2, lon2 } = sphere.Direct(fromLat, fromLon, azimuth, distance * 1000);
      const to = destination(fromLat, fromLon, azimuth, distance);
      expect(distanceKm(to.lat, to.lon, lat2!, lon2!)).toBeLessThan(1e-6);
    }),
  );
});

test('the sphere is within 0.6 % of the WGS84 ellipsoid', () => {
  fc.assert(
    fc.property(lat, lon, bearing, km, (fromLat, fromLon, azimuth, distance) => {
      const { lat2, lon2 } = ellipsoid.Direct(fromLat, fromLon, azimuth, distance * 1000);
      expect(Math.abs(distanceKm(fromLat, fromLon, lat2!, lon2!) / distance - 1)).toBeLessThan(0.006);
    }),
    { numRuns: 500 },
  );
});
