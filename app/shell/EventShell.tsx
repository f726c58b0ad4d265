'use client';
import { useSelectedLayoutSegment } from 'next/navigation';
import type { ReactNode } from 'react';
import { EventProvider, useLive } from '../live/EventContext';
import { MapPane } from '../map/MapPane';
import { words } from '../words';
import { Announcer } from './Announcer';
import styles from './EventShell.module.css';
import { Footer } from './Footer';
import { Header } from './Header';
import { Identified } from './Identified';
import { isTab } from './tabs';

/** Everything around the pages of an event. The map lives here, so that changing the page never makes it anew. */
export function EventShell({ eventId, children }: { eventId: string; children: ReactNode }) {
  return (
    <Identified>
      <EventProvider key={eventId} eventId={eventId}>
        <Frame eventId={eventId}>{children}</Frame>
      </EventProvider>
    </Identified>
  );
}

function Frame({ eventId, children }: { eventId: string; children: ReactNode }) {
  const segment = useSelectedLayoutSegment() ?? 'board';
  const tab = isTab(segment) ? segment : 'board';
  const exercise = useLive((state) => state.event?.exercise ?? false);
  return (
    <div className={styles.frame} data-tab={tab} data-exercise={exercise}>
      {tab === 'board' && (
        <a className={styles.skip} href="#zones">
          {words.common.skip}
        </a>
      )}
      {exercise && <div className={styles.band} role="img" aria-label={words.exerciseBand} />}
      <Header eventId={eventId} tab={tab} />
      <main className={styles.stage}>
        {children}
        <MapPane hidden={tab === 'log' || tab === 'settings'} />
      </main>
      <Footer tab={tab} />
      <Announcer />
    </div>
  );
}
