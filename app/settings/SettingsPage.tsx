'use client';
import { useStore } from 'zustand';
import { DISTANCE_UNITS, WIND_UNITS } from '../../lib/units';
import { useLive } from '../live/EventContext';
import { HOUR_CYCLES, prefsStore, THEME_CHOICES } from '../prefs/prefs';
import { useIdentity, useMay } from '../shell/Identified';
import { Choice } from '../ui/Choice';
import page from '../ui/page.module.css';
import ui from '../ui/ui.module.css';
import { words } from '../words';
import { Keys } from './Keys';
import styles from './Settings.module.css';
import { SignOut } from './SignOut';

const text = words.settings;
const asIs = <T extends string>(values: readonly T[]) => values.map((value) => ({ value, text: value }));

/** How this browser writes things, who is signed in, and (for admins) who else may. */
export function SettingsPage() {
  const prefs = useStore(prefsStore);
  const event = useLive((state) => state.event);
  const me = useIdentity();
  const admin = useMay('admin');
  const set = prefsStore.setState;
  return (
    <div className={`${page.page} scroll`}>
      <div className={`${page.narrow} ${ui.stack}`}>
        <h1>{text.title}</h1>
        <section className={`${ui.stack} ${styles.section}`}>
          <h2>{text.mine}</h2>
          <Choice label={text.theme} value={prefs.theme} onChange={(theme) => set({ theme })} options={THEME_CHOICES.map((value) => ({ value, text: text.themes[value] }))} />
          <Choice label={text.wind} value={prefs.wind} onChange={(wind) => set({ wind })} options={asIs(WIND_UNITS)} />
          <Choice label={text.distance} value={prefs.distance} onChange={(distance) => set({ distance })} options={asIs(DISTANCE_UNITS)} />
          <Choice label={text.hours} value={prefs.hours} onChange={(hours) => set({ hours })} options={HOUR_CYCLES.map((value) => ({ value, text: text.hour[value] }))} />
          <p className="dim small">{text.bandsNote}</p>
        </section>
        {event && (
          <section className={`${ui.stack} ${styles.section}`}>
            <h2>{text.event}</h2>
            <p>{event.name}</p>
            <p className="dim">
              {text.timeZone} {event.timeZone}. {event.clock ? text.exerciseClock(event.clock.rate) : text.wallClock}.
            </p>
          </section>
        )}
        <section className={`${ui.stack} ${styles.section}`}>
          <p>{text.signedIn(me.name, me.role)}</p>
          <SignOut />
        </section>
        {admin && <Keys />}
      </div>
    </div>
  );
}
