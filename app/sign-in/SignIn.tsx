'use client';
import { useSearchParams } from 'next/navigation';
import { useEffect, useRef, useState } from 'react';
import { RequestFailed } from '../http/problem';
import { Button } from '../ui/Button';
import { Field } from '../ui/Field';
import ui from '../ui/ui.module.css';
import { words } from '../words';
import { signIn, tokenIn } from './session';
import styles from './SignIn.module.css';

const text = words.signIn;

/** Only paths of this server: never an address from outside. */
const safePath = (next: string | null): string => (next && /^\/(?![/\\])/.test(next) ? next : '/');

/** Takes the one-time link as it was opened, or a link or key typed in. */
export function SignIn() {
  const parameters = useSearchParams();
  const [typed, setTyped] = useState('');
  const [busy, setBusy] = useState(false);
  const [trouble, setTrouble] = useState<string | undefined>(undefined);
  const opened = useRef(false);
  const next = safePath(parameters.get('next'));
  const token = parameters.get('token');

  const go = async (given: { token: string } | { key: string }): Promise<void> => {
    setBusy(true);
    setTrouble(undefined);
    try {
      await signIn(given);
      window.location.replace(next);
    } catch (error) {
      setBusy(false);
      setTrouble(error instanceof RequestFailed && error.status !== 401 && error.status !== 403 ? error.message : text.refused);
    }
  };
  const start = useRef(go);
  useEffect(() => {
    // A link works once: React's double mount in development must not spend it twice.
    if (!token || opened.current) return;
    opened.current = true;
    void start.current({ token });
  }, [token]);

  return (
    <main className={styles.page}>
      <p className={styles.product}>{words.product}</p>
      <h1>{text.title}</h1>
      <p>{text.lead}</p>
      <form
        className={ui.stack}
        onSubmit={(event) => {
          event.preventDefault();
          if (typed.trim() !== '' && !busy) void go(tokenIn(typed));
        }}
      >
        <Field label={text.key} value={typed} onChange={setTyped} type="password" error={trouble} name="key" />
        <Button type="submit" strong isDisabled={busy || typed.trim() === ''}>
          {busy ? text.sending : text.send}
        </Button>
      </form>
      <p className="dim">{text.where}</p>
      <p className={styles.caution}>{words.caution}</p>
    </main>
  );
}
