import type { Advisory } from '../../lib/advisory';

const ring = (ne: number, se: number, sw: number, nw: number) => ({ ne, se, sw, nw });

/** An invented hurricane that crosses open ocean north-westward and recurves. */
export const recurving: Advisory = {
  storm: { id: 'XX012031', name: 'Quillon' },
  number: '5',
  centre: 'Test centre',
  issuedAt: '2031-09-19T09:00:00Z',
  averaging: '1-min',
  points: [
    { validAt: '2031-09-19T09:00:00Z', lat: 22.4, lon: -45.2, maxWindKt: 85, radiiNm: { '34': ring(140, 120, 80, 110), '50': ring(70, 60, 40, 60), '64': ring(35, 30, 20, 30) } },
    { validAt: '2031-09-19T18:00:00Z', lat: 23.6, lon: -46.6, maxWindKt: 95, radiiNm: { '34': ring(150, 130, 80, 120), '50': ring(80, 70, 45, 65), '64': ring(40, 35, 25, 35) } },
    { validAt: '2031-09-20T06:00:00Z', lat: 25.4, lon: -48.0, maxWindKt: 100, radiiNm: { '34': ring(150, 140, 90, 120), '50': ring(80, 75, 50, 65), '64': ring(45, 40, 25, 35) } },
    { validAt: '2031-09-20T18:00:00Z', lat: 27.6, lon: -48.2, maxWindKt: 80, radiiNm: { '34': ring(160, 150, 100, 120), '50': ring(80, 75, 50, 60), '64': ring(35, 35, 0, 25) } },
    { validAt: '2031-09-21T06:00:00Z', lat: 30.1, lon: -46.9, maxWindKt: 65, radiiNm: { '34': ring(170, 170, 110, 120), '50': ring(80, 80, 50, 50) } },
    { validAt: '2031-09-22T06:00:00Z', lat: 35.0, lon: -40.0, maxWindKt: 50, radiiNm: { '34': ring(180, 200, 120, 100) }, stage: 'post-tropical' },
  ],
};

/** A round storm of unchanging strength that runs due east along the equator of the frame, far enough from land to ignore it. */
export function steady(options: { hours: number; speedKt: number; lat?: number; lon?: number; maxWindKt?: number; r34Nm?: number; r50Nm?: number; r64Nm?: number }): Advisory {
  const { hours, speedKt, lat = 20, lon = -50, maxWindKt = 80, r34Nm = 120, r50Nm = 60, r64Nm = 30 } = options;
  const round = (r: number) => ring(r, r, r, r);
  const start = Date.parse('2031-09-19T09:00:00Z');
  const points = Array.from({ length: hours / 6 + 1 }, (_, i) => ({
    validAt: new Date(start + i * 6 * 3_600_000).toISOString().replace('.000Z', 'Z'),
    lat: lat + (speedKt * i * 6) / 60,
    lon,
    maxWindKt,
    radiiNm: { '34': round(r34Nm), '50': round(r50Nm), '64': round(r64Nm) },
  }));
  return { storm: { name: 'Steady' }, number: '1', centre: 'Test centre', issuedAt: points[0].validAt, averaging: '1-min', points };
}
