import type { Metadata } from 'next';
import { Suspense } from 'react';
import { words } from '../words';
import { SignIn } from './SignIn';

export const metadata: Metadata = { title: `${words.signIn.title}, ${words.product}` };

export default function SignInPage() {
  return (
    <Suspense>
      <SignIn />
    </Suspense>
  );
}
