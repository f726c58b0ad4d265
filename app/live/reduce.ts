import type { Impact } from '../../lib/impact';
import type { Event, Snapshot, StoredAdvisory } from '../../lib/wire';
import type { EventState, Happening } from './state';

/** The event after one happening. Pure: revisions are applied in order, each once; a gap asks to join again. */
export function reduce(state: EventState, happening: Happening): EventState {
  switch (happening.kind) {
    case 'connected':
      return { ...state, mustJoin: true };
    case 'disconnected':
      return { ...state, mustJoin: false, early: [], screens: [], link: { state: 'reconnecting', sinceMs: happening.atMs } };
    case 'refused':
      return { ...state, mustJoin: false, link: { state: 'refused', sinceMs: happening.atMs, code: happening.code, message: happening.message } };
    case 'joined': {
      const live = { ...state, mustJoin: false, link: { state: 'live' as const, sinceMs: happening.atMs } };
      return 'snapshot' in happening.ack
        ? withSnapshot(live, happening.ack.snapshot, happening.atMs)
        : drain([...happening.ack.missed].sort(byRevision).reduce(withImpact, live));
    }
    case 'event':
      return withEvent(state, happening.event, happening.atMs);
    case 'advisory':
      return withAdvisory(state, happening.notice.advisory);
    case 'impact':
      return withLiveImpact(state, happening.impact);
    case 'progress': {
      const { runId, done, of } = happening.notice;
      return { ...state, run: { runId, advisoryId: state.run?.runId === runId ? state.run.advisoryId : null, done, of } };
    }
    case 'failed':
      return { ...state, run: null, failure: happening.notice };
    case 'presence':
      return { ...state, screens: happening.notice.screens };
    case 'log':
      return state.log.some((entry) => entry.id === happening.entry.id) ? state : { ...state, log: [...state.log, happening.entry] };
    case 'clock': {
      const { now, rate } = happening.notice;
      return { ...state, clock: { eventMs: Date.parse(now), heardMs: happening.atMs, rate } };
    }
  }
}

const byRevision = (a: Impact, b: Impact): number => a.revision - b.revision;

/** The revision this screen holds; null before the first. */
export const heldRevision = (state: EventState): number | null => state.impact?.revision ?? null;

function withSnapshot(state: EventState, snapshot: Snapshot, atMs: number): EventState {
  const { advisory, impact, computing } = snapshot;
  const known = advisory ? withAdvisory(state, advisory) : state;
  return drain({
    ...withEvent(known, snapshot.event, atMs),
    advisory,
    impact,
    failure: null,
    run: computing && { ...computing, done: 0, of: 0 },
  });
}

function withEvent(state: EventState, event: Event, atMs: number): EventState {
  return { ...state, event, clock: { eventMs: Date.parse(event.now), heardMs: atMs, rate: event.clock?.rate ?? 1 } };
}

function withAdvisory(state: EventState, advisory: StoredAdvisory): EventState {
  const newest = !state.advisory || advisory.sequence >= state.advisory.sequence;
  return {
    ...state,
    advisory: newest ? advisory : state.advisory,
    advisories: { ...state.advisories, [advisory.id]: advisory },
    failure: newest && state.failure?.advisoryId !== advisory.id ? null : state.failure,
  };
}

/** A revision that is known to be the next this screen must show (it follows, or the server said it was missed). */
function withImpact(state: EventState, impact: Impact): EventState {
  if (impact.revision <= (heldRevision(state) ?? 0)) return state;
  return {
    ...state,
    impact,
    failure: null,
    // A track impact leaves the members to be computed; a member impact ends the run.
    run: impact.stage === 'members' ? null : state.run && { ...state.run, advisoryId: impact.advisoryId },
    event: state.event && { ...state.event, revision: impact.revision, advisoryId: impact.advisoryId },
  };
}

function withLiveImpact(state: EventState, impact: Impact): EventState {
  const held = heldRevision(state) ?? 0;
  if (impact.revision <= held) return state;
  if (impact.revision === held + 1) return drain(withImpact(state, impact));
  const known = state.early.some((one) => one.revision === impact.revision);
  return { ...state, early: known ? state.early : [...state.early, impact].sort(byRevision), mustJoin: true };
}

/** Applies what came early and now follows; what still does not follow asks to join again. */
function drain(state: EventState): EventState {
  const next = state.early.reduce((at, impact) => (impact.revision === (heldRevision(at) ?? 0) + 1 ? withImpact(at, impact) : at), state);
  const early = state.early.filter((impact) => impact.revision > (heldRevision(next) ?? 0));
  return { ...next, early, mustJoin: early.length > 0 };
}
