import { describe, expect, test } from 'vitest';
import { readLayer } from '../../lib/exposure';
import { errorsIn } from './readings';

const HEAD = 'name,lat,lon,people';

describe('a CSV with a fault is refused whole, and every fault is named', () => {
  test('row, column, what was found and how to mend it', () => {
    expect(errorsIn(`${HEAD}\nA,95,-48,1\nB,25,-48,many\nC,25,-48,1\nD,,x,-5\n`)).toEqual([
      { row: 2, column: 'lat', message: 'found 95, expected a number from -90 to 90: are latitude and longitude the wrong way round?' },
      { row: 3, column: 'people', message: 'found "many", expected a number' },
      { row: 5, column: 'lat', message: 'no value: give lat (accepted names: lat, latitude, y)' },
      { row: 5, column: 'lon', message: 'found "x", expected a number' },
      { row: 5, column: 'people', message: 'found -5, expected a number from 0 to 100000000' },
    ]);
  });

  test.each(['NaN', 'Infinity', '1e999', '0x19', '2 5', '--25', '25.1.2'])('latitude %s is no number', (value) => {
    expect(errorsIn(`${HEAD}\nA,${value},-48,1`)[0]).toMatchObject({ row: 2, column: 'lat', message: expect.stringMatching(/^found .*, expected a number/) });
  });

  test('longitude 311.5 is told as the -48.5 it stands for', () => {
    expect(errorsIn(`${HEAD}\nA,25,311.5,1`)[0].message).toContain('that is -48.5');
  });

  test('25.1N is told that degrees south are negative', () => {
    expect(errorsIn(`${HEAD}\nA,25.1N,-48,1`)[0].message).toContain('degrees south and west are negative');
  });

  test('grouped thousands are never read as a small number', () => {
    expect(errorsIn(`${HEAD}\nA,25,-48,"1,234"`)[0].message).toContain('thousands are not grouped');
    expect(errorsIn('name;lat;lon;people\nA;25.1;-48.2;1,234')[0].message).toContain('this file\'s decimal mark is "."');
    expect(errorsIn('name;lat;lon;people\nA;25,1;-48,2;1.234')[0].message).toContain('this file\'s decimal mark is ","');
  });

  test('a repeated id names the row that has it already', () => {
    expect(errorsIn('id,name,lat,lon\nH1,A,25,-48\nH2,B,25,-48\nH1,C,25,-48')).toEqual([{ row: 4, column: 'id', message: 'the id "H1" is that of row 2 already; give each row its own' }]);
  });

  test('a surface that is none of ours lists ours', () => {
    expect(errorsIn('name,lat,lon,surface\nA,25,-48,asphalt')[0].message).toContain('marine, open, built-up');
  });

  test('rows are numbered as a spreadsheet numbers them: an empty row counts, a line end within quotes does not', () => {
    expect(errorsIn(`${HEAD}\n"A\nannexe",25,-48,1\n\nB,95,-48,1`)[0].row).toBe(4);
  });

  test('a row with a value too few or too many is not shifted into place', () => {
    expect(errorsIn(`${HEAD}\nA,25,-48\nB, the inn,25,-48,1\nC,25,-48,1`)).toEqual([
      { row: 2, message: expect.stringContaining('found 3 values, the header names 4 columns') },
      { row: 3, message: expect.stringContaining('found 5 values') },
    ]);
  });

  test('quotes that do not close say where they open', () => {
    const [error] = errorsIn(`${HEAD}\nA,25,-48,1\n"B,25,-48,1\nC,25,-48,1\n`);
    expect(error.row).toBe(3);
    expect(error.message).toContain('RFC 4180');
  });

  test('quotes within an unquoted value', () => {
    expect(errorsIn(`${HEAD}\nThe "Ship" inn,25,-48,1`)[0]).toMatchObject({ row: 2, message: expect.stringContaining('double the quotes') });
  });
});

describe('a header with a fault', () => {
  test('lacks what is needed: said with the names that would do, and those that are there', () => {
    expect(errorsIn('name,north,east\nA,25,-48').map(({ column, message }) => [column, message])).toEqual([
      ['lat', expect.stringMatching(/accepted names: lat, latitude, y\); it has: name, north, east/)],
      ['lon', expect.stringContaining('lng')],
    ]);
  });

  test('has one name twice', () => {
    expect(errorsIn('name,lat,lon,lat\nA,25,-48,26')).toEqual([{ row: 1, message: 'two columns are named "lat": give each its own name' }]);
  });

  test('has a column without a name', () => {
    expect(errorsIn('name,,lat,lon\nA,x,25,-48')[0]).toEqual({ row: 1, message: 'column 2 has no name in the header' });
  });
});

describe('a file that is no layer', () => {
  test.each([
    ['empty', '', 'the file is empty'],
    ['blank', ' \r\n\n', 'the file is empty'],
    ['a header alone', `${HEAD}\n`, 'the file has one row'],
    ['a letter', 'The storm is coming.\nBe ready.', 'the header has no column name'],
    ['zones as a table', 'name,lat,lon\nA,25,-48', 'bring them as GeoJSON polygons'],
  ])('%s', (name, text, message) => {
    expect(errorsIn(text, name === 'zones as a table' ? 'zones' : 'assets')[0].message).toContain(message);
  });

  test('a column of all different words taken for classes', () => {
    const rows = Array.from({ length: 500 }, (_, i) => `A${i},25,-48,kind ${i}`);
    expect(errorsIn(`name,lat,lon,type\n${rows.join('\n')}`)).toEqual([{ row: 202, column: 'class', message: expect.stringContaining('at most 200') }]);
  });
});

test('a thousand errors are listed, the rest counted, and nothing is accepted', () => {
  const rows = Array.from({ length: 30_000 }, (_, i) => `A${i},${i % 2 ? 25 : 125},-48`);
  const reading = readLayer(`name,lat,lon\n${rows.join('\n')}`, { kind: 'assets' });
  if (reading.ok) throw new Error('accepted');
  expect(reading.errors).toHaveLength(1001);
  expect(reading.errors[1000].message).toBe('and 14000 errors more, from here on, are not listed');
});
