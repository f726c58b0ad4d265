import { describe, expect, test } from 'vitest';
import fc from 'fast-check';
import { STAGES, writeBulletin } from '../../lib/advisory';
import { carriedStage } from '../../lib/advisory/stage';
import { advisory, codes, expectedOf, namesIn, point, read, textOf } from './fixtures';
import type { Advisory, Point, QuadrantRadii, Stage } from '../../lib/advisory';

describe('the layout is that of the public product', () => {
  const text = writeBulletin(
    advisory({
      nextDueAt: '2031-09-19T15:00:00Z',
      dissipatesAt: '2031-09-25T06:00:00Z',
      points: [
        point({ gustKt: 85, minPressureHpa: 983, eyeDiameterNm: 15, stage: 'tropical', radiiNm: { '34': { ne: 120, se: 90, sw: 60, nw: 100 }, '64': { ne: 20, se: 20, sw: 0, nw: 5 } } }),
        point({ validAt: '2031-09-19T18:00:00Z', lat: 24.9, lon: -56.2, maxWindKt: 80, gustKt: 100, stage: 'tropical', radiiNm: { '34': { ne: 120, se: 90, sw: 60, nw: 100 } } }),
        point({ validAt: '2031-09-23T06:00:00Z', lat: 38.5, lon: -49, maxWindKt: 55, gustKt: 65, stage: 'post-tropical' }),
      ],
    }),
  );

  test('line by line', () => {
    expect(text.split('\n')).toEqual([
      'ZCZC',
      'TTAA00 XXXX 190900',
      '',
      'HURRICANE MARO FORECAST/ADVISORY NUMBER   5',
      'NWS NATIONAL HURRICANE CENTER MIAMI FL       AL092031',
      '0900 UTC FRI SEP 19 2031',
      '',
      'HURRICANE CENTER LOCATED NEAR 24.1N  55.2W AT 19/0900Z',
      '',
      'PRESENT MOVEMENT TOWARD THE NORTHWEST OR 312 DEGREES AT   8 KT',
      '',
      'ESTIMATED MINIMUM CENTRAL PRESSURE  983 MB',
      'EYE DIAMETER  15 NM',
      'MAX SUSTAINED WINDS  70 KT WITH GUSTS TO  85 KT.',
      '64 KT....... 20NE  20SE   0SW   5NW.',
      '34 KT.......120NE  90SE  60SW 100NW.',
      'WINDS ARE 1-MINUTE AVERAGES.',
      'WINDS VARY GREATLY IN EACH QUADRANT.  RADII IN NAUTICAL',
      'MILES ARE THE LARGEST RADII EXPECTED ANYWHERE IN THAT QUADRANT.',
      '',
      'REPEAT...CENTER LOCATED NEAR 24.1N  55.2W AT 19/0900Z',
      '',
      'FORECAST VALID 19/1800Z 24.9N  56.2W',
      'MAX WIND  80 KT...GUSTS 100 KT.',
      '34 KT...120NE  90SE  60SW 100NW.',
      '',
      'EXTENDED OUTLOOK...USE FOR GUIDANCE ONLY...ERRORS MAY BE LARGE',
      '',
      'OUTLOOK VALID 23/0600Z 38.5N  49.0W...POST-TROP/EXTRATROP',
      'MAX WIND  55 KT...GUSTS  65 KT.',
      '',
      'OUTLOOK VALID 25/0600Z...DISSIPATED',
      '',
      'NEXT ADVISORY AT 19/1500Z',
      '',
      '$$',
      '',
      'NNNN',
      '',
    ]);
  });

  test('no line is longer than the 69 columns of a bulletin', () => {
    expect(Math.max(...text.split('\n').map((line) => line.length))).toBeLessThanOrEqual(69);
  });
});

