import { describe, expect, test } from 'vitest';
import { listDeck } from '../../lib/advisory';
import { codes, errorsOf, expectedOf, namesIn, read, textOf } from './fixtures';

describe('every deck in the fixtures reads as it was written down by hand', () => {
  test.each(namesIn('decks'))('%s', (name) => {
    const expected = expectedOf('decks', name);
    const { advisory, warnings } = read(textOf('decks', name));
    expect(advisory).toEqual(expected.advisory);
    expect(warnings.map(({ code, line }) => ({ code, line }))).toEqual(expected.warnings);
  });
});

/** A deck line of an invented storm; `fields` from the latitude on. */
const line = (lead: number, fields: string, technique = 'OFCL', cycle = '2031091906', storm = 'AL, 09'): string => `${storm}, ${cycle}, 03, ${technique}, ${lead}, ${fields}`;
const PLAIN = '241N,  552W,  70,    0, HU,';
const NEXT = '249N,  562W,  80,    0, HU,';

describe('lines of one lead', () => {
  test('are one point with a ring for each threshold', () => {
    const deck = [line(0, `${PLAIN} 34, NEQ, 120, 90, 60, 100`), line(0, `${PLAIN} 50, NEQ, 60, 40, 30, 50`), line(0, `${PLAIN} 64, NEQ, 30, 20, 10, 25`)].join('\n');
    const { points } = read(deck).advisory;
    expect(points).toHaveLength(1);
    expect(points[0]!.radiiNm).toEqual({ '34': { ne: 120, se: 90, sw: 60, nw: 100 }, '50': { ne: 60, se: 40, sw: 30, nw: 50 }, '64': { ne: 30, se: 20, sw: 10, nw: 25 } });
  });

  test('that repeat each other word for word are no matter', () => {
    const one = line(0, `${PLAIN} 34, NEQ, 120, 90, 60, 100`);
    expect(codes(read([one, one].join('\n')).warnings)).not.toContain('lead-repeated');
  });

  test('that contradict each other keep the first, with a warning at the second', () => {
    const { advisory, warnings } = read([line(0, `${PLAIN} 34, NEQ, 120, 90, 60, 100`), line(0, `${NEXT} 50, NEQ, 60, 40, 30, 50`)].join('\n'));
    expect(advisory.points[0]).toMatchObject({ lat: 24.1, radiiNm: { '34': { ne: 120 } } });
    expect(advisory.points[0]!.radiiNm).not.toHaveProperty('50');
    expect(warnings).toContainEqual(expect.objectContaining({ code: 'lead-repeated', line: 2 }));
  });

  test('may bring the wind on one and the pressure on another', () => {
    const { points } = read([line(0, '241N, 552W, 70, 0, HU, 34, NEQ, 120, 90, 60, 100'), line(0, '241N, 552W, 70, 983, HU, 50, NEQ, 60, 40, 30, 50')].join('\n')).advisory;
    expect(points[0]).toMatchObject({ maxWindKt: 70, minPressureHpa: 983 });
  });

  test('need not stand together, nor leads in order', () => {
    const { points } = read([line(12, NEXT), line(0, PLAIN), line(12, `${NEXT} 34, NEQ, 120, 90, 60, 100`)].join('\n')).advisory;
    expect(points.map(({ validAt }) => validAt)).toEqual(['2031-09-19T06:00:00Z', '2031-09-19T18:00:00Z']);
    expect(points[1]!.radiiNm).toHaveProperty('34');
  });
});

describe('quadrant codes', () => {
  const ring = (code: string): unknown => read(line(0, `${PLAIN} 34, ${code}, 10, 20, 30, 40`)).advisory.points[0]!.radiiNm?.['34'];

  test('NEQ starts in the north-east and goes clockwise', () => expect(ring('NEQ')).toEqual({ ne: 10, se: 20, sw: 30, nw: 40 }));
  test('SEQ starts in the south-east', () => expect(ring('SEQ')).toEqual({ se: 10, sw: 20, nw: 30, ne: 40 }));
  test('SWQ starts in the south-west', () => expect(ring('SWQ')).toEqual({ sw: 10, nw: 20, ne: 30, se: 40 }));
  test('NWQ starts in the north-west', () => expect(ring('NWQ')).toEqual({ nw: 10, ne: 20, se: 30, sw: 40 }));
  test('AAA is a full circle of the first radius', () => expect(ring('AAA')).toEqual({ ne: 10, se: 10, sw: 10, nw: 10 }));

  test('any other leaves the radii out, with a warning', () => {
    const { advisory, warnings } = read(line(0, `${PLAIN} 34, XYZ, 10, 20, 30, 40`));
    expect(advisory.points[0]!.radiiNm).toBeUndefined();
    expect(warnings).toContainEqual(expect.objectContaining({ code: 'threshold-unused', line: 1 }));
  });

  test('so does another threshold', () => {
    const { advisory, warnings } = read(line(0, `${PLAIN} 100, NEQ, 10, 20, 30, 40`));
    expect(advisory.points[0]!.radiiNm).toBeUndefined();
    expect(codes(warnings)).toContain('threshold-unused');
  });
});

