import { describe, expect, test } from 'vitest';
import { deviationsAt, PUBLISHED_ERRORS, sampleErrors } from '../../lib/members';

const COUNT = 20_000;
const sample = sampleErrors(PUBLISHED_ERRORS, 'atlantic', COUNT, 120, 7);
const knots = sample.leadHours.length;
const knotOf = (leadHours: number) => sample.leadHours.indexOf(leadHours);
const column = (values: Float64Array, leadHours: number) => Float64Array.from({ length: COUNT }, (_, m) => values[m * knots + knotOf(leadHours)]);
const mean = (values: Float64Array) => values.reduce((sum, value) => sum + value, 0) / values.length;

describe('the sampler gives back what went in', () => {
  // US National Hurricane Center verification statistics, Atlantic, 2015-2019, mean official track error in n mi.
  const published: [number, number][] = [[12, 24.1], [24, 36.9], [36, 49.6], [48, 65.1], [72, 96.3], [96, 133.2], [120, 171.6]];
  test.each(published)('at %i h the mean track error is the published %f nmi', (lead, nmi) => {
    const along = column(sample.alongNmi, lead);
    const cross = column(sample.crossNmi, lead);
    const lengths = Float64Array.from(along, (value, m) => Math.hypot(value, cross[m]));
    // Standard error of a Rayleigh mean of 10,000 independent pairs is about 0.4 %.
    expect(mean(lengths) / nmi).toBeCloseTo(1, 1.7);
  });

  // Two components of equal deviation s: mean length s sqrt(pi/2), two thirds of all within s sqrt(2 ln 3) (Rayleigh distribution).
  test('two thirds of the positions lie within 1.482 deviations', () => {
    const { trackNmi } = deviationsAt(PUBLISHED_ERRORS, 'atlantic', 72);
    const along = column(sample.alongNmi, 72);
    const cross = column(sample.crossNmi, 72);
    const inside = along.filter((value, m) => Math.hypot(value, cross[m]) <= trackNmi * Math.sqrt(2 * Math.log(3))).length;
    expect(inside / COUNT).toBeCloseTo(2 / 3, 2);
  });

  // The mean absolute value of a Gaussian of deviation s is s sqrt(2/pi). Table: errors of all official advisories 2014-2018.
  test('at 48 h the mean absolute intensity error is the tabulated 10.6 kt', () => {
    expect(mean(column(sample.intensityKt, 48).map(Math.abs))).toBeCloseTo(10.6, 0);
  });

  test('errors twelve hours apart are correlated as the model says', () => {
    const a = column(sample.alongNmi, 48);
    const b = column(sample.alongNmi, 60);
    const product = mean(a.map((value, m) => value * b[m]));
    const correlation = product / Math.sqrt(mean(a.map((v) => v * v)) * mean(b.map((v) => v * v)));
    expect(correlation).toBeCloseTo(PUBLISHED_ERRORS.correlationOver12h, 2);
  });

  test('antithetic pairs leave no mean error', () => {
    expect(Math.abs(mean(column(sample.crossNmi, 120)))).toBeLessThan(1e-9);
  });
});

test('the same seed draws the same bytes, another seed others', () => {
  const again = sampleErrors(PUBLISHED_ERRORS, 'atlantic', 100, 120, 7);
  const other = sampleErrors(PUBLISHED_ERRORS, 'atlantic', 100, 120, 8);
  expect(again.alongNmi).toEqual(sample.alongNmi.slice(0, 100 * knots));
  expect(other.alongNmi).not.toEqual(again.alongNmi);
});

test('errors of the table hold between its leads and go on growing after the last', () => {
  const at = (lead: number) => deviationsAt(PUBLISHED_ERRORS, 'atlantic', lead).trackNmi * Math.sqrt(Math.PI / 2);
  expect(at(60)).toBeCloseTo((65.1 + 96.3) / 2, 6);
  expect(at(132)).toBeCloseTo(171.6 + (171.6 - 133.2) / 2, 6);
  expect(at(-3)).toBe(8);
});
