import Link from 'next/link';
import styles from './sign-in/SignIn.module.css';
import { words } from './words';

export default function NotFound() {
  return (
    <main className={styles.page}>
      <h1>{words.common.notFound}</h1>
      <Link href="/">{words.common.home}</Link>
    </main>
  );
}