describe('zero means not known', () => {
  const first = (fields: string): unknown => read(line(0, fields)).advisory.points[0];

  test('for pressure, gusts, eye and radius of maximum wind', () => {
    expect(first('241N, 552W, 70, 0, HU, 34, NEQ, 0, 0, 0, 0, 0, 0, 0, 0, 0')).toEqual({ validAt: '2031-09-19T06:00:00Z', lat: 24.1, lon: -55.2, maxWindKt: 70, stage: 'tropical' });
  });

  test('for four radii, but not for one of four', () => {
    expect(first('241N, 552W, 70, 0, HU, 34, NEQ, 50, 0, 0, 0')).toHaveProperty('radiiNm', { '34': { ne: 50, se: 0, sw: 0, nw: 0 } });
  });

  test('and so does -99', () => {
    expect(first('241N, 552W, 70, -99, HU, 34, NEQ, 0, 0, 0, 0, -99, -99, -99, -99')).not.toHaveProperty('minPressureHpa');
  });

  test('what is known is kept', () => {
    expect(first('241N, 552W, 70, 983, HU, 34, NEQ, 120, 90, 60, 100, 1010, 250, 20, 85, 15')).toMatchObject({ minPressureHpa: 983, radiusMaxWindNm: 20, gustKt: 85, eyeDiameterNm: 15 });
  });

  test('a lead without a wind is left out, with a warning', () => {
    const { advisory, warnings } = read([line(0, PLAIN), line(12, '249N, 562W, 0, 0, , 0, , 0, 0, 0, 0')].join('\n'));
    expect(advisory.points).toHaveLength(1);
    expect(warnings).toContainEqual(expect.objectContaining({ code: 'lead-left-out', line: 2, message: expect.stringContaining('12 h lead was left out: it gives no wind') as string }));
  });

  test('a lead without a position is left out, with a warning', () => {
    const { warnings } = read([line(0, PLAIN), line(12, '0, 0, 79, 0, , 0, , 0, 0, 0, 0')].join('\n'));
    expect(warnings).toContainEqual(expect.objectContaining({ code: 'lead-left-out', line: 2, message: expect.stringContaining('no position') as string }));
  });
});

describe('places', () => {
  const at = (lat: string, lon: string): [number, number] => {
    const { lat: north, lon: east } = read(line(0, `${lat}, ${lon}, 70, 0, HU,`)).advisory.points[0]!;
    return [north, east];
  };
  test('tenths of a degree, south and west negative', () => expect(at('152S', '1683W')).toEqual([-15.2, -168.3]));
  test('north and east positive', () => expect(at('81N', '1390E')).toEqual([8.1, 139]));
  test('on the equator', () => expect(at('0N', '1390E')).toEqual([0, 139]));
});

describe('stages', () => {
  const stage = (letters: string): unknown => read(line(0, `241N, 552W, 30, 0, ${letters},`)).advisory.points[0]!.stage;
  test.each([['DB', 'disturbance'], ['WV', 'disturbance'], ['TD', 'depression'], ['TS', 'tropical'], ['TY', 'tropical'], ['ST', 'tropical'], ['HU', 'tropical'], ['TC', 'tropical'], ['SD', 'subtropical'], ['SS', 'subtropical'], ['EX', 'post-tropical'], ['PT', 'post-tropical'], ['LO', 'remnant-low']])('%s is %s', (letters, name) => expect(stage(letters)).toBe(name));
  test.each(['XX', 'IN', 'ET', ''])('"%s" says nothing', (letters) => expect(stage(letters)).toBeUndefined());
});

