'use client';
import { createContext, useContext, useEffect, useMemo, useState } from 'react';
import type { ReactNode } from 'react';
import { useStore } from 'zustand';
import type { StoreApi } from 'zustand/vanilla';
import { makeFormats } from '../prefs/format';
import type { Formats } from '../prefs/format';
import { prefsStore } from '../prefs/prefs';
import { createBulk } from './bulk';
import type { Bulk } from './bulk';
import { eventMsAt } from './clock';
import { makeLiveEvent } from './connect';
import type { LiveEvent } from './connect';
import { followRevisions } from './follow';
import { followAssets } from './followAssets';
import type { EventState } from './state';
import { tickStore } from './tick';
import { createView } from './view';
import type { View } from './view';

interface Hold {
  live: LiveEvent;
  bulk: StoreApi<Bulk>;
  view: StoreApi<View>;
}

const HoldContext = createContext<Hold | null>(null);

/** Opens an event for everything below it, and closes it when it goes. Give it the event's id as its key. */
export function EventProvider({ eventId, children }: { eventId: string; children: ReactNode }) {
  const [hold] = useState<Hold>(() => ({ live: makeLiveEvent(eventId), bulk: createBulk(), view: createView() }));
  useEffect(() => {
    const close = hold.live.open();
    const stops = [followRevisions(hold.live, hold.bulk, hold.view), followAssets(hold.live, hold.bulk, hold.view), close];
    return () => stops.forEach((stop) => stop());
  }, [hold]);
  return <HoldContext value={hold}>{children}</HoldContext>;
}

export function useHold(): Hold {
  const hold = useContext(HoldContext);
  if (!hold) throw new Error('This component stands outside an EventProvider.');
  return hold;
}

export const useLive = <T,>(select: (state: EventState) => T): T => useStore(useHold().live.store, select);
export const useBulk = <T,>(select: (state: Bulk) => T): T => useStore(useHold().bulk, select);
export const useView = <T,>(select: (state: View) => T): T => useStore(useHold().view, select);

/** The event's clock in ms, moving in steps of `stepMs` of event time; null before the server has said it. */
export function useEventMs(stepMs = 60_000): number | null {
  const clock = useLive((state) => state.clock);
  return useStore(tickStore, ({ localMs }) => (clock ? Math.floor(eventMsAt(clock, Math.max(localMs, clock.heardMs)) / stepMs) * stepMs : null));
}

/** How this reader wants quantities and times of this event written. */
export function useFormats(): Formats {
  const prefs = useStore(prefsStore);
  const timeZone = useLive((state) => state.event?.timeZone ?? 'UTC');
  return useMemo(() => makeFormats(prefs, timeZone), [prefs, timeZone]);
}
