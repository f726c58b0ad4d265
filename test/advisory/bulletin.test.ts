import { describe, expect, test } from 'vitest';
import { bulletin, codes, errorsOf, expectedOf, namesIn, read, textOf } from './fixtures';

describe('every bulletin in the fixtures reads as it was written down by hand', () => {
  test.each(namesIn('bulletins'))('%s', (name) => {
    const expected = expectedOf('bulletins', name);
    const { advisory, warnings } = read(textOf('bulletins', name));
    expect(advisory).toEqual(expected.advisory);
    expect(warnings.map(({ code, line }) => ({ code, line }))).toEqual(expected.warnings);
  });
});

describe('the same bulletin reads the same however it is wrapped', () => {
  test.each(namesIn('bulletins'))('%s with carriage returns', (name) => {
    expect(read(textOf('bulletins', name).replace(/\n/g, '\r\n')).advisory).toEqual(expectedOf('bulletins', name).advisory);
  });

  test.each(namesIn('bulletins'))('%s in lower case, but for the centre as issued', (name) => {
    const { advisory } = expectedOf('bulletins', name);
    expect(read(textOf('bulletins', name).toLowerCase()).advisory).toEqual({ ...advisory, centre: advisory.centre.toLowerCase() });
  });

  test.each(namesIn('bulletins'))('%s in a web page', (name) => {
    const page = `<!DOCTYPE html>\n<html><head><title>FORECAST/ADVISORY NUMBER 99</title><script>document.write("FORECAST VALID 01/0000Z 1.0N 1.0W")</script></head>\n<body><pre>\n${textOf('bulletins', name)}</pre></body></html>`;
    expect(read(page).advisory).toEqual(expectedOf('bulletins', name).advisory);
  });

  test.each(namesIn('bulletins'))('%s with a break tag for every line end', (name) => {
    const page = `<html><body><p>${textOf('bulletins', name).replace(/&/g, '&amp;').replace(/ {2}/g, '&nbsp; ').split('\n').join('<br>')}</p></body></html>`;
    expect(read(page).advisory).toEqual(expectedOf('bulletins', name).advisory);
  });

  test('with blank lines between all lines', () => {
    expect(read(bulletin().replace(/\n/g, '\n\n')).advisory).toEqual(read(bulletin()).advisory);
  });

  test('with its transmission framed in control characters', () => {
    expect(read(`\u0001\r\r\n000 \r\r\nWTNT24 KNHC 190900\r\r\nTCMAT4\r\r\n${bulletin()}\n\u0003`).advisory).toEqual(read(bulletin()).advisory);
  });
});

describe('time', () => {
  const valid = (time: string, lines: Parameters<typeof bulletin>[0] = {}): string => read(bulletin({ ...lines, forecast: [`FORECAST VALID ${time} 24.9N  56.2W`, 'MAX WIND  80 KT.'] })).advisory.points[1]!.validAt;
  const issued = (date: string, day: string): Parameters<typeof bulletin>[0] => ({
    header: ['HURRICANE MARO FORECAST/ADVISORY NUMBER 5', 'NWS NATIONAL HURRICANE CENTER MIAMI FL AL092031', date],
    located: [`HURRICANE CENTER LOCATED NEAR 24.1N  55.2W AT ${day}/2100Z`, 'MAX SUSTAINED WINDS  70 KT.'],
    end: ['$$'],
  });

  test('a day before the issue day is in the next month', () => {
    expect(valid('01/0600Z', issued('2100 UTC WED SEP 30 2026', '30'))).toBe('2026-10-01T06:00:00Z');
  });

  test('December rolls into January of the next year', () => {
    expect(valid('01/0600Z', issued('2100 UTC THU DEC 31 2026', '31'))).toBe('2027-01-01T06:00:00Z');
  });

  test('February has a 29th in a leap year and never a 30th', () => {
    expect(valid('29/0600Z', issued('2100 UTC MON FEB 28 2028', '28'))).toBe('2028-02-29T06:00:00Z');
    expect(errorsOf(bulletin({ ...issued('2100 UTC SUN FEB 28 2027', '28'), forecast: ['FORECAST VALID 30/0600Z 24.9N  56.2W', 'MAX WIND  80 KT.'] }))[0]).toMatchObject({ line: 6, message: expect.stringContaining('30/0600Z is no day and hour near the issue time') as string });
  });

  test('a position a few minutes into the issue month may be of the month before', () => {
    const lines = { header: ['HURRICANE MARO FORECAST/ADVISORY NUMBER 5', 'NWS NATIONAL HURRICANE CENTER MIAMI FL', '0000 UTC THU OCT 01 2026'], located: ['HURRICANE CENTER LOCATED NEAR 24.1N  55.2W AT 30/2300Z', 'MAX SUSTAINED WINDS  70 KT.'], forecast: [], end: ['$$'] };
    expect(read(bulletin(lines)).advisory.points[0]!.validAt).toBe('2026-09-30T23:00:00Z');
  });

  test('an hour that no clock has is an error where it stands', () => {
    expect(errorsOf(bulletin({ forecast: ['FORECAST VALID 19/2500Z 24.9N  56.2W', 'MAX WIND  80 KT.'] }))[0]).toMatchObject({ line: 7, column: 1, message: expect.stringContaining('19/2500Z is no day and hour') as string });
  });

  test('the time the next advisory is due is kept', () => {
    expect(read(bulletin()).advisory.nextDueAt).toBe('2031-09-19T15:00:00Z');
  });
});

