import { describe, expect, test } from 'vitest';
import { linesOf } from '../../../lib/advisory/bulletin/lines';
import { readHeader } from '../../../lib/advisory/bulletin/header';
import type { Header } from '../../../lib/advisory/bulletin/header';
import type { InputError } from '../../../lib/advisory';

const CENTRE = 'NWS NATIONAL HURRICANE CENTER MIAMI FL       AL012011';
const TIME = '0300 UTC FRI JUL 01 2011';

function header(...lines: string[]): Header {
  const read = readHeader(linesOf(lines.join('\n')));
  if (!read.ok) throw new Error(JSON.stringify(read.errors));
  return read.header;
}

function errorOf(...lines: string[]): InputError {
  const read = readHeader(linesOf(lines.join('\n')));
  if (read.ok) throw new Error(JSON.stringify(read.header));
  return read.errors[0]!;
}

const titled = (...title: string[]): Header => header(...title, CENTRE, TIME);

describe('the title', () => {
  test.each([
    ['TROPICAL STORM ALLISON SPECIAL FORECAST/ADVISORY NUMBER   1', 'Allison', '1', 'TROPICAL STORM'],
    ['HURRICANE ALEX FORECAST/ADVISORY NUMBER  12', 'Alex', '12', 'HURRICANE'],
    ['HURRICANE ALEX INTERMEDIATE FORECAST/ADVISORY NUMBER 2A', 'Alex', '2A', 'HURRICANE'],
    ['REMNANTS OF ARLENE FORECAST/ADVISORY NUMBER  10', 'Arlene', '10', 'REMNANTS OF'],
    ['POST-TROPICAL CYCLONE ALBERTO FORECAST/ADVISORY NUMBER  12', 'Alberto', '12', 'POST-TROPICAL CYCLONE'],
    ['POTENTIAL TROPICAL CYCLONE TWO FORECAST/ADVISORY NUMBER   1', 'Two', '1', 'POTENTIAL TROPICAL CYCLONE'],
    ['SUBTROPICAL DEPRESSION TEN FORECAST/ADVISORY NUMBER 3', 'Ten', '3', 'SUBTROPICAL DEPRESSION'],
    ['TROPICAL STORM ANA MARINE ADVISORY NUMBER   1', 'Ana', '1', 'TROPICAL STORM'],
    ['TROPICAL DEPRESSION THREE-C ADVISORY NUMBER 1', 'Three-C', '1', 'TROPICAL DEPRESSION'],
    ['TYPHOON KEONI FORECAST/ADVISORY NUMBER 7', 'Keoni', '7', 'TYPHOON'],
    ['SEVERE TROPICAL STORM NADI FORECAST / ADVISORY NO. 4', 'Nadi', '4', 'SEVERE TROPICAL STORM'],
    ['hurricane alex forecast/advisory number 12a', 'Alex', '12A', 'hurricane'],
  ])('%s', (title, name, number, kind) => {
    expect(titled(title)).toMatchObject({ name, number, title: kind });
  });

  test('may have its kind and name on a line of their own', () => {
    expect(titled('POTENTIAL TROPICAL CYCLONE TEN', 'FORECAST/ADVISORY NUMBER  4...CORRECTED')).toMatchObject({ name: 'Ten', number: '4', title: 'POTENTIAL TROPICAL CYCLONE' });
  });

  test('may have its kind alone on a line of its own', () => {
    expect(titled('POTENTIAL TROPICAL CYCLONE', 'SEVENTEEN FORECAST/ADVISORY NUMBER 1')).toMatchObject({ name: 'Seventeen', title: 'POTENTIAL TROPICAL CYCLONE' });
  });

  test('may break before NUMBER', () => {
    expect(titled('TROPICAL DEPRESSION THIRTEEN-E FORECAST/ADVISORY', 'NUMBER 1...CORRECTED')).toMatchObject({ name: 'Thirteen-E', number: '1' });
  });

  test('is not taken from the transmission lines above it', () => {
    expect(titled('ZCZC MIATCMAT1 ALL', 'TTAA00 KNHC DDHHMM', 'HURRICANE ALEX FORECAST/ADVISORY NUMBER  12')).toMatchObject({ name: 'Alex', number: '12' });
  });

  test('a name of two words stays whole', () => {
    expect(titled('TROPICAL CYCLONE TWENTY ONE FORECAST/ADVISORY NUMBER 1').name).toBe('Twenty One');
  });

  test('without a name is an error at the title', () => {
    expect(errorOf('HURRICANE FORECAST/ADVISORY NUMBER 3', CENTRE, TIME)).toMatchObject({ line: 1, column: 1, message: expect.stringContaining('names no storm') as string });
  });

  test('missing altogether is an error that shows one', () => {
    expect(errorOf(CENTRE, TIME).message).toContain('HURRICANE ALEX FORECAST/ADVISORY NUMBER 12');
  });

  test('in a text without lines is an error too', () => {
    expect(errorOf('')).toMatchObject({ line: 1 });
  });
});

