import { request, sendJson } from '../http/request';

/** The token of a one-time link, or the text itself: a key. */
export function tokenIn(typed: string): { token: string } | { key: string } {
  const text = typed.trim();
  try {
    const token = new URL(text).searchParams.get('token');
    if (token) return { token };
  } catch {
    // No address: a key.
  }
  return { key: text };
}

/** Starts a session cookie from a one-time token or a key. */
export const signIn = (given: { token: string } | { key: string }): Promise<unknown> => sendJson('/sign-in', given);
export const signOut = async (): Promise<void> => void (await request('/sign-out', { method: 'POST' }));
