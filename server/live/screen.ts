import type { Identity, ServerToClient } from '../../lib/wire';

/** A message to screens: its name and what it says. */
export type Message = { [K in keyof ServerToClient]: { name: K; payload: Parameters<ServerToClient[K]>[0] } }[keyof ServerToClient];

/** One connection, as a room sees it. */
export interface Screen {
  readonly id: string;
  readonly connected: boolean;
  /** Who it was when last identified. */
  readonly identity: Identity;
  send(message: Message): void;
  /** From now on, and until `exit`, what the room broadcasts reaches this screen. */
  enter(eventId: string): void;
  exit(eventId: string): void;
}
