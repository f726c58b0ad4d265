import { useCallback, useEffect, useMemo, useState } from 'react';
import type { LogEntry } from '../../lib/wire';
import { fetchLog } from '../http/api';
import { sendJson } from '../http/request';
import { useHold, useLive } from '../live/EventContext';
import { words } from '../words';

export interface NewEntry {
  kind: 'decision' | 'handover' | 'note';
  text: string;
  zoneId?: string;
}

/** The log, newest first: what the server holds, and what comes in while the page is open. */
export function useLog(eventId: string): { entries: LogEntry[]; trouble: string | null; add: (entry: NewEntry) => Promise<void> } {
  const { live } = useHold();
  const log = useLive((state) => state.log);
  const linked = useLive((state) => state.link.state === 'live');
  const [trouble, setTrouble] = useState<string | null>(null);
  useEffect(() => {
    if (!linked) return;
    const stop = new AbortController();
    fetchLog(eventId, stop.signal).then(
      (entries) => {
        setTrouble(null);
        for (const entry of entries) live.session.tell({ kind: 'log', entry });
      },
      (error: unknown) => !stop.signal.aborted && setTrouble(error instanceof Error ? error.message : words.common.unreachable),
    );
    return () => stop.abort();
  }, [eventId, live, linked]);
  const add = useCallback(
    async (entry: NewEntry) => {
      const stored = await sendJson<LogEntry>(`/events/${encodeURIComponent(eventId)}/log`, entry, { 'idempotency-key': crypto.randomUUID() });
      live.session.tell({ kind: 'log', entry: stored });
    },
    [eventId, live],
  );
  const entries = useMemo(() => [...log].sort((a, b) => b.sequence - a.sequence), [log]);
  return { entries, trouble, add };
}
