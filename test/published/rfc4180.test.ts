import { describe, expect, test } from 'vitest';
import { readLayer } from '../../lib/exposure';

// RFC 4180, Common Format and MIME Type for Comma-Separated Values (CSV) Files (Shafranovich, 2005), section 2; its letters stand in
// the columns of a layer.
describe('RFC 4180, section 2', () => {
  const HEAD = 'name,note,lat,lon';
  const notesOf = (text: string): [string, unknown][] => {
    const reading = readLayer(text, { kind: 'assets' });
    if (!reading.ok || reading.data.kind !== 'assets') throw new Error(JSON.stringify(reading));
    return reading.data.assets.map(({ name, properties }) => [name, properties.note]);
  };
  const expected = [['aaa', 'bbb'], ['zzz', 'yyy']];

  test('rules 1 and 2: records end with CR LF, the last with or without', () => {
    expect(notesOf(`${HEAD}\r\naaa,bbb,1,2\r\nzzz,yyy,1,2\r\n`)).toEqual(expected);
    expect(notesOf(`${HEAD}\r\naaa,bbb,1,2\r\nzzz,yyy,1,2`)).toEqual(expected);
  });

  test('rule 5: fields may be quoted or not', () => {
    expect(notesOf(`${HEAD}\r\n"aaa","bbb","1","2"\r\nzzz,yyy,1,2`)).toEqual(expected);
  });

  test('rule 6: line breaks and commas within quotes', () => {
    expect(notesOf(`${HEAD}\r\n"aaa","b\r\nbb",1,2\r\n"zz,z",yyy,1,2`)).toEqual([['aaa', 'b\r\nbb'], ['zz,z', 'yyy']]);
  });

  test('rule 7: a double quote within quotes is doubled', () => {
    expect(notesOf(`${HEAD}\r\n"aaa","b""bb",1,2`)).toEqual([['aaa', 'b"bb']]);
  });

  test('rule 4: each line holds the same number of fields', () => {
    expect(readLayer(`${HEAD}\r\naaa,bbb,1,2\r\nzzz,1,2`, { kind: 'assets' }).ok).toBe(false);
  });
});
