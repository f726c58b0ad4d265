'use client';
import { useRouter } from 'next/navigation';
import { createContext, useContext, useEffect, useState } from 'react';
import type { ReactNode } from 'react';
import { atLeast } from '../../lib/wire';
import type { Identity, Role } from '../../lib/wire';
import { fetchMe } from '../http/api';
import { RequestFailed } from '../http/problem';
import { Notice } from '../ui/Notice';
import { Button } from '../ui/Button';
import { words } from '../words';

const IdentityContext = createContext<Identity | null>(null);

/** Shows its children to whoever has signed in; sends others to the sign-in page. */
export function Identified({ children }: { children: ReactNode }) {
  const [identity, setIdentity] = useState<Identity | null>(null);
  const [trouble, setTrouble] = useState<string | null>(null);
  const [attempt, setAttempt] = useState(0);
  const router = useRouter();
  useEffect(() => {
    const stop = new AbortController();
    fetchMe(stop.signal).then(setIdentity, (error: unknown) => {
      if (stop.signal.aborted) return;
      if (error instanceof RequestFailed && error.status === 401) router.replace(`/sign-in?next=${encodeURIComponent(window.location.pathname)}`);
      else setTrouble(error instanceof Error ? error.message : words.common.unreachable);
    });
    return () => stop.abort();
  }, [attempt, router]);
  if (identity) return <IdentityContext value={identity}>{children}</IdentityContext>;
  if (!trouble) return null;
  return (
    <Notice tone="error" title={words.common.unreachable}>
      <p>{trouble}</p>
      <Button
        onPress={() => {
          setTrouble(null);
          setAttempt(attempt + 1);
        }}
      >
        {words.common.again}
      </Button>
    </Notice>
  );
}

export function useIdentity(): Identity {
  const identity = useContext(IdentityContext);
  if (!identity) throw new Error('This component stands outside Identified.');
  return identity;
}

/** Whether the person may do what needs a role. */
export const useMay = (role: Role): boolean => atLeast(useIdentity().role, role);
