import { describe, expect, test } from 'vitest';
import { linesOf } from '../../../lib/advisory/bulletin/lines';
import { readBody } from '../../../lib/advisory/bulletin/points';
import type { Body } from '../../../lib/advisory/bulletin/points';

const ISSUED = Date.UTC(2004, 7, 3, 9);
const body = (...lines: string[]): Body => readBody(linesOf(lines.join('\n')), ISSUED);
const LOCATED = 'HURRICANE CENTER LOCATED NEAR 33.5N  76.9W AT 03/0900Z';

describe('lines belong to the point above them', () => {
  const { points, located } = body(
    'A HURRICANE WARNING REMAINS IN EFFECT',
    LOCATED,
    'ESTIMATED MINIMUM CENTRAL PRESSURE  983 MB',
    'EYE DIAMETER  15 NM',
    'MAX SUSTAINED WINDS  70 KT WITH GUSTS TO  85 KT.',
    '34 KT....... 75NE  90SE  50SW  40NW.',
    '12 FT SEAS..120NE 120SE 100SW 100NW.',
    'REPEAT...CENTER LOCATED NEAR 33.5N  76.9W AT 03/0900Z',
    'AT 03/0600Z CENTER WAS LOCATED NEAR 33.0N  77.4W',
    'FORECAST VALID 03/1800Z 34.6N  75.6W',
    'MAX WIND  75 KT...GUSTS  90 KT.',
    '64 KT... 20NE  20SE  20SW   0NW.',
    'REQUEST FOR 3 HOURLY SHIP REPORTS WITHIN 300 MILES OF 33.5N  76.9W',
  );

  test('there are two, the repeated and the earlier position are none', () => {
    expect(points.map(({ lat, lon, ms }) => [lat, lon, ms])).toEqual([[33.5, -76.9, ISSUED], [34.6, -75.6, Date.UTC(2004, 7, 3, 18)]]);
  });

  test('each has its own wind, radii, pressure and eye', () => {
    expect(points[0]).toMatchObject({ wind: { kt: 70, gustKt: 85 }, minPressureHpa: { value: 983 }, eyeDiameterNm: { value: 15 } });
    expect([...points[0]!.rings.keys()]).toEqual(['34']);
    expect(points[1]).toMatchObject({ wind: { kt: 75, gustKt: 90 } });
    expect([...points[1]!.rings.keys()]).toEqual(['64']);
    expect(points[1]).not.toHaveProperty('minPressureHpa');
  });

  test('each knows the lines it came from', () => {
    expect([points[0]!.line.number, points[0]!.wind!.line.number, points[1]!.rings.get('64')!.line.number]).toEqual([2, 5, 12]);
  });

  test('what stands before LOCATED is kept, for it may say the stage', () => expect(located).toBe('HURRICANE CENTER '));
});

describe('before the first position', () => {
  test('winds in the text of warnings are not the storm’s', () => {
    const { points, errors } = body('MAX WIND 100 KT ARE POSSIBLE', '34 KT... 75NE  90SE  50SW  40NW.', LOCATED, 'MAX SUSTAINED WINDS  70 KT.');
    expect(errors).toEqual([]);
    expect(points[0]).toMatchObject({ wind: { kt: 70 } });
    expect(points[0]!.rings.size).toBe(0);
  });

  test('a position broken over two lines is read', () => {
    expect(body('POST-TROPICAL CYCLONE CENTER LOCATED NEAR', '33.5N  76.9W AT 03/0900Z', 'MAX SUSTAINED WINDS  70 KT.').points[0]).toMatchObject({ lat: 33.5, lon: -76.9 });
  });
});

describe('the repeated position', () => {
  test('stands in where the first is missing', () => {
    expect(body('REPEAT...CENTER LOCATED NEAR 33.5N  76.9W AT 03/0900Z').points).toHaveLength(1);
  });
});

describe('what shows that nothing was cut off', () => {
  test.each(['NEXT ADVISORY AT 03/1500Z', '$$', 'NNNN', 'THIS IS THE LAST FORECAST/ADVISORY ISSUED BY THE NATIONAL HURRICANE', 'THIS WILL BE THE LAST ADVISORY'])('%s', (line) => expect(body(LOCATED, line).closed).toBe(true));
  test('not any other line', () => expect(body(LOCATED, 'FORECASTER BEVEN').closed).toBe(false));
});

describe('the next advisory', () => {
  test('has its time', () => expect(body(LOCATED, 'NEXT ADVISORY AT 03/1500Z').nextDue!.ms).toBe(Date.UTC(2004, 7, 3, 15)));
  test('may be called complete', () => expect(body(LOCATED, 'NEXT COMPLETE ADVISORY AT 03/1500Z').nextDue!.ms).toBe(Date.UTC(2004, 7, 3, 15)));
  test('without a time is warned of', () => expect(body(LOCATED, 'NEXT ADVISORY AT 11 AM EDT').warnings).toEqual([expect.objectContaining({ code: 'next-due-unread', line: 2 })]));
});

describe('averaging', () => {
  test.each([['WINDS ARE 10-MINUTE AVERAGES.', '10-min'], ['10 MIN MEAN WINDS', '10-min'], ['ONE-MINUTE SUSTAINED WINDS', '1-min'], ['WINDS ARE 1-MINUTE AVERAGES.', '1-min']])('%s', (line, averaging) => expect(body(LOCATED, line).averaging).toBe(averaging));
  test('is not read out of other minutes', () => expect(body(LOCATED, 'UPDATE IN 30 MINUTES').averaging).toBeNull());
});

describe('problems are told with line and column', () => {
  test.each([
    ['FORECAST VALID TODAY 34.6N  75.6W', 'no time such as'],
    ['FORECAST VALID 03/1800Z NEAR THE COAST', 'no position such as'],
    ['FORECAST VALID 40/1800Z 34.6N  75.6W', 'no day and hour near the issue time'],
    ['MAX WIND HIGH', 'no wind in knots'],
    ['34 KT... 75NE  90SE', 'missing for SW, NW'],
    ['EYE DIAMETER SMALL', 'no width'],
    ['ESTIMATED MINIMUM CENTRAL PRESSURE UNKNOWN', 'no pressure'],
  ])('%s', (line, message) => {
    expect(body(LOCATED, `  ${line}`).errors).toEqual([{ line: 2, column: 3, message: expect.stringContaining(message) as string }]);
  });

  test('the same radii twice', () => {
    expect(body(LOCATED, '34 KT... 75NE  90SE  50SW  40NW.', '34 KT... 80NE  90SE  50SW  40NW.').errors[0]).toMatchObject({ line: 3, message: expect.stringContaining('a second line of 34 kt radii for the point of line 1 (the first is on line 2)') as string });
  });

  test('radii of another threshold are left out with a warning', () => {
    expect(body(LOCATED, '100 KT... 20NE  20SE  20SW  20NW.').warnings).toEqual([expect.objectContaining({ code: 'threshold-unused', line: 2, message: expect.stringContaining('100 kt') as string })]);
  });
});
