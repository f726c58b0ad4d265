import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { heldRevision, reduce } from '../../app/live/reduce';
import { startState } from '../../app/live/state';
import type { EventState, Happening } from '../../app/live/state';
import { advisory, event, impact } from './sample';

const snapshotAt = (revision: number): Happening => ({
  kind: 'joined',
  atMs: 10,
  ack: { ok: true, snapshot: { event: event({ revision }), advisory: advisory(1), impact: impact(revision), computing: null } },
});
const missed = (...revisions: number[]): Happening => ({ kind: 'joined', atMs: 20, ack: { ok: true, missed: revisions.map((r) => impact(r)) } });
const live = (revision: number): Happening => ({ kind: 'impact', impact: impact(revision) });
const after = (...happenings: Happening[]): EventState => happenings.reduce(reduce, startState('e1', 0));

describe('revisions', () => {
  test('the next one is shown', () => {
    expect(heldRevision(after(snapshotAt(4), live(5)))).toBe(5);
  });

  test('one that came twice is shown once', () => {
    const once = after(snapshotAt(4), live(5));
    expect(reduce(once, live(5))).toBe(once);
  });

  test('an older one never replaces a newer one', () => {
    expect(heldRevision(after(snapshotAt(9), live(7)))).toBe(9);
  });

  test('a gap is not jumped: the screen asks to join again and shows what it held', () => {
    const gap = after(snapshotAt(4), live(7));
    expect(heldRevision(gap)).toBe(4);
    expect(gap.mustJoin).toBe(true);
  });

  test('what came early is shown once what it follows arrives', () => {
    const whole = after(snapshotAt(4), live(7), live(6), live(5));
    expect(heldRevision(whole)).toBe(7);
    expect(whole.mustJoin).toBe(false);
    expect(whole.early).toEqual([]);
  });

  test('after a gap the server tells what was missed, and early ones follow it', () => {
    const whole = after(snapshotAt(4), live(7), missed(5, 6));
    expect(heldRevision(whole)).toBe(7);
    expect(whole.mustJoin).toBe(false);
  });

  test('a screen that was away for long jumps to the newest the server still lists', () => {
    expect(heldRevision(after(snapshotAt(4), missed(20, 21, 19)))).toBe(21);
  });

  test('a snapshot replaces what was held, even by a lower revision (a restored store)', () => {
    expect(heldRevision(after(snapshotAt(9), snapshotAt(3)))).toBe(3);
  });

  test('any order and any repetition of the same messages ends at the same revision', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 5, max: 12 }), { maxLength: 30 }), (order) => {
        const first = after(snapshotAt(4), ...order.map(live));
        const held = heldRevision(first)!;
        // Held is the end of the unbroken run from 5.
        let expected = 4;
        while (order.includes(expected + 1)) expected += 1;
        expect(held).toBe(expected);
        expect(first.mustJoin).toBe(order.some((revision) => revision > expected));
      }),
    );
  });

  test('revisions on the screen only rise, each by one, while the line holds', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 1, max: 9 }), { maxLength: 30 }), (order) => {
        let state = startState('e1', 0);
        for (const revision of order) {
          const before = heldRevision(state) ?? 0;
          state = reduce(state, live(revision));
          expect(heldRevision(state) ?? 0).toBeGreaterThanOrEqual(before);
        }
      }),
    );
  });
});

describe('the line', () => {
  test('a lost line keeps the figures and says since when', () => {
    const lost = after(snapshotAt(4), { kind: 'disconnected', atMs: 77 });
    expect(lost.link).toEqual({ state: 'reconnecting', sinceMs: 77 });
    expect(heldRevision(lost)).toBe(4);
  });

  test('a line that is up again asks to join before it is called live', () => {
    const up = after(snapshotAt(4), { kind: 'disconnected', atMs: 77 }, { kind: 'connected', atMs: 90 });
    expect(up.mustJoin).toBe(true);
    expect(up.link.state).toBe('reconnecting');
    expect(reduce(up, missed(5)).link).toEqual({ state: 'live', sinceMs: 20 });
  });
});

describe('runs', () => {
  test('a track impact leaves the members computing, a member impact ends the run', () => {
    const track = after(snapshotAt(4), { kind: 'progress', notice: { eventId: 'e1', runId: 'r', done: 100, of: 1000 } }, {
      kind: 'impact',
      impact: impact(5, { stage: 'track' }),
    });
    expect(track.run).toMatchObject({ done: 100, of: 1000 });
    expect(reduce(track, live(6)).run).toBeNull();
  });

  test('a failed run keeps the last good revision and says so', () => {
    const failed = after(snapshotAt(4), { kind: 'failed', notice: { eventId: 'e1', runId: 'r', advisoryId: 'a2', message: 'no zones' } });
    expect(failed.failure?.message).toBe('no zones');
    expect(heldRevision(failed)).toBe(4);
    expect(reduce(failed, live(5)).failure).toBeNull();
  });

  test('an older advisory heard late does not become the newest', () => {
    const state = after({ kind: 'advisory', notice: { eventId: 'e1', advisory: advisory(3) } }, { kind: 'advisory', notice: { eventId: 'e1', advisory: advisory(2) } });
    expect(state.advisory?.id).toBe('a3');
    expect(Object.keys(state.advisories).sort()).toEqual(['a2', 'a3']);
  });
});
