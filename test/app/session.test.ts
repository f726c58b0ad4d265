import { describe, expect, test } from 'vitest';
import { createStore } from 'zustand/vanilla';
import { openSession } from '../../app/live/session';
import type { LiveSocket } from '../../app/live/session';
import { startState } from '../../app/live/state';
import type { EventState } from '../../app/live/state';
import type { JoinAck } from '../../lib/wire';
import { advisory, event, impact } from './sample';

/** A socket whose other end is moved by hand: no waiting. */
function wire() {
  const listeners = new Map<string, (payload?: unknown) => void>();
  const sent: { name: string; message: unknown; ack?: (answer: JoinAck) => void }[] = [];
  const timers: (() => void)[] = [];
  let opened = 0;
  const socket = {
    connected: false,
    on: (name: string, listener: (payload?: unknown) => void) => listeners.set(name, listener),
    emit: (name: string, message: unknown, ack?: (answer: JoinAck) => void) => sent.push({ name, message, ack }),
    connect: () => (opened += 1),
    disconnect: () => hear('disconnect', 'io client disconnect'),
  };
  const hear = (name: string, payload?: unknown): void => {
    if (name === 'connect') socket.connected = true;
    if (name === 'disconnect') socket.connected = false;
    listeners.get(name)?.(payload);
  };
  const store = createStore<EventState>(() => startState('e1', 0));
  const session = openSession(store, socket as unknown as LiveSocket, {
    nowMs: () => 5,
    later: (_ms, run) => {
      timers.push(run);
      return () => timers.splice(timers.indexOf(run), 1);
    },
  });
  return { store, session, hear, sent, timers, opened: () => opened, joins: () => sent.filter((message) => message.name === 'join') };
}
const snapshot = (revision: number): JoinAck => ({
  ok: true,
  snapshot: { event: event({ revision }), advisory: advisory(1), impact: revision ? impact(revision) : null, computing: null },
});

describe('a screen', () => {
  test('joins with nothing held at first, with the revision held after a break', () => {
    const line = wire();
    line.hear('connect');
    expect(line.joins()[0].message).toEqual({ eventId: 'e1', revision: null });
    line.joins()[0].ack!(snapshot(4));
    line.hear('disconnect', 'transport close');
    line.hear('connect');
    expect(line.joins()[1].message).toEqual({ eventId: 'e1', revision: 4 });
    line.joins()[1].ack!({ ok: true, missed: [impact(5), impact(6), impact(7)] });
    expect(line.store.getState().impact?.revision).toBe(7);
    expect(line.store.getState().link.state).toBe('live');
  });

  test('joins once more, and only once, when a revision was skipped', () => {
    const line = wire();
    line.hear('connect');
    line.joins()[0].ack!(snapshot(4));
    line.hear('impact', impact(6));
    line.hear('impact', impact(7));
    expect(line.joins()).toHaveLength(2);
    line.joins()[1].ack!({ ok: true, missed: [impact(5), impact(6)] });
    expect(line.store.getState().impact?.revision).toBe(7);
    expect(line.joins()).toHaveLength(2);
  });

  test('asks again when a join is never answered, and ignores the answer that comes too late', () => {
    const line = wire();
    line.hear('connect');
    line.timers[0]();
    expect(line.joins()).toHaveLength(2);
    line.joins()[0].ack!(snapshot(9));
    expect(line.store.getState().impact).toBeNull();
    line.joins()[1].ack!(snapshot(4));
    expect(line.store.getState().impact?.revision).toBe(4);
  });

  test('comes back by itself when the server ended the connection', () => {
    const line = wire();
    line.hear('connect');
    line.joins()[0].ack!(snapshot(4));
    line.hear('disconnect', 'io server disconnect');
    line.timers[0]();
    expect(line.opened()).toBe(2);
  });

  test('does not listen to another event', () => {
    const line = wire();
    line.hear('connect');
    line.joins()[0].ack!(snapshot(4));
    line.hear('impact', impact(5, { eventId: 'other' }));
    expect(line.store.getState().impact?.revision).toBe(4);
  });

  test('says each revision it has shown once a connection', () => {
    const line = wire();
    line.hear('connect');
    line.session.seen(4);
    line.session.seen(4);
    expect(line.sent.filter((message) => message.name === 'seen')).toHaveLength(1);
  });

  test('a refused key is said, not retried as a lost line', () => {
    const line = wire();
    line.hear('connect_error', Object.assign(new Error('sign in first'), { data: { code: 'unauthorized' } }));
    expect(line.store.getState().link).toMatchObject({ state: 'refused', code: 'unauthorized' });
  });
});