describe('hemispheres', () => {
  const at = (position: string): [number, number] => {
    const { lat, lon } = read(bulletin({ located: [`HURRICANE CENTER LOCATED NEAR ${position} AT 19/0900Z`, 'MAX SUSTAINED WINDS  70 KT.'], forecast: [] })).advisory.points[0]!;
    return [lat, lon];
  };

  test('south and west are negative', () => expect(at('15.2S 168.3W')).toEqual([-15.2, -168.3]));
  test('north and east are positive', () => expect(at('15.2N 168.3E')).toEqual([15.2, 168.3]));
  test('blanks before the letter or between the numbers do not matter', () => expect(at('15.2 N    168.3 E')).toEqual([15.2, 168.3]));
  test('whole degrees read', () => expect(at('15N 168E')).toEqual([15, 168]));
});

describe('the end of the storm', () => {
  const ending = (...lines: string[]): string => bulletin({ forecast: ['FORECAST VALID 19/1800Z 24.9N  56.2W', 'MAX WIND  30 KT.', ...lines] });

  test.each(['DISSIPATED', 'ABSORBED BY EXTRATROPICAL LOW', 'dissipated', 'DISSIPATED INLAND'])('a point that says only %s ends the track and leaves its time', (remark) => {
    const { advisory, warnings } = read(ending(`FORECAST VALID 20/0600Z...${remark}`));
    expect(advisory.points).toHaveLength(2);
    expect(advisory.dissipatesAt).toBe('2031-09-20T06:00:00Z');
    expect(codes(warnings)).toContain('dissipation-forecast');
  });

  test('said twice, the first time counts', () => {
    expect(read(ending('FORECAST VALID 20/0600Z...DISSIPATED', 'OUTLOOK VALID 21/0600Z...DISSIPATED')).advisory.dissipatesAt).toBe('2031-09-20T06:00:00Z');
  });

  test('DISSIPATING is still there', () => {
    const { advisory } = read(ending('FORECAST VALID 20/0600Z 25.5N  57.0W...DISSIPATING', 'MAX WIND  25 KT.'));
    expect(advisory.points[2]).toMatchObject({ lat: 25.5, maxWindKt: 25 });
    expect(advisory.dissipatesAt).toBeUndefined();
  });

  test('a position after the end is kept, and the contradiction is warned of', () => {
    const { advisory, warnings } = read(ending('FORECAST VALID 20/0600Z...DISSIPATED', 'FORECAST VALID 20/1800Z 26.0N  58.0W', 'MAX WIND  25 KT.'));
    expect(advisory.points).toHaveLength(3);
    expect(advisory.dissipatesAt).toBeUndefined();
    expect(codes(warnings)).toContain('position-after-end');
  });

  test('a point without a position that does not say the storm has gone is an error', () => {
    expect(errorsOf(ending('FORECAST VALID 20/0600Z...INLAND'))[0]).toMatchObject({ line: 9, message: expect.stringContaining('no position') as string });
  });
});

