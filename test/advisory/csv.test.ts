import { describe, expect, test } from 'vitest';
import { codes, errorsOf, read } from './fixtures';

const HEADER = 'validAt,lat,lon,maxWindKt';
const ROW = '2031-09-19T09:00:00Z,24.1,-55.2,70';
const LATER = '2031-09-19T18:00:00Z,24.9,-56.2,80';
const csv = (...lines: string[]): string => `${lines.join('\n')}\n`;

describe('a table of points', () => {
  test('needs a time, a place and a wind', () => {
    expect(read(csv(HEADER, ROW, LATER)).advisory.points).toEqual([
      { validAt: '2031-09-19T09:00:00Z', lat: 24.1, lon: -55.2, maxWindKt: 70 },
      { validAt: '2031-09-19T18:00:00Z', lat: 24.9, lon: -56.2, maxWindKt: 80 },
    ]);
  });

  test('may give everything a point has', () => {
    const header = `${HEADER},gustKt,minPressureHpa,radiusMaxWindNm,eyeDiameterNm,stage,r34NeNm,r34SeNm,r34SwNm,r34NwNm`;
    expect(read(csv(header, `${ROW},85,983,20,15,Tropical,120,90,0,100`)).advisory.points[0]).toEqual({
      validAt: '2031-09-19T09:00:00Z', lat: 24.1, lon: -55.2, maxWindKt: 70, gustKt: 85, minPressureHpa: 983, radiusMaxWindNm: 20, eyeDiameterNm: 15, stage: 'tropical',
      radiiNm: { '34': { ne: 120, se: 90, sw: 0, nw: 100 } },
    });
  });

  test('gives winds in the unit that its header names', () => {
    const kt = (unit: string, value: string): number => read(csv(`validAt,lat,lon,maxWind${unit}`, `2031-09-19T09:00Z,24.1,-55.2,${value}`)).advisory.points[0]!.maxWindKt;
    expect(kt('Ms', '36')).toBeCloseTo(69.978, 3);
    expect(kt('Kmh', '129.64')).toBe(70);
    expect(kt('Mph', '80')).toBeCloseTo(69.518, 3);
  });

  test('gives radii in the unit that its header names', () => {
    const header = `${HEADER},r34NeKm,r34SeKm,r34SwKm,r34NwKm`;
    expect(read(csv(header, `${ROW},185.2,92.6,0,1.852`)).advisory.points[0]!.radiiNm).toEqual({ '34': { ne: 100, se: 50, sw: 0, nw: 1 } });
  });

  test('may be separated by semicolons or tabs', () => {
    const commas = read(csv(HEADER, ROW)).advisory;
    expect(read(csv(HEADER, ROW).replace(/,/g, ';')).advisory).toEqual(commas);
    expect(read(csv(HEADER, ROW).replace(/,/g, '\t')).advisory).toEqual(commas);
  });

  test('may have quotes, blanks, blank lines, carriage returns and a byte order mark', () => {
    expect(read('\ufeffvalidAt, "lat" ,lon,maxWindKt\r\n\r\n 2031-09-19T09:00:00Z ,"24.1", -55.2,70\r\n').advisory).toEqual(read(csv(HEADER, ROW)).advisory);
  });

  test('with four empty radii gives no ring, with four zeros a ring that reaches nowhere', () => {
    const header = `${HEADER},r34NeNm,r34SeNm,r34SwNm,r34NwNm`;
    expect(read(csv(header, `${ROW},,,,`)).advisory.points[0]).not.toHaveProperty('radiiNm');
    expect(read(csv(header, `${ROW},0,0,0,0`)).advisory.points[0]).toHaveProperty('radiiNm', { '34': { ne: 0, se: 0, sw: 0, nw: 0 } });
  });
});

