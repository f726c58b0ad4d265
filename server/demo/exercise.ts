import { randomUUID } from 'node:crypto';
import { acceptAdvisory, acceptLayer } from '../feeds';
import type { Accepted } from '../feeds';
import type { Services } from '../services';
import type { EventRecord } from '../store';
import type { Scenario } from './scenario';

type Needed = Pick<Services, 'store' | 'bus' | 'runs' | 'clock' | 'inspectLayer'>;

const ADVISORIES_AT_START = 3;
const ISSUER = 'demo';

/** The exercise that ships with the program: loads it, and issues its advisories one by one through the common way in. */
export function demoExercise(services: Needed, scenario: Scenario) {
  const { store, bus, clock } = services;

  /** Every demo advisory has its own idempotency key, so what is stored says what is still to come. */
  const keyOf = (index: number): string => `demo advisory ${index + 1}`;

  async function issued(event: EventRecord): Promise<number> {
    let count = 0;
    while (count < scenario.advisories.length && (await store.advisories.ofKey(event.id, keyOf(count)))) count++;
    return count;
  }

  async function issue(event: EventRecord, index: number, by: string): Promise<Accepted> {
    const { fileName, bytes } = scenario.advisories[index];
    const accepted = await acceptAdvisory(services, { event, source: { bytes, contentType: 'text/plain', fileName }, by, idempotencyKey: keyOf(index), setsClock: true });
    if (!accepted.ok) throw new Error(`Demo advisory ${fileName} cannot be read: ${accepted.errors[0]?.message}`);
    return accepted;
  }

  function computed(advisoryId: string): Promise<void> {
    return new Promise((resolve) => {
      const done = (notice: { advisoryId: string }): void => {
        if (notice.advisoryId !== advisoryId) return;
        for (const stop of stops) stop();
        resolve();
      };
      const stops = [bus.on('impact', done), bus.on('failed', done)];
    });
  }

  return {
    /** Advisories not issued yet. */
    async left(event: EventRecord): Promise<number> {
      return scenario.advisories.length - (await issued(event));
    },
    /** Issues the next advisory; null when all are in. */
    async next(event: EventRecord, by: string): Promise<Accepted | null> {
      const index = await issued(event);
      return index < scenario.advisories.length ? issue(event, index, by) : null;
    },
    /** A new demo event with its layers and its first advisories. */
    async load(): Promise<void> {
      const at = new Date(clock.nowMs()).toISOString();
      const event = await store.events.add({ id: randomUUID(), name: scenario.eventName, timeZone: scenario.timeZone, exercise: true, demo: true, clock: null, createdAt: at });
      for (const { kind, name, bytes, contentType, fileName } of scenario.layers) {
        const accepted = await acceptLayer(services, { eventId: event.id, kind, name, source: { bytes, contentType, fileName }, by: ISSUER });
        if (!accepted.ok) throw new Error(`Demo layer ${fileName} cannot be read: ${accepted.errors[0]?.message}`);
      }
      for (let index = 0; index < ADVISORIES_AT_START; index++) {
        const accepted = await issue(event, index, ISSUER);
        // Each is computed before the next comes, so that the first board can say what changed.
        if (accepted.ok && index + 1 < ADVISORIES_AT_START) await computed(accepted.advisory.id);
      }
    },
  };
}
