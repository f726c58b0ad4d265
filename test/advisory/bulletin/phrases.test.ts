import { describe, expect, test } from 'vitest';
import { dayTime, forecastLine, locatedLine, position, quantityLine, windLine } from '../../../lib/advisory/bulletin/phrases';

describe('a position', () => {
  test.each([
    ['28.3N  94.7W', 28.3, -94.7],
    [' 7.5N  50.4W', 7.5, -50.4],
    ['12.8N 157.3W', 12.8, -157.3],
    ['15.2S 168.3E', -15.2, 168.3],
    ['15.2 S, 168.3 E', -15.2, 168.3],
    ['0.0S   0.0W', 0, 0],
    ['20N 60W', 20, -60],
  ])('%s', (text, lat, lon) => {
    const found = position(text)!;
    expect([found.lat, found.lon]).toEqual([lat, lon]);
  });

  test.each(['28.3  94.7', '28.3N', '94.7W 28.3N', 'INLAND'])('%s is none', (text) => expect(position(text)).toBeNull());
});

test('a day and time is two digits, a slash and four digits', () => {
  expect(dayTime('AT 05/1900Z')).toMatchObject({ day: 5, hhmm: '1900' });
  expect(dayTime('AT 1900Z')).toBeNull();
});

describe('a forecast line', () => {
  test('has a time, a position and perhaps a remark', () => {
    expect(forecastLine('FORECAST VALID 30/0600Z 12.0N  84.0W...INLAND')).toEqual({ day: 30, hhmm: '0600', position: { lat: 12, lon: -84 }, remark: 'INLAND' });
  });

  test('may be an outlook', () => {
    expect(forecastLine('OUTLOOK VALID 08/0600Z 30.5N  95.0W...INLAND...DISSIPATING')).toMatchObject({ day: 8, remark: 'INLAND...DISSIPATING' });
  });

  test('may give its lead', () => {
    expect(forecastLine('12 HR FORECAST VALID 30/0600Z 12.0N  84.0W')).toMatchObject({ day: 30 });
  });

  test('may end in a full stop', () => {
    expect(forecastLine('FORECAST VALID 04/0600Z 37.1N  68.6W.')).toMatchObject({ remark: '' });
  });

  test('may have no position', () => {
    expect(forecastLine('OUTLOOK VALID 07/0600Z...ABSORBED BY EXTRATROPICAL LOW')).toEqual({ day: 7, hhmm: '0600', position: null, remark: 'ABSORBED BY EXTRATROPICAL LOW' });
  });

  test('without a time is a problem', () => {
    expect(forecastLine('FORECAST VALID AT NOON 12.0N  84.0W')).toHaveProperty('problem');
  });

  test.each(['EXTENDED OUTLOOK...USE FOR GUIDANCE ONLY', 'FORECASTER BEVEN', 'NEXT ADVISORY AT 28/2100Z'])('is not %s', (text) => expect(forecastLine(text)).toBeNull());
});

describe('a line that locates the centre', () => {
  test('at issue', () => {
    expect(locatedLine('HURRICANE CENTER LOCATED NEAR 33.5N  76.9W AT 03/0900Z')).toEqual({ kind: 'now', before: 'HURRICANE CENTER ', day: 3, hhmm: '0900', position: { lat: 33.5, lon: -76.9 } });
  });

  test('repeated', () => {
    expect(locatedLine('REPEAT...CENTER LOCATED NEAR 33.5N  76.9W AT 03/0900Z')!.kind).toBe('repeat');
  });

  test('earlier', () => {
    expect(locatedLine('AT 03/0600Z CENTER WAS LOCATED NEAR 33.0N  77.4W')).toMatchObject({ kind: 'earlier', day: 3, hhmm: '0600' });
  });

  test('of a disturbance', () => {
    expect(locatedLine('DISTURBANCE CENTERED NEAR 12.0N  40.0W AT 03/0900Z')!.kind).toBe('now');
  });

  test.each(['REQUEST FOR 3 HOURLY SHIP REPORTS WITHIN 300 MILES OF 33.5N  76.9W', 'HURRICANE CENTER LOCATED NEAR 33.5N  76.9W', 'CENTER LOCATED NEAR AT 03/0900Z'])('is not %s', (text) => expect(locatedLine(text)).toBeNull());
});

describe('a wind', () => {
  test.each([
    ['MAX SUSTAINED WINDS  50 KT WITH GUSTS TO  60 KT.', 50, 60],
    ['MAX WIND  45 KT...GUSTS  55 KT.', 45, 55],
    ['MAX WIND  35 KT...GUSTS  45 KT NEAR THE CENTER.', 35, 45],
    ['MAXIMUM SUSTAINED WINDS 100 KT WITH GUSTS TO 120 KT', 100, 120],
    ['MAX WIND 30 KT.', 30, undefined],
  ])('%s', (text, kt, gustKt) => expect(windLine(text)).toEqual({ kt, gustKt }));

  test('in other units is a problem, not a number of knots', () => expect(windLine('MAX WIND 45 MPH')).toHaveProperty('problem'));
  test('with a gust cut short is a problem', () => expect(windLine('MAX WIND  45 KT...GUSTS  5')).toHaveProperty('problem'));
  test('is not in other lines', () => expect(windLine('WINDS AND SEAS VARY GREATLY IN EACH QUADRANT.')).toBeNull());
});

describe('pressure and eye', () => {
  test('pressure in millibars', () => expect(quantityLine('ESTIMATED MINIMUM CENTRAL PRESSURE  983 MB')).toEqual({ quantity: 'minPressureHpa', value: 983 }));
  test('pressure in hectopascals', () => expect(quantityLine('ESTIMATED MINIMUM CENTRAL PRESSURE 1004 HPA')).toEqual({ quantity: 'minPressureHpa', value: 1004 }));
  test('pressure in inches is a problem', () => expect(quantityLine('MINIMUM CENTRAL PRESSURE 29.1 INCHES')).toHaveProperty('problem'));
  test('eye diameter', () => expect(quantityLine('EYE DIAMETER  15 NM')).toEqual({ quantity: 'eyeDiameterNm', value: 15 }));
  test('eye without a width is a problem', () => expect(quantityLine('EYE DIAMETER UNKNOWN')).toHaveProperty('problem'));
  test('nothing else', () => expect(quantityLine('POSITION ACCURATE WITHIN  30 NM')).toBeNull());
});