describe('the kind of storm in the title', () => {
  const title = (stage: Stage | undefined, maxWindKt: number): string => writeBulletin(advisory({ points: [point({ maxWindKt, ...(stage === undefined ? {} : { stage }) })] })).split('\n')[3]!.split(' MARO')[0]!;

  test.each([
    ['tropical', 64, 'HURRICANE'],
    ['tropical', 63, 'TROPICAL STORM'],
    ['depression', 30, 'TROPICAL DEPRESSION'],
    ['subtropical', 40, 'SUBTROPICAL STORM'],
    ['subtropical', 30, 'SUBTROPICAL DEPRESSION'],
    ['post-tropical', 50, 'POST-TROPICAL CYCLONE'],
    ['remnant-low', 25, 'REMNANTS OF'],
    ['disturbance', 30, 'POTENTIAL TROPICAL CYCLONE'],
    [undefined, 50, 'TROPICAL CYCLONE'],
  ] as const)('%s at %i kt: %s', (stage, kt, kind) => expect(title(stage, kt)).toBe(kind));
});

test('a storm that stays is stationary', () => {
  expect(writeBulletin(advisory({ points: [point(), point({ validAt: '2031-09-19T18:00:00Z' })] }))).toContain('PRESENT MOVEMENT STATIONARY');
});

test('due north is 360 degrees', () => {
  expect(writeBulletin(advisory({ points: [point(), point({ validAt: '2031-09-19T18:00:00Z', lat: 25 })] }))).toContain('TOWARD THE NORTH OR 360 DEGREES');
});

test('a name cannot break the layout it stands in', () => {
  const { advisory: back } = read(writeBulletin(advisory({ storm: { id: 'AL092031', name: 'Ma<b>\nro</b>' } })));
  expect(back.storm).toEqual({ id: 'AL092031', name: 'Ma B Ro /b' });
  expect(back.points).toHaveLength(2);
});

describe('what is written is read back', () => {
  const withoutNotes = (given: Advisory): Advisory => ({ ...given, centre: given.centre.toUpperCase() });

  test.each(namesIn('bulletins'))('%s', (name) => {
    const given = expectedOf('bulletins', name).advisory;
    expect(read(writeBulletin(given)).advisory).toEqual(withoutNotes(given));
  });

  test('ten-minute winds', () => {
    expect(read(writeBulletin(advisory({ averaging: '10-min', centre: 'SOME CENTRE' }))).advisory.averaging).toBe('10-min');
  });

  test('a last point that has dissipated becomes the time of the end', () => {
    const { advisory: back, warnings } = read(writeBulletin(advisory({ points: [...advisory().points, point({ validAt: '2031-09-20T18:00:00Z', maxWindKt: 0, stage: 'dissipated' })] })));
    expect(back.dissipatesAt).toBe('2031-09-20T18:00:00Z');
    expect(back.points).toHaveLength(2);
    expect(codes(warnings)).toEqual(['dissipation-forecast']);
  });

  test('what the product does not carry is left out: later pressures and eyes, the radius of maximum wind', () => {
    const { points } = read(writeBulletin(advisory({ points: [point({ radiusMaxWindNm: 20 }), point({ validAt: '2031-09-19T18:00:00Z', lat: 24.9, minPressureHpa: 970, eyeDiameterNm: 10 })] }))).advisory;
    expect(points).toEqual([point(), point({ validAt: '2031-09-19T18:00:00Z', lat: 24.9 })]);
  });

  test('any advisory that the product can carry', () => {
    fc.assert(
      fc.property(carriable, (given) => {
        expect(read(writeBulletin(given)).advisory).toEqual(given);
      }),
      { numRuns: 300 },
    );
  });
});

