import { isIP } from 'node:net';
import type { IncomingHttpHeaders } from 'node:http';
import type { Settings } from '../settings';
import type { Api } from './httpServices';
import { Refusal } from './problems';

const READS = new Set(['GET', 'HEAD', 'OPTIONS']);
const LOOPBACK_NAMES = ['127.0.0.1', 'localhost', '[::1]'];

const isLoopback = (host: string): boolean => host === 'localhost' || host === '::1' || (isIP(host) === 4 && host.startsWith('127.'));

/** The name in a `Host` header, lower case, without its port. */
const nameOf = (host: string): string => host.toLowerCase().replace(/:\d+$/, '');

/**
 * A server that listens on loopback answers under loopback names alone: a page whose name is made to point here (DNS rebinding)
 * is turned away. The port does not matter: it may be forwarded. On other addresses any name is taken, since only the network
 * knows which names lead here; keys and cookies are what protects it.
 */
export function answersTo({ HOST }: Pick<Settings, 'HOST'>, host: string | undefined): boolean {
  if (host === undefined || !/^[\w.:[\]-]+$/.test(host)) return false;
  return !isLoopback(HOST) || [...LOOPBACK_NAMES, HOST.toLowerCase()].includes(nameOf(host));
}

/**
 * Whether a call comes from a page of this server, or from no page at all (RFC 6454 `Origin`, W3C Fetch Metadata
 * `Sec-Fetch-Site`). What only reads may also be opened by a link from elsewhere.
 */
export function comesFromHere(method: string, headers: IncomingHttpHeaders): boolean {
  const { origin, host } = headers;
  if (origin !== undefined && !(URL.canParse(origin) && new URL(origin).host === host)) return false;
  const site = headers['sec-fetch-site'];
  if (site === undefined || site === 'same-origin' || site === 'none') return true;
  return READS.has(method) && headers['sec-fetch-mode'] === 'navigate' && headers['sec-fetch-dest'] === 'document';
}

/** Closes the server to pages of other sites: no forged calls, no reading through a visitor's browser. */
export function keepToOwnSite(app: Api, settings: Pick<Settings, 'HOST'>): void {
  app.addHook('onRequest', async (request) => {
    const { host } = request.headers;
    if (!answersTo(settings, host)) throw new Refusal('unknown-host', `This server listens on this machine alone, as ${[...new Set([...LOOPBACK_NAMES, settings.HOST])].join(', ')}; it was asked for as ${JSON.stringify(host ?? '')}.`);
    if (request.is404 && READS.has(request.method)) return;
    if (!comesFromHere(request.method, request.headers)) throw new Refusal('foreign-origin', 'Pages of other sites may not call this server. Programs that are no browser send no Origin.');
  });
}