describe('what is said of the whole advisory', () => {
  const header = `stormName,stormId,number,centre,issuedAt,nextDueAt,averaging,${HEADER}`;
  const about = 'Maro,AL092031,5A,Some Centre,2031-09-19T09:00Z,2031-09-19T15:00Z,10-min';

  test('stands in columns of its own', () => {
    const { advisory, warnings } = read(csv(header, `${about},${ROW}`, `${about},${LATER}`));
    expect(advisory).toMatchObject({ storm: { id: 'AL092031', name: 'Maro' }, number: '5A', centre: 'Some Centre', issuedAt: '2031-09-19T09:00:00Z', nextDueAt: '2031-09-19T15:00:00Z', averaging: '10-min' });
    expect(warnings).toEqual([]);
  });

  test('may stand in the first row only', () => {
    expect(read(csv(header, `${about},${ROW}`, `,,,,,,,${LATER}`)).advisory.storm.name).toBe('Maro');
  });

  test('must be the same in all rows', () => {
    expect(errorsOf(csv(header, `${about},${ROW}`, `${about.replace('Maro', 'Nilo')},${LATER}`))[0]).toMatchObject({ line: 3, column: 1, message: expect.stringContaining('stormName is "Nilo" here and "Maro" before') as string });
  });

  test('is assumed where it is not said, each with a warning', () => {
    const { advisory, warnings } = read(csv(HEADER, ROW, LATER));
    expect(advisory).toMatchObject({ storm: { name: 'Unnamed' }, number: '2031091909', centre: 'not stated', issuedAt: '2031-09-19T09:00:00Z', averaging: '1-min' });
    expect(codes(warnings)).toEqual(['issuedat-assumed', 'number-assumed', 'stormname-assumed', 'centre-assumed', 'averaging-assumed']);
  });

  test('markup in a name stays text', () => {
    expect(read(csv(`stormName,${HEADER}`, `<b>Maro</b><script>alert(1)</script>,${ROW}`)).advisory.storm.name).toBe('<b>Maro</b><script>alert(1)</script>');
  });
});

describe('a header that cannot be used', () => {
  test('without a wind says which names are read', () => {
    expect(errorsOf(csv('validAt,lat,lon', '2031-09-19T09:00Z,24.1,-55.2'))).toEqual([{ line: 1, message: 'no column gives the maximum sustained wind: name one maxWindKt, maxWindMs, maxWindKmh or maxWindMph' }]);
  });

  test('without a time says which names are read', () => {
    expect(errorsOf(csv('lat,lon,maxWindKt', '24.1,-55.2,70'))[0]!.message).toContain('name one validAt, time or datetime');
  });

  test('without a unit says which units are read', () => {
    expect(errorsOf(csv('validAt,lat,lon,wind', ROW))).toEqual([{ line: 1, column: 17, message: 'the column "wind" does not say its unit: name it maxWindKt, maxWindMs, maxWindKmh or maxWindMph' }]);
  });

  test('with two columns for one thing', () => {
    expect(errorsOf(csv(`${HEADER},maxWindMs`, `${ROW},36`))[0]).toMatchObject({ line: 1, column: 27, message: expect.stringContaining('"maxWindMs" and "maxWindKt" say the same thing') as string });
  });

  test('with one name twice', () => {
    expect(errorsOf(csv(`${HEADER},lat`, `${ROW},24`))[0]!.message).toContain('names "lat" twice');
  });

  test('with more columns than any forecast has', () => {
    expect(errorsOf(csv(`${HEADER},${Array.from({ length: 1000 }, (_, i) => `x${i}`).join(',')}`, ROW))[0]!.message).toContain('1004 columns');
  });

  test('a column that is not known is left out with a warning', () => {
    expect(read(csv(`${HEADER},mood`, `${ROW},calm`)).warnings[0]).toEqual({ code: 'column-unknown', line: 1, column: 27, message: 'the column "mood" is not one that is read and was left out' });
  });
});

