'use client';
import { Button } from './ui/Button';
import styles from './sign-in/SignIn.module.css';
import { words } from './words';

export default function PageFailed({ error, reset }: { error: Error; reset: () => void }) {
  return (
    <main className={styles.page} role="alert">
      <h1>{words.common.crashed}</h1>
      <p className="dim">{error.message}</p>
      <Button onPress={reset}>{words.common.again}</Button>
    </main>
  );
}