const tenth = (low: number, high: number): fc.Arbitrary<number> => fc.integer({ min: low * 10, max: high * 10 }).map((value) => value / 10);
const optional = <T>(value: fc.Arbitrary<T>): fc.Arbitrary<T | undefined> => fc.option(value, { nil: undefined });
const radii: fc.Arbitrary<QuadrantRadii> = fc.record({ ne: fc.nat(600), se: fc.nat(600), sw: fc.nat(600), nw: fc.nat(600) });
const place = fc.record({ lat: tenth(-60, 60), lon: tenth(-180, 180), maxWindKt: fc.integer({ min: 15, max: 185 }), gustKt: optional(fc.integer({ min: 20, max: 230 })) });
const rings = optional(fc.record({ '34': optional(radii), '50': optional(radii), '64': optional(radii) }).filter((given) => Object.values(given).some((ring) => ring !== undefined)));

/** Stages as a bulletin can tell them: what a point does not say is carried on, storm and depression follow the wind. */
function staged(points: Point[], wished: Stage[]): Point[] {
  let stage: Stage | undefined;
  return points.map((given, index) => {
    const wish = wished[index]!;
    const byWind = given.maxWindKt < 34 ? 'depression' : 'tropical';
    stage = wish === 'dissipated' ? (index === 0 ? byWind : carriedStage(stage, '', given.maxWindKt)) : wish === 'depression' || wish === 'tropical' ? byWind : wish;
    return { ...given, stage: stage! };
  });
}

const clean = <T>(value: T): T => JSON.parse(JSON.stringify(value)) as T;

const carriable: fc.Arbitrary<Advisory> = fc
  .record({
    name: fc.stringMatching(/^[A-Z][a-z]{3,9}(-[A-Z])?$/).filter((name) => !/^(Storm|Low|Super|Very|Remnant|Remnants|Typhoon|Cyclone|Tropical)$/.test(name)),
    id: optional(fc.constantFrom('AL092031', 'EP012031', 'WP302031', 'SH052032')),
    number: fc.integer({ min: 1, max: 199 }),
    suffix: fc.constantFrom('', 'A', 'B'),
    issued: fc.integer({ min: Date.UTC(1991, 0, 1) / 3_600_000, max: Date.UTC(2060, 0, 1) / 3_600_000 }),
    nextIn: optional(fc.constantFrom(3, 6)),
    endIn: optional(fc.constantFrom(12, 24)),
    averaging: fc.constantFrom('1-min' as const, '10-min' as const),
    pressure: optional(fc.integer({ min: 880, max: 1012 })),
    eye: optional(fc.integer({ min: 5, max: 60 })),
    rows: fc.array(fc.tuple(place, rings, fc.constantFrom(6, 12, 24), fc.constantFrom(...STAGES)), { minLength: 1, maxLength: 9 }),
  })
  .map(({ name, id, number, suffix, issued, nextIn, endIn, averaging, pressure, eye, rows }) => {
    let hour = issued;
    const points = rows.map(([fields, radiiNm, step], index): Point => ({ validAt: instant(index === 0 ? hour : (hour += step)), ...fields, radiiNm, ...(index === 0 ? { minPressureHpa: pressure, eyeDiameterNm: eye } : {}) }));
    return clean<Advisory>({
      storm: { id, name },
      number: `${number}${suffix}`,
      centre: 'SOME WEATHER SERVICE',
      issuedAt: instant(issued),
      nextDueAt: nextIn === undefined ? undefined : instant(issued + nextIn),
      dissipatesAt: endIn === undefined ? undefined : instant(hour + endIn),
      averaging,
      points: staged(points, rows.map(([, , , stage]) => stage)),
    });
  });

const instant = (hour: number): string => `${new Date(hour * 3_600_000).toISOString().slice(0, 19)}Z`;

test('points after transition say so one by one, on the lines where a published bulletin does', () => {
  const published = textOf('bulletins', 'al102017.fstadv.004');
  const labels = (text: string): string[] => text.split(/\r?\n/).filter((line) => /VALID .*POST-TROP\/EXTRATROP/.test(line)).map((line) => line.slice(0, line.indexOf('.')));
  expect(labels(published)).toHaveLength(4);
  expect(labels(writeBulletin(read(published).advisory))).toEqual(labels(published));
});