describe('which forecast is read', () => {
  const deck = [
    line(0, PLAIN, 'HCCA'), line(12, NEXT, 'HCCA'), line(24, NEXT, 'HCCA'),
    line(0, PLAIN, 'OFCL', '2031091900'), line(12, NEXT, 'OFCL', '2031091900'), line(24, NEXT, 'OFCL', '2031091900'),
    line(0, PLAIN), line(12, NEXT),
    line(-12, PLAIN, 'CARQ'), line(0, PLAIN, 'CARQ'),
  ].join('\n');

  test('the official technique’s latest cycle, unless asked', () => {
    const { advisory } = read(deck);
    expect([advisory.number, advisory.centre, advisory.points.length]).toEqual(['2031091906', 'US National Hurricane Center', 2]);
  });

  test('the technique that is asked for', () => {
    expect(read(deck, { technique: 'hcca' }).advisory).toMatchObject({ centre: 'technique HCCA', points: { length: 3 } });
  });

  test('the cycle that is asked for', () => {
    expect(read(deck, { cycle: '2031091900' }).advisory).toMatchObject({ number: '2031091900', issuedAt: '2031-09-19T00:00:00Z' });
  });

  test('without an official one, of the latest cycle the one with the most leads', () => {
    const aids = [line(0, PLAIN, 'AVNO', '2031091900'), line(12, NEXT, 'AVNO', '2031091900'), line(24, NEXT, 'AVNO', '2031091900'), line(0, PLAIN, 'HWRF'), line(12, NEXT, 'HWRF'), line(0, PLAIN, 'CTCX')].join('\n');
    expect(read(aids).advisory.centre).toBe('technique HWRF');
  });

  test('what else the deck holds is told', () => {
    expect(read(deck).warnings).toContainEqual(expect.objectContaining({ code: 'deck-has-more', message: expect.stringContaining('HCCA 2031091906, OFCL 2031091900, CARQ 2031091906') as string }));
  });

  test('a technique that is not there is an error that says what is', () => {
    expect(errorsOf(deck, { technique: 'XYZ' })[0]!.message).toContain('no forecast XYZ: it holds HCCA 2031091906');
  });

  test('a technique that forecasts no wind cannot be read', () => {
    expect(errorsOf(textOf('decks', 'mixed-aids'), { technique: 'TVCN' })[0]).toMatchObject({ line: 6, message: expect.stringContaining('both a position and a wind') as string });
  });

  test('another storm in the same file can be asked for by its technique', () => {
    expect(read(textOf('decks', 'mixed-aids'), { technique: 'AVNO' }).advisory).toMatchObject({ storm: { id: 'WP982026' }, points: [{ lat: 15.7, lon: 109.6, maxWindKt: 33, minPressureHpa: 1007, radiusMaxWindNm: 69, radiiNm: { '34': { ne: 40, se: 40, sw: 40, nw: 40 } } }] });
  });

  test('leads before the cycle are no forecast', () => {
    expect(read(deck, { technique: 'CARQ' }).advisory.points.map(({ validAt }) => validAt)).toEqual(['2031-09-19T06:00:00Z']);
  });
});

describe('the list of a deck', () => {
  test('gives storms, techniques and cycles with their leads', () => {
    expect(listDeck(textOf('decks', 'mixed-aids'))).toEqual([
      { stormId: 'CP012026', technique: 'HCCA', cycle: '2026081418', usableLeads: 2, leads: 2 },
      { stormId: 'CP012026', technique: 'IVCN', cycle: '2026081418', usableLeads: 1, leads: 2 },
      { stormId: 'CP012026', technique: 'TVCN', cycle: '2026081418', usableLeads: 0, leads: 2 },
      { stormId: 'CP012026', technique: 'OFCL', cycle: '2026081418', usableLeads: 2, leads: 2 },
      { stormId: 'WP982026', technique: 'AVNO', cycle: '2026091200', usableLeads: 1, leads: 1 },
    ]);
  });

  test('of a text that is no deck is empty', () => expect(listDeck('hello\n')).toEqual([]));
});

describe('the storm', () => {
  test('is named by the deck where it names it', () => {
    const { advisory, warnings } = read(line(0, `${PLAIN} 34, NEQ, 120, 90, 60, 100, 1010, 250, 20, 85, 15, L, 12, X, 270, 8, MARO, D,`));
    expect(advisory.storm).toEqual({ id: 'AL092031', name: 'Maro' });
    expect(codes(warnings)).not.toContain('stormname-assumed');
  });

  test('of the southern season from July on carries the next year', () => {
    expect(read(line(0, '152S, 1683E, 40, 0, TS,', 'JTWC', '2031120106', 'SH, 04')).advisory.storm.id).toBe('SH042032');
    expect(read(line(0, '152S, 1683E, 40, 0, TS,', 'JTWC', '2032020106', 'SH, 09')).advisory.storm.id).toBe('SH092032');
  });
});

describe('lines that cannot be read name the field', () => {
  test.each([
    ['A9, 09, 2031091906, 03, OFCL, 0, 241N, 552W, 70', 1, 'no basin'],
    ['AL, xx, 2031091906, 03, OFCL, 0, 241N, 552W, 70', 5, 'no storm number'],
    ['AL, 09, 2031139906, 03, OFCL, 0, 241N, 552W, 70', 9, 'no cycle'],
    ['AL, 09, 2031091906, 03, , 0, 241N, 552W, 70', 25, 'no technique'],
    ['AL, 09, 2031091906, 03, OFCL, x, 241N, 552W, 70', 31, 'no lead time'],
    ['AL, 09, 2031091906, 03, OFCL, 0, 24.1, 552W, 70', 34, 'no latitude'],
    ['AL, 09, 2031091906, 03, OFCL, 0, 241N, 552N, 70', 40, 'no longitude'],
    ['AL, 09, 2031091906, 03, OFCL, 0, 241N, 552W, NaN', 46, 'no wind'],
  ])('%s', (text, column, message) => {
    expect(errorsOf(text, { format: 'deck' })[0]).toMatchObject({ line: 1, column, message: expect.stringContaining(message) as string });
  });

  test('a latitude of 95 is out of bounds', () => {
    expect(errorsOf([line(0, PLAIN), line(12, '950N, 562W, 80, 0, HU,')].join('\n'))[0]).toMatchObject({ line: 2, path: 'points[1].lat', message: 'latitude lies between -90 and 90; found 95' });
  });
});
