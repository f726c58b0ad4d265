export type Decoded = { ok: true; text: string } | { ok: false; message: string };

/** First bytes of files that are sometimes sent in a text's place. */
const MAGIC: readonly { name: string; bytes: readonly number[]; at?: number }[] = [
  { name: 'a JPEG picture', bytes: [0xff, 0xd8, 0xff] },
  { name: 'a PNG picture', bytes: [0x89, 0x50, 0x4e, 0x47] },
  { name: 'a GIF picture', bytes: [0x47, 0x49, 0x46, 0x38] },
  { name: 'a WebP picture', bytes: [0x57, 0x45, 0x42, 0x50], at: 8 },
  { name: 'an HEIC picture or a video', bytes: [0x66, 0x74, 0x79, 0x70], at: 4 },
  { name: 'a TIFF picture', bytes: [0x49, 0x49, 0x2a, 0x00] },
  { name: 'a TIFF picture', bytes: [0x4d, 0x4d, 0x00, 0x2a] },
  { name: 'a PDF document', bytes: [0x25, 0x50, 0x44, 0x46] },
  { name: 'a ZIP archive or an office document', bytes: [0x50, 0x4b, 0x03, 0x04] },
  { name: 'a gzip archive', bytes: [0x1f, 0x8b] },
];
/** Text holds no control characters but tab, line feed, vertical tab, form feed, return, and those that frame a transmission (SOH, ETX, RS). */
const ALLOWED_CONTROLS = new Set([1, 3, 9, 10, 11, 12, 13, 26, 30]);
const LOOKED_AT = 65_536;

/**
 * Decodes the bytes of a text file: UTF-8, UTF-16 with or without its mark, else Windows-1252 (which
 * Latin-1 is part of). What is no text is refused, with a message that says what it looks like.
 */
export function decodeText(bytes: Uint8Array): Decoded {
  if (bytes.length === 0) return { ok: false, message: 'the file is empty: nothing to read' };
  const magic = MAGIC.find(({ bytes: marks, at = 0 }) => marks.every((mark, index) => bytes[at + index] === mark));
  if (magic !== undefined) return { ok: false, message: `this file is ${magic.name}, not text, whatever its name says: give the forecast as text` };

  const text = new TextDecoder(encodingOf(bytes)).decode(bytes);
  if (text.trim() === '') return { ok: false, message: 'the file holds only blanks: nothing to read' };
  if (hasBinary(text)) return { ok: false, message: 'this file is not text: it holds bytes that no text has' };
  return { ok: true, text };
}

function encodingOf(bytes: Uint8Array): string {
  const [first, second] = bytes;
  if (first === 0xff && second === 0xfe) return 'utf-16le';
  if (first === 0xfe && second === 0xff) return 'utf-16be';
  // Plain text in UTF-16 has a zero in every other byte.
  const head = bytes.subarray(0, 64);
  const pairs = head.length >> 1;
  const zeros = (offset: number): number => head.filter((byte, index) => index % 2 === offset && byte === 0).length;
  if (pairs >= 4 && zeros(1) * 10 >= pairs * 9 && zeros(0) === 0) return 'utf-16le';
  if (pairs >= 4 && zeros(0) * 10 >= pairs * 9 && zeros(1) === 0) return 'utf-16be';
  return isUtf8(bytes) ? 'utf-8' : 'windows-1252';
}

function isUtf8(bytes: Uint8Array): boolean {
  try {
    new TextDecoder('utf-8', { fatal: true }).decode(bytes);
    return true;
  } catch {
    return false;
  }
}

function hasBinary(text: string): boolean {
  const end = Math.min(text.length, LOOKED_AT);
  for (let index = 0; index < end; index++) {
    const code = text.charCodeAt(index);
    if (code < 32 && !ALLOWED_CONTROLS.has(code)) return true;
  }
  return false;
}
