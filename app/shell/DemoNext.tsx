'use client';
import { useState } from 'react';
import { useHold, useLive } from '../live/EventContext';
import { sendJson } from '../http/request';
import { Button } from '../ui/Button';
import { words } from '../words';
import styles from './Header.module.css';
import { useMay } from './Identified';

/** In the exercise that ships with the program, operators let the next advisory come. */
export function DemoNext({ eventId }: { eventId: string }) {
  const { live } = useHold();
  const left = useLive((state) => (state.event?.demo ? state.event.advisoriesLeft : null));
  const may = useMay('operator');
  const [busy, setBusy] = useState(false);
  const [trouble, setTrouble] = useState<string | null>(null);
  if (left === null || !may) return null;
  const issue = async (): Promise<void> => {
    setBusy(true);
    setTrouble(null);
    try {
      await sendJson(`/events/${encodeURIComponent(eventId)}/demo/next`, {}, { 'idempotency-key': `demo-${live.store.getState().advisory?.id ?? 'first'}` });
    } catch (error) {
      setTrouble(error instanceof Error ? error.message : words.common.unreachable);
    } finally {
      setBusy(false);
    }
  };
  return (
    <div className={styles.demo}>
      <Button isDisabled={busy || left === 0} onPress={() => void issue()}>
        {busy ? words.demo.issuing : words.demo.next}
      </Button>
      <span role={trouble ? 'alert' : undefined}>{trouble ?? words.demo.left(left)}</span>
    </div>
  );
}
