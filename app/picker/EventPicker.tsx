'use client';
import Link from 'next/link';
import { useRouter, useSearchParams } from 'next/navigation';
import { Suspense, useEffect, useState } from 'react';
import type { Event } from '../../lib/wire';
import { formatClock, formatDate } from '../../lib/units';
import { fetchEvents } from '../http/api';
import { tabPath } from '../shell/tabs';
import { Notice } from '../ui/Notice';
import ui from '../ui/ui.module.css';
import { words } from '../words';
import styles from '../sign-in/SignIn.module.css';

const text = words.picker;

/** The events there are; a single one is opened at once on the first visit. */
export function EventPicker() {
  return (
    <Suspense>
      <Events />
    </Suspense>
  );
}

function Events() {
  const [events, setEvents] = useState<Event[] | null>(null);
  const [trouble, setTrouble] = useState<string | null>(null);
  const router = useRouter();
  const list = useSearchParams().has('list');
  useEffect(() => {
    const stop = new AbortController();
    fetchEvents(stop.signal).then(
      (found) => {
        if (found.length === 1 && !list) router.replace(tabPath(found[0].id, 'board'));
        else setEvents(found);
      },
      (error: unknown) => !stop.signal.aborted && setTrouble(error instanceof Error ? error.message : words.common.unreachable),
    );
    return () => stop.abort();
  }, [router, list]);
  if (trouble) return <Notice tone="error" title={trouble} />;
  if (!events) return <p className={styles.page}>{words.common.loading}</p>;
  return (
    <main className={styles.page}>
      <p className={styles.product}>{words.product}</p>
      <h1>{text.title}</h1>
      {events.length === 0 ? (
        <p className="dim">{text.none}</p>
      ) : (
        <table className={ui.table}>
          <thead>
            <tr>
              <th scope="col">{text.name}</th>
              <th scope="col">{text.kind}</th>
              <th scope="col" className="number">{text.revision}</th>
              <th scope="col">{text.clock}</th>
            </tr>
          </thead>
          <tbody>
            {events.map((event) => (
              <tr key={event.id}>
                <th scope="row">
                  <Link href={tabPath(event.id, 'board')}>
                    <strong>{event.name}</strong>
                  </Link>
                </th>
                <td>{event.exercise ? words.exercise : text.real}</td>
                <td className="number">{event.revision}</td>
                <td>
                  {formatClock(Date.parse(event.now), event.timeZone)} {formatDate(Date.parse(event.now), event.timeZone)}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      <p className={styles.caution}>{words.caution}</p>
    </main>
  );
}
