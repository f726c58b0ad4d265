import { describe, expect, test } from 'vitest';
import { applyLandDifference } from '../../lib/members/landDifference';

const hours = 24;
const leads = Float64Array.from({ length: hours + 1 }, (_, i) => i);
const forecastKt = new Float64Array(hours + 1).fill(100);
const sea = new Uint8Array(hours + 1);
const land = new Uint8Array(hours + 1).fill(1);

function ratioAfter(forecastOverLand: Uint8Array, memberOverLand: Uint8Array, wind = forecastKt): Float32Array {
  const ratio = new Float32Array(hours + 1).fill(1);
  applyLandDifference(ratio, 0, leads, wind, forecastOverLand, memberOverLand);
  return ratio;
}

describe('land takes from a member only what the forecast has not lost already', () => {
  // Kaplan and DeMaria (1995), J. Appl. Meteor. 34, 2499-2512: V(t) = Vb + (V0 - Vb) exp(-a t), Vb = 26.7 kt, a = 0.095 per h
  // (the paper's coastal factor 0.9 is the change of surface, which Leeboard applies at the place).
  test.each([[6, 26.7 + 73.3 * Math.exp(-0.57)], [12, 26.7 + 73.3 * Math.exp(-1.14)], [24, 26.7 + 73.3 * Math.exp(-2.28)]])(
    'a member ashore %i h while the 100 kt forecast stays at sea has %f kt',
    (hour, kt) => {
      expect(ratioAfter(sea, land)[hour] * 100).toBeCloseTo(kt, 0);
    },
  );

  test('both ashore: nothing more is taken', () => {
    expect(ratioAfter(land, land)[24]).toBe(1);
  });

  test('both at sea: nothing happens', () => {
    expect(ratioAfter(sea, sea)[24]).toBe(1);
  });

  test('a member that stays at sea while the forecast decays ashore keeps its strength', () => {
    const decaying = Float64Array.from(leads, (t) => 26.7 + 73.3 * Math.exp(-0.095 * t));
    const ratio = ratioAfter(land, sea, decaying);
    for (let hour = 1; hour <= 6; hour++) expect(ratio[hour] * decaying[hour]).toBeGreaterThan(decaying[hour]);
  });

  test('what was lost ashore is not given back at sea', () => {
    const sixHours = Uint8Array.from(leads, (t) => (t >= 1 && t <= 6 ? 1 : 0));
    const ratio = ratioAfter(sea, sixHours);
    expect(ratio[24]).toBeCloseTo(ratio[6], 6);
    expect(ratio[6]).toBeLessThan(0.75);
  });
});
