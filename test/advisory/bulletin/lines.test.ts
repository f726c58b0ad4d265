import { describe, expect, test } from 'vitest';
import { joinedLine, linesOf } from '../../../lib/advisory/bulletin/lines';

const texts = (text: string): string[] => linesOf(text).map((line) => line.text);

describe('plain text', () => {
  test('lines know where they stand, blank ones left out', () => {
    expect(linesOf('ONE\n\n  TWO  \n')).toEqual([{ number: 1, column: 1, text: 'ONE' }, { number: 3, column: 3, text: 'TWO' }]);
  });

  test('any line end ends a line', () => {
    expect(linesOf('ONE\r\nTWO\rTHREE\nFOUR').map(({ number }) => number)).toEqual([1, 2, 3, 4]);
  });

  test('tabs and no-break spaces are blanks', () => {
    expect(texts('\tONE\u00a0TWO\t')).toEqual(['ONE TWO']);
  });

  test('signs that look like markup stay where there is none', () => {
    expect(texts('WINDS <34 KT AND >20 KT')).toEqual(['WINDS <34 KT AND >20 KT']);
  });
});

describe('a web page', () => {
  test('lines keep their numbers and columns', () => {
    expect(linesOf('<html><body>\n<pre>\nONE\n  <b>TWO</b></pre>')).toEqual([{ number: 3, column: 1, text: 'ONE' }, { number: 4, column: 6, text: 'TWO' }]);
  });

  test('a break tag ends a line', () => {
    expect(texts('<p>ONE<br>TWO<BR/>THREE</p>')).toEqual(['ONE', 'TWO', 'THREE']);
  });

  test('entities become what they stand for', () => {
    expect(texts('<pre>A&amp;B &lt;C&gt; &quot;D&quot; &#69;&#x46;&nbsp;&unknown;</pre>')).toEqual(['A&B <C> "D" EF &unknown;']);
  });

  test('scripts, styles, comments and the title are no text', () => {
    expect(texts('<html><title>T</title><script>let s = "S";</script><style>p {}</style><!-- C --><pre>ONE</pre></html>')).toEqual(['ONE']);
  });

  test('a script that never closes hides the rest', () => {
    expect(texts('<pre>ONE\n</pre><script>FORECAST VALID\nTWO')).toEqual(['ONE']);
  });
});

describe('lost line breaks', () => {
  test('are seen where keywords stand far along a line', () => {
    expect(joinedLine(`short\n${' '.repeat(500)}FORECAST VALID 19/1800Z`)).toBe(2);
  });

  test('are not seen in a long line of a page that has none', () => {
    expect(joinedLine(`<html><script>${'x'.repeat(1000)}FORECAST VALID</script>\n<pre>ONE</pre>`)).toBeNull();
  });
});
