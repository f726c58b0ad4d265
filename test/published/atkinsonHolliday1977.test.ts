import { describe, expect, test } from 'vitest';
import { pressureFromWindHpa, windFromPressureKt } from '../../lib/track';

// Atkinson and Holliday (1977), Tropical cyclone minimum sea level pressure / maximum sustained wind relationship for the western
// North Pacific, Mon. Wea. Rev. 105, 421-427: Vm = 6.7 (1010 - pc)^0.644, coefficients as quoted in public code and documents.
describe('Atkinson and Holliday (1977)', () => {
  test('a central pressure of 940 hPa is 103 kt', () => {
    // 6.7 x 70^0.644.
    expect(windFromPressureKt(940)).toBeCloseTo(103.35, 2);
  });

  // The western North Pacific column of Dvorak (1984), NOAA Technical Report NESDIS 11, which was made from this relation: from
  // memory.
  test.each([
    [30, 1000],
    [35, 997],
    [45, 991],
    [55, 984],
    [65, 976],
    [77, 966],
    [90, 954],
    [115, 927],
    [127, 914],
    [140, 898],
    [155, 879],
    [170, 858],
  ])('%d kt is %d hPa to 1 hPa', (windKt, pressureHpa) => {
    expect(Math.abs(pressureFromWindHpa(windKt) - pressureHpa)).toBeLessThan(1);
  });

  test('both directions are one relation', () => {
    for (let pressure = 860; pressure < 1010; pressure += 10) expect(pressureFromWindHpa(windFromPressureKt(pressure))).toBeCloseTo(pressure, 9);
  });

  test('no pressure drop, no wind', () => {
    expect(windFromPressureKt(1015)).toBe(0);
    expect(pressureFromWindHpa(0)).toBe(1010);
  });
});
