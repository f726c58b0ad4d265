import { describe, expect, test } from 'vitest';
import { decodeText } from '../../lib/advisory';

const bytes = (...values: number[]): Uint8Array => Uint8Array.from(values);
const utf8 = (text: string): Uint8Array => new TextEncoder().encode(text);
const utf16 = (text: string, littleEndian: boolean): number[] => [...text].flatMap((char) => (littleEndian ? [char.charCodeAt(0) & 255, char.charCodeAt(0) >> 8] : [char.charCodeAt(0) >> 8, char.charCodeAt(0) & 255]));

describe('text in any usual encoding', () => {
  test('UTF-8', () => expect(decodeText(utf8('Café 24°N'))).toEqual({ ok: true, text: 'Café 24°N' }));
  test('UTF-8 with its mark, which is taken off', () => expect(decodeText(bytes(0xef, 0xbb, 0xbf, ...utf8('HURRICANE')))).toEqual({ ok: true, text: 'HURRICANE' }));
  test('UTF-16 with its mark, little end first', () => expect(decodeText(bytes(0xff, 0xfe, ...utf16('HURRICANE', true)))).toEqual({ ok: true, text: 'HURRICANE' }));
  test('UTF-16 with its mark, big end first', () => expect(decodeText(bytes(0xfe, 0xff, ...utf16('HURRICANE', false)))).toEqual({ ok: true, text: 'HURRICANE' }));
  test('UTF-16 without a mark', () => {
    expect(decodeText(bytes(...utf16('HURRICANE ALEX', true)))).toEqual({ ok: true, text: 'HURRICANE ALEX' });
    expect(decodeText(bytes(...utf16('HURRICANE ALEX', false)))).toEqual({ ok: true, text: 'HURRICANE ALEX' });
  });
  test('Latin-1, where it is not UTF-8', () => expect(decodeText(bytes(0x43, 0x61, 0x66, 0xe9))).toEqual({ ok: true, text: 'Café' }));
  test('line ends, tabs and the marks that frame a transmission are text', () => expect(decodeText(utf8('\u0001\r\r\nZCZC\tX\f\u0003')).ok).toBe(true));
});

describe('what is no text is refused by what it is', () => {
  const refusal = (input: Uint8Array): string => {
    const decoded = decodeText(input);
    return decoded.ok ? 'accepted' : decoded.message;
  };

  test('an empty file', () => expect(refusal(bytes())).toBe('the file is empty: nothing to read'));
  test('a file of blanks', () => expect(refusal(utf8(' \r\n\t '))).toContain('only blanks'));
  test('a photo renamed .txt', () => expect(refusal(bytes(0xff, 0xd8, 0xff, 0xe0, 0, 16, 0x4a, 0x46, 0x49, 0x46))).toContain('a JPEG picture, not text, whatever its name says'));
  test('a PNG picture', () => expect(refusal(bytes(0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10))).toContain('a PNG picture'));
  test('a WebP picture', () => expect(refusal(utf8('RIFF1234WEBPVP8 '))).toContain('a WebP picture'));
  test('an HEIC picture', () => expect(refusal(bytes(0, 0, 0, 24, ...utf8('ftypheic')))).toContain('an HEIC picture'));
  test('a PDF', () => expect(refusal(utf8('%PDF-1.7'))).toContain('a PDF document'));
  test('an office document', () => expect(refusal(bytes(0x50, 0x4b, 3, 4, 20, 0))).toContain('an office document'));
  test('a compressed file', () => expect(refusal(bytes(0x1f, 0x8b, 8, 0))).toContain('a gzip archive'));
  test('any other bytes that no text has', () => expect(refusal(bytes(72, 101, 0, 108, 7, 111))).toContain('not text'));
});
