import { expect, test } from 'vitest';
import { eventMsAt } from '../../app/live/clock';
import { linkStatus, STALE_AFTER_MS } from '../../app/live/link';
import { eventNowMs } from '../../lib/wire';
import { event } from './sample';

test('a screen whose own clock is wrong by a day shows the same event time as the server', () => {
  const clock = event({ clock: { startsAt: '2031-09-19T11:00:00Z', anchoredAt: '2026-12-01T09:00:00Z', rate: 60 } }).clock;
  const serverMs = Date.parse('2026-12-01T09:30:00Z');
  const localMs = serverMs - 86_400_000;
  const anchor = { eventMs: eventNowMs(clock, serverMs), heardMs: localMs, rate: 60 };
  expect(eventMsAt(anchor, localMs + 5000)).toBe(eventNowMs(clock, serverMs + 5000));
});

test('a stopped exercise clock stands still', () => {
  expect(eventMsAt({ eventMs: 1000, heardMs: 0, rate: 0 }, 99_999)).toBe(1000);
});

test('a short break is reconnecting, a long one is stale, a line that is heard is live', () => {
  const lost = { state: 'reconnecting' as const, sinceMs: 0 };
  expect(linkStatus(lost, null, STALE_AFTER_MS - 1).state).toBe('reconnecting');
  expect(linkStatus(lost, null, STALE_AFTER_MS)).toEqual({ state: 'stale', sinceMs: 0 });
  expect(linkStatus({ state: 'live', sinceMs: 0 }, 1e9 - 10_000, 1e9).state).toBe('live');
});

test('a line that is called live but tells no clock for long is stale since it was last heard', () => {
  expect(linkStatus({ state: 'live', sinceMs: 0 }, 1000, 1000 + STALE_AFTER_MS)).toEqual({ state: 'stale', sinceMs: 1000 });
});
