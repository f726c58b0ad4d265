import type { ReactNode } from 'react';
import styles from './ui.module.css';

/** A message that stands until it no longer holds. Errors interrupt a screen reader, the others wait. */
export function Notice({ tone, title, children }: { tone: 'error' | 'warning' | 'plain'; title: string; children?: ReactNode }) {
  return (
    <section className={styles.notice} data-tone={tone} role={tone === 'error' ? 'alert' : 'status'}>
      <h3>
        {tone === 'error' && <span aria-hidden="true">▲ </span>}
        {title}
      </h3>
      {children}
    </section>
  );
}
