import { describe, expect, test } from 'vitest';
import { EXPOSURES, GUST_FACTORS, oneMinuteOverTenMinute } from '../../lib/units';
import { gustFactor } from '../../lib/wind';

// Harper, Kepert and Ginger (2010), Guidelines for converting between various wind averaging periods in tropical cyclone
// conditions, WMO/TD-No. 1555. Its table 1.1 was not at hand: the values are from memory, those of T0 = 600 s at sea, in-land and
// (3 s) off-sea also as quoted in public documents. Checked here against the document's own model of turbulence.
describe('WMO/TD-No. 1555', () => {
  /** Turbulence intensity of each exposure. */
  const TURBULENCE = { 'in-land': 0.25, 'off-land': 0.2, 'off-sea': 0.15, 'at-sea': 0.1 };

  /** Gust factor of ESDU 83045 (1983) at 10 m, after Cook and Greenway, as WMO/TD-No. 1555 uses it; equation as quoted in public code. */
  function modelled(tau: number, referenceSeconds: number, turbulence: number): number {
    const scale = 3.13 * 10 ** 0.2;
    const rate = (0.007 + 0.213 * (scale / tau) ** 0.654) / scale;
    const deviation = 1 - 0.193 * (scale / tau + 0.1) ** -0.68;
    const expected = Math.sqrt(2 * Math.log(referenceSeconds * rate));
    return 1 + (expected + 0.577 / expected) * deviation * turbulence;
  }

  test.each(EXPOSURES)('the hourly factors %s are those of the turbulence model to 0.01', (exposure) => {
    for (const tau of [3, 60, 600] as const) expect(Math.abs(GUST_FACTORS[exposure][3600][tau] - modelled(tau, 3600, TURBULENCE[exposure]))).toBeLessThan(0.01);
  });

  test('another reference period changes all exposures alike', () => {
    for (const exposure of EXPOSURES) {
      const factors = GUST_FACTORS[exposure];
      for (const tau of [3, 60] as const) expect(factors[3600][tau] / factors[600][tau]).toBeCloseTo(1.055, 1.9);
      expect(factors[3600][3] / factors[60][3]).toBeCloseTo(1.175, 2);
    }
  });

  test('factors grow with turbulence and fall with the averaging time', () => {
    for (let i = 1; i < EXPOSURES.length; i++) for (const tau of [3, 60] as const) expect(GUST_FACTORS[EXPOSURES[i]][600][tau]).toBeLessThan(GUST_FACTORS[EXPOSURES[i - 1]][600][tau]);
    for (const exposure of EXPOSURES) {
      const { 3: gust, 60: oneMinute, 120: twoMinutes, 180: threeMinutes } = GUST_FACTORS[exposure][600];
      expect([gust, oneMinute, twoMinutes, threeMinutes]).toEqual([gust, oneMinute, twoMinutes, threeMinutes].sort((a, b) => b - a));
    }
  });

  // Table 1.2: 10-minute over 1-minute maximum, 0.84 in-land, 0.87 off-land, 0.90 off-sea, 0.93 at sea (from memory).
  test.each([
    ['in-land', 0.84],
    ['off-land', 0.87],
    ['off-sea', 0.9],
    ['at-sea', 0.93],
  ] as const)('%s a 10-minute maximum is %d of the 1-minute one', (exposure, ratio) => {
    expect(1 / oneMinuteOverTenMinute(exposure)).toBeCloseTo(ratio, 2);
  });

  test('the 3-second gust over the 1-minute wind is 1.11 at sea, 1.36 off-land, 1.49 in-land', () => {
    expect([gustFactor('marine'), gustFactor('open'), gustFactor('built-up')]).toEqual([1.11, 1.36, 1.49]);
  });
});
