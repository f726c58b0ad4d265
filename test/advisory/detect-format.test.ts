import { describe, expect, test } from 'vitest';
import { detectFormat } from '../../lib/advisory';
import { bulletin, namesIn, textOf } from './fixtures';

describe('the form of a file is told from its content', () => {
  test.each(namesIn('bulletins'))('%s is a bulletin', (name) => expect(detectFormat(textOf('bulletins', name))).toBe('bulletin'));
  test.each(namesIn('decks'))('%s is a deck', (name) => expect(detectFormat(textOf('decks', name))).toBe('deck'));

  test('a bulletin in a web page', () => expect(detectFormat(`<html><pre>${bulletin()}</pre></html>`)).toBe('bulletin'));
  test('a bulletin in lower case', () => expect(detectFormat(bulletin().toLowerCase())).toBe('bulletin'));
  test('a deck after blank lines', () => expect(detectFormat('\n\nAL, 09, 2031091906, 03, OFCL, 0, 241N, 552W, 70,\n')).toBe('deck'));
  test('CSV with commas, semicolons or tabs', () => {
    expect(detectFormat('validAt,lat,lon,maxWindKt\n')).toBe('csv');
    expect(detectFormat('Latitude;Longitude;time;wind (kt)\n')).toBe('csv');
    expect(detectFormat('"lat"\t"lng"\t"time"\n')).toBe('csv');
  });
  test('GeoJSON by its type', () => {
    expect(detectFormat('{"type": "FeatureCollection", "features": []}')).toBe('geojson');
    expect(detectFormat(' {"properties": {}, "type":"Feature"}')).toBe('geojson');
  });
  test('any other JSON is an advisory', () => expect(detectFormat('{"storm": {"name": "Maro"}}')).toBe('json'));
  test('a byte order mark does not hide it', () => expect(detectFormat('\ufeff{"storm": {}}')).toBe('json'));
  test('a deck is not told by a single line in prose', () => expect(detectFormat('See:\nAL, 09, 2031091906, 03, OFCL\nand so on\nand so forth\n')).toBeNull());
  test.each(['hello', 'Dear all,\nthe hurricane is near.', 'a,b,c\n1,2,3', '<html><body>404</body></html>'])('%j is none', (text) => expect(detectFormat(text)).toBeNull());
});
