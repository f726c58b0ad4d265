import { describe, expect, test } from 'vitest';
import { assetsIn, cellsIn, errorsIn } from './readings';

const HEAD = 'name,lat,lon';

describe('a CSV of assets', () => {
  test('is name, lat and lon, and what else it says', () => {
    const [asset] = assetsIn('id,name,class,lat,lon,people,surface,beds\nH1,Hale Point Infirmary,hospital,24.75,-48.07,310,marine,120\n');
    expect(asset).toEqual({
      id: 'H1',
      name: 'Hale Point Infirmary',
      class: 'hospital',
      people: 310,
      surface: 'marine',
      geometry: { type: 'Point', coordinates: [-48.07, 24.75] },
      properties: { id: 'H1', name: 'Hale Point Infirmary', class: 'hospital', lat: '24.75', lon: '-48.07', people: '310', surface: 'marine', beds: '120' },
    });
  });

  test('without a class is of its layer’s class, else unclassed', () => {
    expect(assetsIn(`${HEAD}\nA,25,-48`)[0].class).toBe('unclassed');
    expect(assetsIn(`${HEAD}\nA,25,-48`, 'Schools')[0].class).toBe('Schools');
    expect(assetsIn(`${HEAD},class\nA,25,-48,school\nB,25,-48,`, 'Sites').map((asset) => asset.class)).toEqual(['school', 'Sites']);
  });

  test('without ids gets the same ones each time, which no number of another row can meet', () => {
    const text = `${HEAD},id\nA,25,-48,\nB,25.1,-48,2\n`;
    expect(assetsIn(text).map(({ id }) => id)).toEqual(['row-2', '2']);
    expect(assetsIn(text)).toEqual(assetsIn(text));
  });

  test('without a name goes by its id', () => {
    expect(assetsIn('id,lat,lon\nF7,25,-48')[0].name).toBe('F7');
  });

  test('keeps markup in a name as the text it is', () => {
    expect(assetsIn(`${HEAD}\n"<b onclick=""x()"">Inn</b>",25,-48`)[0].name).toBe('<b onclick="x()">Inn</b>');
  });

  test('keeps a column named like a part of every object as a column', () => {
    const [{ properties }] = assetsIn(`${HEAD},__proto__,constructor\nA,25,-48,x,y`);
    expect(Object.entries(properties)).toContainEqual(['__proto__', 'x']);
    expect(properties.constructor).toBe('y');
  });

  test('of fifty thousand rows is read, and in time that grows with the rows', () => {
    const rows = Array.from({ length: 50_000 }, (_, i) => `P${i},House ${i},${(24 + (i % 1000) / 1000).toFixed(4)},${(-49 + i / 50_000).toFixed(4)},property,${i}`);
    const assets = assetsIn(`id,name,lat,lon,class,value\n${rows.join('\n')}`);
    expect(assets).toHaveLength(50_000);
    expect(assets[49_999]).toMatchObject({ id: 'P49999', properties: { value: '49999' } });
  });
});

describe('the many ways a CSV is written', () => {
  const asRead = (text: string): unknown[] => assetsIn(text).map(({ name, geometry }) => [name, (geometry as GeoJSON.Point).coordinates]);
  const expected = [['Orrin Bar', [-48.2, 24.65]], ['Saltmarsh', [-48.85, 24.9]]];

  test.each([
    ['plain', 'name,lat,lon\nOrrin Bar,24.65,-48.2\nSaltmarsh,24.9,-48.85\n'],
    ['with a byte-order mark', '\uFEFFname,lat,lon\nOrrin Bar,24.65,-48.2\nSaltmarsh,24.9,-48.85\n'],
    ['with CR LF', 'name,lat,lon\r\nOrrin Bar,24.65,-48.2\r\nSaltmarsh,24.9,-48.85\r\n'],
    ['with CR alone', 'name,lat,lon\rOrrin Bar,24.65,-48.2\rSaltmarsh,24.9,-48.85'],
    ['with semicolons', 'name;lat;lon\nOrrin Bar;24.65;-48.2\nSaltmarsh;24.9;-48.85\n'],
    ['with semicolons and decimal commas', 'name;lat;lon\nOrrin Bar;24,65;-48,2\nSaltmarsh;24,9;-48,85\n'],
    ['with quoted decimal commas', 'name,lat,lon\nOrrin Bar,"24,65","-48,2"\nSaltmarsh,"24,9","-48,85"\n'],
    ['with tabs', 'name\tlat\tlon\nOrrin Bar\t24.65\t-48.2\nSaltmarsh\t24.9\t-48.85\n'],
    ['with other names, in any case', 'Title,LATITUDE,Longitude\nOrrin Bar,24.65,-48.2\nSaltmarsh,24.9,-48.85\n'],
    ['as lng', 'label,Lat,Lng\nOrrin Bar,24.65,-48.2\nSaltmarsh,24.9,-48.85\n'],
    ['as x and y', 'name,x,y\nOrrin Bar,-48.2,24.65\nSaltmarsh,-48.85,24.9\n'],
    ['with spaces about the values', 'name, lat, lon\nOrrin Bar, 24.65, -48.2\nSaltmarsh, 24.9, -48.85\n'],
    ['with empty rows and emptied columns', '\nname,lat,lon,,\n\nOrrin Bar,24.65,-48.2,,\n,,,,\nSaltmarsh,24.9,-48.85,,\n\n'],
    ['with a semicolon within a quoted name of a column', '"name",lat,lon,"note; old"\nOrrin Bar,24.65,-48.2,a\nSaltmarsh,24.9,-48.85,b\n'],
  ])('%s', (_, text) => {
    expect(asRead(text)).toEqual(expected);
  });

  test('where a file has two names for one thing, ours comes first', () => {
    expect(assetsIn('name,y,x,lat,lon\nA,5000,7000,25,-48')[0].geometry).toEqual({ type: 'Point', coordinates: [-48, 25] });
  });
});

describe('a CSV of population', () => {
  test('is lat, lon and people, which may be fractional', () => {
    const { count, lat, lon, people } = cellsIn('lat,lon,people\n25,-48,12.5\n25.1,-48.1,0\n');
    expect([count, [...lat], [...lon], [...people]]).toEqual([2, [25, 25.1], [-48, -48.1], [12.5, 0]]);
  });

  test('needs its people: a cell without a number is not a cell without people', () => {
    expect(errorsIn('lat,lon,people\n25,-48,\n', 'population')).toEqual([{ row: 2, column: 'people', message: expect.stringContaining('no value') }]);
    expect(errorsIn('lat,lon\n25,-48\n', 'population')[0]).toMatchObject({ row: 1, column: 'people', message: expect.stringContaining('population, persons') });
  });
});
