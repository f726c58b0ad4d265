'use client';
import { useCallback, useEffect, useState } from 'react';
import { ROLES } from '../../lib/wire';
import type { Role } from '../../lib/wire';
import { useFormats } from '../live/EventContext';
import { Button } from '../ui/Button';
import { Choice } from '../ui/Choice';
import { Field } from '../ui/Field';
import { Notice } from '../ui/Notice';
import ui from '../ui/ui.module.css';
import { words } from '../words';
import { fetchKeys, makeKey, makeLink, revokeKey } from './keyCalls';
import type { Key } from './keyCalls';
import styles from './Settings.module.css';

const text = words.settings;

/** Keys and one-time links for others; what is secret is shown once. */
export function Keys() {
  const formats = useFormats();
  const [keys, setKeys] = useState<Key[]>([]);
  const [name, setName] = useState('');
  const [role, setRole] = useState<Role>('viewer');
  const [made, setMade] = useState<{ title: string; secret: string } | null>(null);
  const [trouble, setTrouble] = useState<string | null>(null);
  const say = (error: unknown): void => setTrouble(error instanceof Error ? error.message : words.common.unreachable);
  const load = useCallback((signal: AbortSignal) => fetchKeys(signal).then(setKeys, (error: unknown) => !signal.aborted && say(error)), []);
  useEffect(() => {
    const stop = new AbortController();
    void load(stop.signal);
    return () => stop.abort();
  }, [load]);
  const act = async (run: () => Promise<{ title: string; secret: string } | null>): Promise<void> => {
    setTrouble(null);
    try {
      setMade(await run());
      await load(new AbortController().signal);
    } catch (error) {
      say(error);
    }
  };
  const given = name.trim();
  return (
    <section className={`${ui.stack} ${styles.section}`}>
      <h2>{text.people}</h2>
      <p className="dim">{text.peopleHint}</p>
      <div className={ui.row}>
        <Field label={text.keyName} value={name} onChange={setName} name="keyName" />
        <Choice label={text.role} value={role} onChange={setRole} options={ROLES.map((value) => ({ value, text: text.roles[value] }))} />
      </div>
      <div className={ui.dropActions}>
        <Button isDisabled={given === ''} onPress={() => void act(async () => ({ title: text.madeKey(given), secret: (await makeKey(given, role)).key }))}>
          {text.makeKey}
        </Button>
        <Button isDisabled={given === ''} onPress={() => void act(async () => ({ title: text.madeLink, secret: (await makeLink(given, role)).url }))}>
          {text.makeLink}
        </Button>
      </div>
      {made && (
        <Notice tone="plain" title={made.title}>
          <p className={ui.secret}>{made.secret}</p>
        </Notice>
      )}
      {trouble && <Notice tone="error" title={trouble} />}
      {keys.length > 0 && (
        <table className={ui.table}>
          <caption>{text.keys}</caption>
          <thead>
            <tr>
              <th scope="col">{text.keyName}</th>
              <th scope="col">{text.role}</th>
              <th scope="col">{text.created}</th>
              <th scope="col">{text.lastUsed}</th>
              <th scope="col">
                <span className="unseen">{text.revoke}</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {keys.map((key) => (
              <tr key={key.id}>
                <th scope="row">
                  {key.name} <span className="dim">{key.start ?? ''}</span>
                </th>
                <td>{key.role}</td>
                <td>{formats.date(key.createdAt)}</td>
                <td>{key.lastUsedAt ? formats.date(key.lastUsedAt) : text.never}</td>
                <td className="number">
                  <Button aria-label={`${text.revoke}: ${key.name}`} onPress={() => void act(async () => (await revokeKey(key.id), null))}>
                    {text.revoke}
                  </Button>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </section>
  );
}
