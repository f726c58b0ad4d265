import { describe, expect, test } from 'vitest';
import { advisory, codes, errorsOf, point, read } from './fixtures';

const json = (value: unknown): string => JSON.stringify(value, null, 1);

describe('an advisory as JSON', () => {
  test('reads as it is', () => {
    const whole = advisory({ nextDueAt: '2031-09-19T15:00:00Z', dissipatesAt: '2031-09-25T06:00:00Z', points: [point({ gustKt: 85, minPressureHpa: 983, radiusMaxWindNm: 20, eyeDiameterNm: 15, stage: 'tropical', radiiNm: { '34': { ne: 120, se: 90, sw: 60, nw: 100 } } })] });
    expect(read(json(whole)).advisory).toEqual(whole);
  });

  test('may number itself with a number', () => {
    expect(read(json({ ...advisory(), number: 5 })).advisory.number).toBe('5');
  });

  test('keeps markup in a name as text', () => {
    expect(read(json(advisory({ storm: { name: '<b>Maro</b>' } }))).advisory.storm.name).toBe('<b>Maro</b>');
  });

  test('warns of each field that it does not have', () => {
    const { advisory: kept, warnings } = read(json({ ...advisory(), colour: 'red', points: [{ ...point(), radiiNM: {} }, advisory().points[1]] }));
    expect(kept).toEqual(advisory());
    expect(warnings.filter(({ code }) => code === 'field-unknown').map(({ path, line }) => ({ path, line }))).toEqual([{ path: 'points[0].radiiNM', line: 16 }, { path: 'colour', line: 25 }]);
  });

  test('with one point is warned of', () => {
    expect(codes(read(json(advisory({ points: [point()] }))).warnings)).toEqual(['single-point']);
  });
});

describe('what is wrong is told by path, line and column', () => {
  const problem = (value: unknown): unknown => errorsOf(json(value))[0];

  test('latitude 95', () => expect(problem(advisory({ points: [point({ lat: 95 })] }))).toEqual({ path: 'points[0].lat', line: 13, column: 11, message: 'latitude lies between -90 and 90; found 95' }));
  test('a wind of -5', () => expect(problem(advisory({ points: [point({ maxWindKt: -5 })] }))).toMatchObject({ path: 'points[0].maxWindKt', line: 15, message: 'wind cannot be negative; found -5' }));
  test('a wind of 300', () => expect(problem(advisory({ points: [point({ maxWindKt: 300 })] }))).toMatchObject({ message: 'a sustained wind above 250 kt is not believable; found 300' }));
  test('a wind that is text', () => expect(problem({ ...advisory(), points: [{ ...point(), maxWindKt: '70' }] })).toMatchObject({ path: 'points[0].maxWindKt', message: 'expected number; found "70"' }));
  test('a wind that is missing', () => expect(problem({ ...advisory(), points: [{ ...point(), maxWindKt: undefined }] })).toMatchObject({ path: 'points[0].maxWindKt', line: 11, message: 'maxWindKt is missing: expected number' }));
  test('a time with another zone', () => expect(problem(advisory({ issuedAt: '2031-09-19T09:00:00+02:00' }))).toMatchObject({ path: 'issuedAt', message: expect.stringContaining('expected a UTC time such as') as string }));
  test('a name that is empty', () => expect(problem(advisory({ storm: { name: ' ' } }))).toMatchObject({ path: 'storm.name', message: 'the storm needs a name; found " "' }));
  test('no points', () => expect(problem(advisory({ points: [] }))).toMatchObject({ path: 'points', message: 'an advisory needs at least one point; found []' }));
  test('an averaging that is none', () => expect(problem({ ...advisory(), averaging: '3-min' })).toMatchObject({ path: 'averaging', message: 'expected one of "1-min"|"10-min"; found "3-min"' }));
  test('a threshold that is none', () => expect(problem({ ...advisory(), points: [{ ...point(), radiiNm: { '35': { ne: 1, se: 1, sw: 1, nw: 1 } } }] })).toMatchObject({ path: 'points[0].radiiNm', message: '"35" is not known here: radii are given for 34, 50, 64 kt' }));
  test('a ring of three quadrants', () => expect(problem({ ...advisory(), points: [{ ...point(), radiiNm: { '34': { ne: 1, se: 1, sw: 1 } } }] })).toMatchObject({ path: 'points[0].radiiNm.34.nw', message: 'nw is missing: expected number' }));
  test('two points at one time', () => expect(problem(advisory({ points: [point(), point({ lat: 25 })] }))).toMatchObject({ path: 'points[1].validAt', line: 18, message: expect.stringContaining('keep one of them') as string }));
  test('times that go back', () => expect(problem(advisory({ points: [...advisory().points].reverse() }))).toMatchObject({ path: 'points[1].validAt', message: expect.stringContaining('put the points in order of time') as string }));
  test('NaN', () => expect(errorsOf('{"storm": {"name": "Maro"},\n"points": [{"lat": NaN}]}')[0]).toMatchObject({ line: 2, column: 20, message: expect.stringContaining('JSON has no NaN') as string }));
  test('a list', () => expect(errorsOf('[1, 2]')[0]).toMatchObject({ line: 1, column: 1, message: expect.stringContaining('an advisory is a JSON object') as string }));
  test('everything missing', () => expect(errorsOf('{}').map(({ path }) => path)).toEqual(['storm', 'number', 'centre', 'issuedAt', 'averaging', 'points']));

  test('a hundred are told and the rest counted', () => {
    const errors = errorsOf(json(advisory({ points: Array.from({ length: 150 }, () => point({ lat: 95 })) })));
    expect(errors).toHaveLength(101);
    expect(errors.at(-1)!.message).toBe('and 50 more like these');
  });
});
