'use client';
import Link from 'next/link';
import { useEffect } from 'react';
import { useEventMs, useFormats, useLive } from '../live/EventContext';
import { words } from '../words';
import { DemoNext } from './DemoNext';
import { EventClock } from './EventClock';
import { ForecastAge } from './ForecastAge';
import styles from './Header.module.css';
import { LinkState } from './LinkState';
import { tabPath, TABS } from './tabs';
import type { Tab } from './tabs';

export function Header({ eventId, tab }: { eventId: string; tab: Tab }) {
  const event = useLive((state) => state.event);
  const shown = useLive((state) => (state.impact && state.advisories[state.impact.advisoryId]) ?? state.advisory);
  const formats = useFormats();
  const nowMs = useEventMs();
  const name = shown?.storm.name ?? event?.name;
  useEffect(() => {
    document.title = name ? words.pageTitle(name, words.tabs[tab]) : words.product;
  }, [name, tab]);
  return (
    <header className={styles.header}>
      <div className={styles.storm}>
        <h1 title={event?.name}>
          <Link href="/?list" className={styles.home} aria-label={`${name ?? ''}, ${words.common.home}`}>
            {name ?? '\u00a0'}
          </Link>
        </h1>
        {event?.exercise && <span className={styles.exercise}>{words.exercise}</span>}
      </div>
      <ForecastAge advisory={shown} nowMs={nowMs} formats={formats} />
      <DemoNext eventId={eventId} />
      <nav className={styles.tabs} aria-label={words.tabsLabel}>
        {TABS.map((name) => (
          <Link key={name} href={tabPath(eventId, name)} aria-current={name === tab ? 'page' : undefined} prefetch={false}>
            {words.tabs[name]}
          </Link>
        ))}
      </nav>
      <LinkState />
      <EventClock />
    </header>
  );
}
