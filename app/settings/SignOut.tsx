'use client';
import { Button } from '../ui/Button';
import { words } from '../words';
import { signOut } from '../sign-in/session';

export function SignOut() {
  const leave = async (): Promise<void> => {
    await signOut();
    window.location.assign('/sign-in');
  };
  return <Button onPress={() => void leave()}>{words.settings.signOut}</Button>;
}