describe('the identifier', () => {
  const id = (centre: string, time = TIME): string | undefined => header('HURRICANE ALEX FORECAST/ADVISORY NUMBER 12', centre, time).id;

  test('stands at the end of the issuing line', () => expect(id('NWS NATIONAL HURRICANE CENTER MIAMI FL       AL012011')).toBe('AL012011'));
  test('AL0101 in 2001 is AL012001', () => expect(id('NATIONAL WEATHER SERVICE MIAMI FL   AL0101', '1900Z TUE JUN 05 2001')).toBe('AL012001'));
  test('AL1599 in 1999 is AL151999', () => expect(id('NATIONAL WEATHER SERVICE MIAMI FL   AL1599', '2100Z THU OCT 28 1999')).toBe('AL151999'));
  test('a storm of December 1999 still advised in January 2000 keeps its year', () => expect(id('NATIONAL WEATHER SERVICE   EP1699', '0300Z SAT JAN 01 2000')).toBe('EP161999'));
  test('may be missing', () => expect(id('NATIONAL WEATHER SERVICE MIAMI FL')).toBeUndefined());
});

describe('the issuing centre', () => {
  test('is the issuing line without the identifier', () => {
    expect(titled('HURRICANE ALEX FORECAST/ADVISORY NUMBER 12').centre).toBe('NWS NATIONAL HURRICANE CENTER MIAMI FL');
  });

  test('missing is warned of', () => {
    const { centre, warnings } = header('HURRICANE ALEX FORECAST/ADVISORY NUMBER 12', TIME);
    expect(centre).toBe('not stated');
    expect(warnings).toContainEqual(expect.objectContaining({ code: 'centre-missing', line: 1 }));
  });
});

describe('a correction is told', () => {
  const isCorrection = (...lines: string[]): boolean => header(...lines).warnings.some(({ code }) => code === 'correction');
  const TITLE = 'HURRICANE ALEX FORECAST/ADVISORY NUMBER 12';

  test('by CCA in the transmission line', () => expect(isCorrection('TTAA00 KNHC DDHHMM CCA', TITLE, CENTRE, TIME)).toBe(true));
  test('by COR in the transmission line', () => expect(isCorrection('TTAA00 KNHC DDHHMM COR', TITLE, CENTRE, TIME)).toBe(true));
  test('by ...CORRECTED in the title', () => expect(isCorrection(`${TITLE}...CORRECTED`, CENTRE, TIME)).toBe(true));
  test('by a line below the issue time', () => expect(isCorrection(TITLE, CENTRE, TIME, '...CORRECTION...AL9199 TO AL1599...')).toBe(true));
  test('but not where nothing says so', () => expect(isCorrection('TTAA00 KNHC DDHHMM', TITLE, CENTRE, TIME, 'HURRICANE CENTER LOCATED NEAR')).toBe(false));
});

describe('the issue time', () => {
  test('missing is an error that shows one', () => {
    expect(errorOf('HURRICANE ALEX FORECAST/ADVISORY NUMBER 12', CENTRE, 'TODAY AT NINE')).toMatchObject({ line: 1, message: expect.stringContaining('0900 UTC TUE AUG 03 2004') as string });
  });

  test('on the wrong weekday is warned of', () => {
    expect(header('HURRICANE ALEX FORECAST/ADVISORY NUMBER 12', CENTRE, '0300 UTC SAT JUL 01 2011').warnings).toContainEqual(expect.objectContaining({ code: 'weekday-mismatch', line: 3 }));
  });
});
