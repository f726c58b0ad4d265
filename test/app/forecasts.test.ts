import { describe, expect, test } from 'vitest';
import { emptyForm, emptyRow, errorsByCell, pasted, toBody, toInstant } from '../../app/forecasts/advisoryForm';
import { quoteErrors } from '../../app/forecasts/source';
import { advisorySchema } from '../../lib/advisory';

const filled = () => ({
  ...emptyForm(),
  stormName: 'Quillon',
  number: '5',
  centre: 'Exercise centre',
  issuedAt: '2031-09-19 09:00',
  rows: [
    { ...emptyRow(0), validAt: '2031-09-19 09:00', lat: '23.4', lon: '-50.1', maxWindKt: '90', r34: '120 100 60 90' },
    emptyRow(1),
    { ...emptyRow(2), validAt: '2031-09-19T15:00Z', lat: '24', lon: '-51', maxWindKt: '95' },
  ],
});

describe('an advisory typed by hand', () => {
  test('is an advisory as the contract has it; blank rows and fields are not given', () => {
    const body = advisorySchema.parse(toBody(filled()));
    expect(body.points).toHaveLength(2);
    expect(body.points[0].radiiNm).toEqual({ '34': { ne: 120, se: 100, sw: 60, nw: 90 } });
    expect(body.points[1]).not.toHaveProperty('gustKt');
    expect(body).not.toHaveProperty('nextDueAt');
  });

  test('an error is shown in the cell it stands in, though blank rows were left out', () => {
    const { cells, fields, rest } = errorsByCell(
      [{ path: 'points.1.lat', message: 'latitude' }, { path: 'points.0.radiiNm.34.ne', message: 'radius' }, { path: 'storm.name', message: 'name' }, { path: 'points', message: 'order' }],
      filled(),
    );
    expect(cells.get('2.lat')).toBe('latitude');
    expect(cells.get('0.r34')).toBe('radius');
    expect(fields.get('stormName')).toBe('name');
    expect(rest).toEqual([{ path: 'points', message: 'order' }]);
  });

  test('a time typed as forecast centres write it is UTC; what is no time goes through as it is', () => {
    expect(toInstant('2031-09-19 0900Z')).toBe('2031-09-19T09:00:00Z');
    expect(toInstant('19 September')).toBe('19 September');
  });

  test('text where a number belongs is not turned into zero', () => {
    const form = filled();
    form.rows[0].maxWindKt = 'ninety';
    expect(advisorySchema.safeParse(toBody(form)).success).toBe(false);
  });

  test('rows pasted from a spreadsheet fill the cells from where they were pasted and add rows', () => {
    const rows = pasted([emptyRow(0), emptyRow(1)], 1, 'lat', '24.1\t-51.2\t80\r\n25\t-52\t85\n');
    expect(rows).toHaveLength(3);
    expect(rows[1]).toMatchObject({ validAt: '', lat: '24.1', lon: '-51.2', maxWindKt: '80' });
    expect(rows[2]).toMatchObject({ key: 2, lat: '25', maxWindKt: '85' });
  });
});

describe('an error in a file', () => {
  test('is quoted with a caret under its column', () => {
    const [quoted] = quoteErrors([{ line: 2, column: 5, message: 'no' }], 'first\nlat 95.0\n');
    expect(quoted.quote).toBe('lat 95.0');
    expect(quoted.quote![quoted.caret!.indexOf('^')]).toBe('9');
  });

  test('is quoted around its column where the line is long', () => {
    const line = `${'x'.repeat(500)}Y${'x'.repeat(500)}`;
    const [quoted] = quoteErrors([{ line: 1, column: 501, message: 'no' }], line);
    expect(quoted.quote!.length).toBeLessThan(170);
    expect(quoted.quote![quoted.caret!.indexOf('^')]).toBe('Y');
  });

  test('without a line is not quoted', () => {
    expect(quoteErrors([{ message: 'empty' }], 'a')[0]).toMatchObject({ quote: null, caret: null });
  });
});
