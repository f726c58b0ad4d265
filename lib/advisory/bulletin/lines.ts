/** A piece of a bulletin and where it stands in the file, counted from 1. */
export interface Line {
  number: number;
  column: number;
  text: string;
}

/** Longer than any line of a bulletin; more is not searched, so that no line can cost more than its length. */
const LONGEST_LINE = 240;
const BREAK = '\v';
/** Parts of a page that are not its text. */
const UNSEEN = [['<!--', '-->'], ['<script', '</script'], ['<style', '</style'], ['<title', '</title']] as const;
const NAMED: Record<string, string> = { amp: '&', lt: '<', gt: '>', quot: '"', apos: "'", nbsp: ' ' };

/** The lines of a bulletin that are not blank, plain or taken out of a web page. Nothing of the page is run. */
export function linesOf(text: string): Line[] {
  const plain = looksLikeHtml(text) ? withoutTags(text) : text;
  const lines: Line[] = [];
  plain.split(/\r\n|\n|\r/).forEach((physical, index) => {
    let column = 1;
    for (const part of physical.split(BREAK)) {
      const content = part.slice(0, LONGEST_LINE).replace(/[\t\f\u00a0]/g, ' ');
      const start = content.search(/\S/);
      if (start >= 0) lines.push({ number: index + 1, column: column + start, text: decoded(content.slice(start).trimEnd()) });
      column += part.length + 1;
    }
  });
  return lines;
}

/** A line too long for a bulletin that holds what belongs on lines of its own: the breaks were lost on the way. */
export function joinedLine(text: string): number | null {
  const plain = looksLikeHtml(text) ? withoutTags(text) : text;
  const index = plain.split(/\r\n|\n|\r|\v/).findIndex((line) => line.length > LONGEST_LINE && /(FORECAST|OUTLOOK) VALID|CENTER LOCATED/i.test(line.slice(LONGEST_LINE)));
  return index < 0 ? null : index + 1;
}

const looksLikeHtml = (text: string): boolean => /<(?:!doctype|html|body|head|pre|div|p|br|span|table)\b/i.test(text);

/** Blanks out every tag, keeping each character where it stood; breaking tags become break marks. */
function withoutTags(text: string): string {
  const body = UNSEEN.reduce((rest, [open, close]) => withoutElement(rest, open, close), text);
  return body.replace(/<[^<>]*>/g, (tag) => {
    const blank = tag.replace(/[^\r\n]/g, ' ');
    return /^<\/?(?:br|p|div|tr|li|pre|h[1-6])\b/i.test(tag) ? BREAK + blank.slice(1) : blank;
  });
}

/** One pass: an element never closed reaches to the end. */
function withoutElement(text: string, open: string, close: string): string {
  const lower = text.replace(/[A-Z]/g, (letter) => letter.toLowerCase());
  let out = '';
  for (let from = 0; ; ) {
    const start = lower.indexOf(open, from);
    if (start < 0) return out + text.slice(from);
    const found = lower.indexOf(close, start);
    const closed = found < 0 ? -1 : lower.indexOf('>', found);
    const end = closed < 0 ? text.length : closed + 1;
    out += text.slice(from, start) + text.slice(start, end).replace(/[^\r\n]/g, ' ');
    from = end;
  }
}

const decoded = (text: string): string =>
  text.replace(/&(?:#(\d{1,6})|#x([0-9a-f]{1,5})|([a-z]{2,6}));/gi, (entity, decimal?: string, hex?: string, name?: string) => {
    if (name !== undefined) return NAMED[name.toLowerCase()] ?? entity;
    const code = decimal === undefined ? parseInt(hex!, 16) : Number(decimal);
    return code > 31 && code < 0x110000 ? String.fromCodePoint(code).replace('\u00a0', ' ') : ' ';
  });
