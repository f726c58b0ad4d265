import { describe, expect, test } from 'vitest';
import { radiiLine } from '../../../lib/advisory/bulletin/radii';

describe('a line of radii', () => {
  test('with the dots of the position at issue', () => {
    expect(radiiLine('34 KT.......175NE 175SE   0SW  30NW.')).toEqual({ threshold: '34', radii: { ne: 175, se: 175, sw: 0, nw: 30 } });
  });

  test('with the dots of a forecast', () => {
    expect(radiiLine('64 KT... 20NE  20SE  20SW   0NW.')).toEqual({ threshold: '64', radii: { ne: 20, se: 20, sw: 20, nw: 0 } });
  });

  test('without a blank after the dots', () => {
    expect(radiiLine('34 KT...60NE   0SE   0SW  60NW.')).toEqual({ threshold: '34', radii: { ne: 60, se: 0, sw: 0, nw: 60 } });
  });

  test('as written in 1991', () => {
    expect(radiiLine('RADIUS IN NM OF 34 KT WINDS           50NE  50SE  50SW  50NW.')).toEqual({ threshold: '34', radii: { ne: 50, se: 50, sw: 50, nw: 50 } });
  });

  test('in another order of quadrants', () => {
    expect(radiiLine('50 KT... 30SW  40NW  10NE  20SE.')).toEqual({ threshold: '50', radii: { ne: 10, se: 20, sw: 30, nw: 40 } });
  });

  test('for all quadrants at once', () => {
    expect(radiiLine('34 KT... 75 NM ALL QUADRANTS')).toEqual({ threshold: '34', radii: { ne: 75, se: 75, sw: 75, nw: 75 } });
  });

  test('in lower case', () => {
    expect(radiiLine('34 kt... 30ne  30se  30sw  30nw')).toMatchObject({ threshold: '34' });
  });
});

describe('radii that cannot be used', () => {
  test.each([['100 KT... 20NE  20SE  20SW  20NW.', 100], ['65 KT... 20NE  20SE  20SW  20NW.', 65], ['RADIUS IN NM OF 35 KT WINDS  50NE  50SE  50SW  50NW.', 35]])('%s is of another threshold', (text, otherKt) => {
    expect(radiiLine(text)).toEqual({ otherKt });
  });

  test('a missing quadrant is named', () => {
    expect(radiiLine('34 KT...175NE 175SE')).toMatchObject({ problem: expect.stringContaining('missing for SW, NW') as string });
  });

  test('a doubled quadrant is named', () => {
    expect(radiiLine('34 KT...175NE 175NE 175SE 0SW 0NW')).toMatchObject({ problem: expect.stringContaining('NE radius of the 34 kt winds is given twice') as string });
  });

  test('dots with nothing after them are a problem, not a line of no radii', () => {
    expect(radiiLine('34 KT...')).toHaveProperty('problem');
  });
});

describe('lines that give no radii', () => {
  test.each(['12 FT SEAS..175NE 175SE   0SW  30NW.', 'RADIUS IN NM OF 12 FT SEAS OR HIGHER  50NE  50SE  50SW  50NW.', 'MAX WIND  45 KT...GUSTS  55 KT.', '50 KT OR MORE ARE EXPECTED', 'FORECAST VALID 19/1800Z 24.9N  56.2W', ''])('%s', (text) => {
    expect(radiiLine(text)).toBeNull();
  });
});
