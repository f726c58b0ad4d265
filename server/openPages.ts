import { Server } from 'node:http';
import type { IncomingMessage, ServerResponse } from 'node:http';
import type { Duplex } from 'node:stream';
import next from 'next';

export interface Pages {
  show(request: IncomingMessage, response: ServerResponse): Promise<void>;
  /** An upgrade that is for pages: reload, in development. Any other is ended. */
  upgrade(request: IncomingMessage, socket: Duplex, head: Buffer): void;
  close(): Promise<void>;
}

/** The pages of `dir`, as built, or built as they are asked for in development. */
export async function openPages({ dir, development }: { dir: string; development: boolean }): Promise<Pages> {
  // Next listens for upgrades of every path on the server it is given. It is given one that hears of those for pages alone.
  const upgrades = new Server();
  const pages = next({ dev: development, dir, httpServer: upgrades });
  await (development ? pages.prepare() : quietly(() => pages.prepare()));
  const show = pages.getRequestHandler();
  return {
    show,
    upgrade(request, socket, head) {
      if (!development || !upgrades.emit('upgrade', request, socket, head)) socket.destroy();
    },
    close: () => pages.close(),
  };
}

/** Next reports how long its configuration took, whatever it is told; the start has one line to say, and it is not that. */
async function quietly(work: () => Promise<void>): Promise<void> {
  const { log } = console;
  console.log = () => undefined;
  try {
    await work();
  } finally {
    console.log = log;
  }
}
