import { describe, expect, test } from 'vitest';
import { makeFormats } from '../../app/prefs/format';
import { DEFAULT_PREFS, keepPrefs, prefsStore, PREFS_KEY, readPrefs } from '../../app/prefs/prefs';

describe('preferences', () => {
  test('that are damaged or unknown fall back one by one', () => {
    expect(readPrefs('not json')).toEqual(DEFAULT_PREFS);
    expect(readPrefs('{"theme":"pink","wind":"mph"}')).toEqual({ ...DEFAULT_PREFS, wind: 'mph' });
    expect(readPrefs(null)).toEqual(DEFAULT_PREFS);
  });

  test('are remembered from one visit to the next', () => {
    const kept = new Map<string, string>([[PREFS_KEY, '{"hours":"12"}']]);
    const stop = keepPrefs({ getItem: (key) => kept.get(key) ?? null, setItem: (key, value) => kept.set(key, value) });
    expect(prefsStore.getState().hours).toBe('12');
    prefsStore.setState({ wind: 'm/s' });
    stop();
    expect(readPrefs(kept.get(PREFS_KEY)!)).toEqual({ ...DEFAULT_PREFS, hours: '12', wind: 'm/s' });
  });
});

describe('times', () => {
  // 2031-09-19 01:40 UTC, a Friday, is Thursday evening four hours west.
  const at = '2031-09-19T01:40:00Z';

  test('are written on the event clock with the weekday there, and in UTC', () => {
    const formats = makeFormats(DEFAULT_PREFS, 'Etc/GMT+4');
    expect(formats.dayTime(at)).toBe('Thu 21:40');
    expect(formats.clock(at)).toBe('21:40');
    expect(formats.utc(at)).toBe('0140 UTC');
  });

  test('are written in twelve hours where that is preferred', () => {
    const formats = makeFormats({ ...DEFAULT_PREFS, hours: '12' }, 'Etc/GMT+4');
    expect(formats.clock(at)).toBe('9:40\u00a0pm');
    expect(formats.dayTime(at)).toBe('Thu 9:40\u00a0pm');
  });

  test('that are not known are a dash, never midnight', () => {
    const formats = makeFormats(DEFAULT_PREFS, 'UTC');
    expect([formats.clock(null), formats.dayTime(null), formats.date(null), formats.utc(null), formats.wind(null)]).toEqual(['–', '–', '–', '–', '–']);
  });
});

test('winds are written in the preferred unit: 64 kt is 74 mph (NIST SP 811 factors)', () => {
  expect(makeFormats({ ...DEFAULT_PREFS, wind: 'mph' }, 'UTC').wind(64)).toBe('74\u00a0mph');
  expect(makeFormats({ ...DEFAULT_PREFS, wind: 'm/s' }, 'UTC').wind(64)).toBe('33\u00a0m/s');
});
