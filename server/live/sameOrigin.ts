import type { IncomingHttpHeaders } from 'node:http';

/** A page may talk to the server it came from alone. Programs that are no browser send no `Origin`. */
export function sameOrigin({ origin, host }: IncomingHttpHeaders): boolean {
  if (origin === undefined) return true;
  return URL.canParse(origin) && new URL(origin).host === host;
}