describe('a row that cannot be used is named by line and column', () => {
  const problem = (row: string): unknown => errorsOf(csv(HEADER, ROW, row))[0];

  test('latitude 95', () => expect(problem('2031-09-19T18:00Z,95,-56.2,80')).toEqual({ line: 3, column: 19, path: 'points[1].lat', message: 'latitude lies between -90 and 90; found 95' }));
  test('longitude 200', () => expect(problem('2031-09-19T18:00Z,24.9,200,80')).toMatchObject({ line: 3, column: 24, message: 'longitude lies between -180 and 180; found 200' }));
  test('a wind of -5', () => expect(problem('2031-09-19T18:00Z,24.9,-56.2,-5')).toMatchObject({ line: 3, column: 30, message: 'wind cannot be negative; found -5' }));
  test('a wind that is NaN', () => expect(problem('2031-09-19T18:00Z,24.9,-56.2,NaN')).toMatchObject({ line: 3, column: 30, message: expect.stringContaining('"NaN" is not a number') as string }));
  test('a wind left empty', () => expect(problem('2031-09-19T18:00Z,24.9,-56.2,')).toMatchObject({ line: 3, message: expect.stringContaining('no value is given') as string }));
  test('a decimal comma', () => expect(problem('2031-09-19T18:00Z,"24,9",-56.2,80')).toMatchObject({ line: 3, message: expect.stringContaining('write 24.9') as string }));
  test('a hemisphere letter', () => expect(problem('2031-09-19T18:00Z,24.9N,-56.2,80')).toMatchObject({ line: 3, message: expect.stringContaining('south and west as negative') as string }));
  test('a time without a zone', () => expect(problem('2031-09-19T18:00,24.9,-56.2,80')).toMatchObject({ line: 3, column: 1, message: expect.stringContaining('add Z if it is UTC') as string }));
  test('the same time twice', () => expect(problem(ROW)).toMatchObject({ line: 3, column: 1, path: 'points[1].validAt', message: 'two points at 2031-09-19T09:00:00Z, this and the point on line 2: keep one of them' }));
  test('a time before the one above', () => expect(problem('2031-09-19T06:00Z,24.9,-56.2,80')).toMatchObject({ line: 3, message: expect.stringContaining('put the points in order of time') as string }));
  test('a stage that is none', () => expect(errorsOf(csv(`${HEADER},stage`, `${ROW},typhoonish`))[0]).toMatchObject({ line: 2, column: 36, message: expect.stringContaining('found "typhoonish"') as string }));
  test('more fields than the header', () => expect(problem('2031-09-19T18:00Z,24.9,-56.2,80,1')).toMatchObject({ line: 3, message: expect.stringContaining('5 fields but the header names 4') as string }));
  test('a quote that never closes', () => expect(problem('"2031-09-19T18:00Z,24.9,-56.2,80')).toMatchObject({ message: expect.stringContaining('never closed') as string }));
  test('a quote inside a field', () => expect(problem('2031-09-19T18:00Z,24.9,"-56".2,80')).toMatchObject({ line: 3, message: expect.stringContaining('double quote stands inside') as string }));

  test('three radii of four', () => {
    expect(errorsOf(csv(`${HEADER},r34NeNm,r34SeNm,r34SwNm,r34NwNm`, `${ROW},120,90,,100`))[0]).toMatchObject({ line: 2, message: expect.stringContaining('missing for SW') as string });
  });

  test('all that is wrong is told at once', () => {
    expect(errorsOf(csv(HEADER, '2031-09-19T09:00Z,x,-55.2,70', '2031-09-19T18:00Z,24.9,y,z'))).toHaveLength(3);
  });
});

describe('a file without points', () => {
  test('only a header', () => expect(errorsOf(csv(HEADER))[0]).toMatchObject({ line: 1, message: expect.stringContaining('no point follows the header') as string }));
  test('more rows than any forecast', () => {
    const rows = Array.from({ length: 401 }, (_, hour) => `${new Date(Date.UTC(2031, 0, 1, hour)).toISOString()},24,-55,70`);
    expect(errorsOf(csv(HEADER, ...rows))[0]).toMatchObject({ line: 402, message: expect.stringContaining('more than 400 positions') as string });
  });
});