describe('what is missing or doubled', () => {
  test('a point without a wind names the line to add to', () => {
    expect(errorsOf(bulletin({ forecast: ['FORECAST VALID 19/1800Z 24.9N  56.2W', 'FORECAST VALID 20/0600Z 25.5N  57.0W', 'MAX WIND  80 KT.'] }))[0]).toMatchObject({ line: 7, message: expect.stringContaining('no maximum wind follows "FORECAST VALID 19/1800Z') as string });
  });

  test('a second wind for a point points at the forecast line that was not recognised', () => {
    expect(errorsOf(bulletin({ forecast: ['FORECAST VALID 19/1800Z 24.9N  56.2W', 'MAX WIND  80 KT.', 'FORCAST VALID 20/0600Z 25.5N  57.0W', 'MAX WIND  85 KT.'] }))[0]).toMatchObject({ line: 10, message: expect.stringContaining('missing or misspelt') as string });
  });

  test('a line with position and time that was not understood is warned of', () => {
    const { warnings } = read(bulletin({ forecast: ['FORCAST VALID 20/0600Z 25.5N  57.0W'] }));
    expect(warnings).toContainEqual(expect.objectContaining({ code: 'line-unread', line: 7 }));
  });

  test('two positions for one time: the first is kept and both lines are named', () => {
    const { advisory, warnings } = read(textOf('bulletins', 'mcp0394.001'));
    expect(advisory.points.at(-1)).toMatchObject({ validAt: '1994-10-24T18:00:00Z', lat: 12.9, lon: -158 });
    expect(warnings[0]!.message).toContain('lines 30 and 33');
  });

  test('times that go back are an error that names both', () => {
    const forecast = ['FORECAST VALID 20/1800Z 24.9N  56.2W', 'MAX WIND  80 KT.', 'FORECAST VALID 20/0600Z 25.5N  57.0W', 'MAX WIND  85 KT.'];
    expect(errorsOf(bulletin({ forecast }))[0]).toMatchObject({ line: 9, path: 'points[2].validAt', message: expect.stringContaining('earlier than 2031-09-20T18:00:00Z of the point on line 7') as string });
  });

  test('a repeated position that differs is warned of and the first kept', () => {
    const { advisory, warnings } = read(bulletin({ forecast: ['REPEAT...CENTER LOCATED NEAR 24.2N  55.2W AT 19/0900Z'] }));
    expect(advisory.points[0]!.lat).toBe(24.1);
    expect(codes(warnings)).toContain('position-repeat-differs');
  });

  test('the advisory written for the public is told apart', () => {
    const text = bulletin({ located: ['SUMMARY OF 500 AM EDT...0900 UTC...INFORMATION', 'LOCATION...24.1N 55.2W'], forecast: [] });
    expect(errorsOf(text)[0]!.message).toContain('give the forecast/advisory of the same number');
  });

  test('a second bulletin in the file is not read, and said so', () => {
    const { advisory, warnings } = read(`${bulletin()}\n${bulletin().replace('NUMBER   5', 'NUMBER   6')}`);
    expect(advisory).toEqual(read(bulletin()).advisory);
    expect(warnings).toContainEqual(expect.objectContaining({ code: 'several-bulletins', line: 12 }));
  });

  test('lost line breaks are named as such', () => {
    expect(errorsOf(bulletin().padEnd(600).replace(/\n/g, ' ') + textOf('bulletins', 'al012004.fstadv.012').replace(/\n/g, ' '))[0]).toMatchObject({ line: 1, message: expect.stringContaining('lost its line breaks') as string });
  });
});

describe('a bulletin cut off anywhere never passes without a word', () => {
  test.each(namesIn('bulletins'))('%s', (name) => {
    const text = textOf('bulletins', name);
    const whole = expectedOf('bulletins', name).advisory;
    const end = text.search(/NEXT ADVISORY|THIS IS THE LAST/);
    for (let length = 0; length < end; length += 3) {
      const cut = text.slice(0, length);
      let told = false;
      try {
        told = codes(read(cut).warnings).includes('end-missing');
      } catch (error) {
        told = (error as Error).message.startsWith('not read: [{');
      }
      expect(told, `cut after ${length} of ${text.length}`).toBe(true);
    }
    expect(read(text.slice(0, end) + '$$').advisory.points).toEqual(whole.points);
  });
});

describe('impossible values are refused where they stand', () => {
  test('latitude 95', () => {
    expect(errorsOf(bulletin({ forecast: ['FORECAST VALID 19/1800Z 95.0N  56.2W', 'MAX WIND  80 KT.'] }))[0]).toMatchObject({ line: 7, column: 1, path: 'points[1].lat', message: 'latitude lies between -90 and 90; found 95' });
  });

  test('a wind of -5 kt', () => {
    expect(errorsOf(bulletin({ forecast: ['FORECAST VALID 19/1800Z 24.9N  56.2W', 'MAX WIND  -5 KT.'] }))[0]).toMatchObject({ line: 8, path: 'points[1].maxWindKt', message: 'wind cannot be negative; found -5' });
  });

  test('a wind that is not a number', () => {
    expect(errorsOf(bulletin({ forecast: ['FORECAST VALID 19/1800Z 24.9N  56.2W', 'MAX WIND  NaN KT.'] }))[0]).toMatchObject({ line: 8, message: expect.stringContaining('no wind in knots') as string });
  });

  test('a pressure that no cyclone has', () => {
    expect(errorsOf(bulletin({ located: ['HURRICANE CENTER LOCATED NEAR 24.1N  55.2W AT 19/0900Z', 'ESTIMATED MINIMUM CENTRAL PRESSURE  98 MB', 'MAX SUSTAINED WINDS  70 KT.'] }))[0]).toMatchObject({ line: 6 });
  });
});

describe('averaging', () => {
  const by = (centre: string, ...more: string[]): ReturnType<typeof read> => read(bulletin({ header: ['HURRICANE MARO FORECAST/ADVISORY NUMBER 5', centre, '0900 UTC FRI SEP 19 2031'], forecast: more }));

  test('United States centres average over one minute', () => {
    const { advisory, warnings } = by('NATIONAL WEATHER SERVICE HONOLULU HI');
    expect(advisory.averaging).toBe('1-min');
    expect(codes(warnings)).not.toContain('averaging-assumed');
  });

  test('for any other centre one minute is assumed with a warning', () => {
    const { advisory, warnings } = by('SOME OTHER CENTRE');
    expect(advisory.averaging).toBe('1-min');
    expect(codes(warnings)).toContain('averaging-assumed');
  });

  test('what the bulletin says itself counts', () => {
    expect(by('SOME OTHER CENTRE', 'WINDS ARE 10-MINUTE AVERAGES.').advisory.averaging).toBe('10-min');
  });
});
