import type { IncomingMessage } from 'node:http';
import type { FastifyHelmetOptions } from '@fastify/helmet';

/** WebSockets to this same server; older browsers do not count them as `'self'`. */
const ownSocket = (scheme: 'ws' | 'wss') => (request: IncomingMessage): string => `${scheme}://${request.headers.host}`;

/**
 * Headers that keep pages to themselves. Pages are rendered ahead with inline scripts of their own, so those must be allowed; what
 * comes from files is shown through React alone, which escapes it. Nothing is loaded from elsewhere. `development` adds what
 * reload needs.
 */
export const headersFor = (development: boolean): FastifyHelmetOptions => ({
  contentSecurityPolicy: {
    useDefaults: false,
    directives: {
      'default-src': ["'self'"],
      'script-src': ["'self'", "'unsafe-inline'", ...(development ? ["'unsafe-eval'"] : [])],
      'script-src-attr': ["'none'"],
      'style-src': ["'self'", "'unsafe-inline'"],
      'img-src': ["'self'", 'data:', 'blob:'],
      'font-src': ["'self'", 'data:'],
      'worker-src': ["'self'", 'blob:'],
      'connect-src': ["'self'", ownSocket('ws') as never, ownSocket('wss') as never],
      'object-src': ["'none'"],
      'base-uri': ["'none'"],
      'form-action': ["'self'"],
      'frame-ancestors': ["'none'"],
    },
  },
  // Encryption, where there is any, is set up in front of this server.
  strictTransportSecurity: false,
  referrerPolicy: { policy: 'no-referrer' },
  frameguard: { action: 'deny' },
});
