import { createServer } from 'node:net';
import type { AddressInfo } from 'node:net';
import type { Settings } from './settings';

type Where = Pick<Settings, 'HOST' | 'PORT'>;

/**
 * Sees that the address can be listened on before anything is opened or written, and answers the port: the one asked for, or
 * for port 0 one that is free. Throws one line that says what is in the way and which setting to look at.
 */
export function freePort({ HOST, PORT }: Where): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', (error: NodeJS.ErrnoException) => reject(cannotListen({ HOST, PORT }, error)));
    probe.listen({ host: HOST, port: PORT }, () => {
      const { port } = probe.address() as AddressInfo;
      probe.close(() => resolve(port));
    });
  });
}

/** What a failed listen means to whoever started the server. */
export function cannotListen({ HOST, PORT }: Where, error: NodeJS.ErrnoException): Error {
  const where = `${HOST} port ${PORT}`;
  switch (error.code) {
    case 'EADDRINUSE':
      return new Error(`${where} is taken, perhaps by a Leeboard that is running: stop that, or set LEEBOARD_PORT to another port`, { cause: error });
    case 'EACCES':
      return new Error(`${where} may not be listened on by this user: set LEEBOARD_PORT to 1024 or above`, { cause: error });
    case 'EADDRNOTAVAIL':
    case 'ENOTFOUND':
    case 'EAI_AGAIN':
    case 'EINVAL':
      return new Error(`${HOST} is no address of this machine: set LEEBOARD_HOST to one, such as 127.0.0.1, or 0.0.0.0 for all of them`, { cause: error });
    default:
      return new Error(`${where} cannot be listened on: ${error.message}`, { cause: error });
  }
}
