const formats = new Map<string, Intl.DateTimeFormat>();

/** Hours that clocks in a zone are ahead of UTC at an instant (ms since 1970). */
export function wallOffsetHours(ms: number, timeZone: string): number {
  let format = formats.get(timeZone);
  if (!format) {
    format = new Intl.DateTimeFormat('en-US', { timeZone, hourCycle: 'h23', year: 'numeric', month: 'numeric', day: 'numeric', hour: 'numeric', minute: 'numeric', second: 'numeric' });
    formats.set(timeZone, format);
  }
  const part = Object.fromEntries(format.formatToParts(ms).map(({ type, value }) => [type, Number(value)]));
  const wall = Date.UTC(part.year, part.month - 1, part.day, part.hour, part.minute, part.second);
  return Math.round((wall - Math.floor(ms / 1000) * 1000) / 60_000) / 60;
}
