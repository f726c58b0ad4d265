import { describe, expect, test } from 'vitest';
import { forecastsIn, preferred } from '../../../lib/advisory/deck/choose';
import { deckLine } from '../../../lib/advisory/deck/deck-line';
import type { DeckForecast } from '../../../lib/advisory/deck/choose';

/** Forecasts given as `TECHNIQUE cycle-hour leads`. */
function deck(...forecasts: string[]): DeckForecast[] {
  return forecastsIn(
    forecasts.flatMap((text) => {
      const [technique, hour, ...leads] = text.split(' ');
      return leads.map((lead, index) => {
        const read = deckLine(`AL, 09, 20310919${hour}, 03, ${technique}, ${lead}, 241N, 552W, 70, 0, HU,`, index + 1);
        if ('message' in read) throw new Error(read.message);
        return read;
      });
    }),
  );
}

const chosen = (...forecasts: string[]): string => {
  const best = preferred(deck(...forecasts));
  return best === undefined ? 'none' : `${best.technique} ${best.cycle.slice(8)}`;
};

describe('which forecast is taken', () => {
  test('an official one before any aid, however long', () => expect(chosen('HCCA 06 0 12 24 36', 'OFCL 06 0 12')).toBe('OFCL 06'));
  test('an official one of an older cycle before an aid of a newer', () => expect(chosen('HCCA 12 0 12 24', 'OFCL 06 0 12')).toBe('OFCL 06'));
  test('the newer of two official ones', () => expect(chosen('OFCL 06 0 12 24', 'OFCL 12 0 12')).toBe('OFCL 12'));
  test('JTWC is official too', () => expect(chosen('AVNO 06 0 12 24', 'JTWC 06 0 12')).toBe('JTWC 06'));
  test('of aids, the newest cycle', () => expect(chosen('AVNO 00 0 12 24 36', 'HWRF 06 0 12')).toBe('HWRF 06'));
  test('of aids of one cycle, the one with the most leads', () => expect(chosen('AVNO 06 0 12', 'HWRF 06 0 12 24')).toBe('HWRF 06'));
  test('none from only what lies before the cycle', () => expect(chosen('CARQ 06 -24 -12')).toBe('none'));
  test('none from nothing', () => expect(preferred([])).toBeUndefined());
});

describe('forecasts in a deck', () => {
  test('are told apart by technique and cycle, in the order of the file', () => {
    expect(deck('OFCL 06 0', 'HCCA 06 0', 'OFCL 00 0').map(({ technique, cycle }) => `${technique} ${cycle}`)).toEqual(['OFCL 2031091906', 'HCCA 2031091906', 'OFCL 2031091900']);
  });

  test('count each lead once, and none before the cycle', () => {
    expect(deck('OFCL 06 -12 0 12 12 24')[0]).toMatchObject({ leads: 3, usableLeads: 3 });
  });
});
