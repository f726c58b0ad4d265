import type { Logger } from 'pino';
import type { z } from 'zod';
import { atLeast, joinSchema, leaveSchema, seenSchema } from '../../lib/wire';
import type { ClientToServer, Identity, JoinAck, PlainAck, Role } from '../../lib/wire';
import { MOST_WAITING } from './limits';

/** Every message a screen may send: its shape, and the least role that may send it. */
const MESSAGES = {
  join: { schema: joinSchema, role: 'viewer' },
  leave: { schema: leaveSchema, role: 'viewer' },
  seen: { schema: seenSchema, role: 'viewer' },
} as const satisfies Record<keyof ClientToServer, { schema: z.ZodType; role: Role }>;

type Name = keyof typeof MESSAGES;
type Body<K extends Name> = z.infer<(typeof MESSAGES)[K]['schema']>;
type Ack = JoinAck | PlainAck;
type Reply = (ack: Ack) => void;

/** What is done for each message. `reply` is called once; a handler may go on after it. */
export type Handlers = { [K in Name]: (message: Body<K>, reply: Reply) => Promise<void> | void };

type Failure = Extract<Ack, { ok: false }>;
const failure = (code: Failure['code'], message: string): Failure => ({ ok: false, code, message });

/** Reads the messages of one screen: one at a time, in order, each checked, each answered once (rules 5 and 6). */
export function receiver(identity: () => Identity, handlers: Handlers, logger: Logger): (name: string, ...args: unknown[]) => void {
  let turn: Promise<void> = Promise.resolve();
  let waiting = 0;

  return (name, ...args) => {
    const reply = replyOnce(name, args.at(-1), logger);
    if (waiting >= MOST_WAITING) return reply(failure('failed', `More than ${MOST_WAITING} messages wait for an answer; send fewer at once.`));
    waiting++;
    turn = turn.then(async () => {
      try {
        await receive(name, args[0], identity().role, handlers, reply);
      } catch (err) {
        logger.error({ err, name }, 'message failed');
        reply(failure('failed', 'The server could not answer; the reason is in its log. Try again.'));
      } finally {
        waiting--;
      }
    });
  };
}

async function receive(name: string, body: unknown, role: Role, handlers: Handlers, reply: Reply): Promise<void> {
  if (!Object.hasOwn(MESSAGES, name)) return reply(failure('bad-message', `There is no message "${name.slice(0, 40)}"; expected ${Object.keys(MESSAGES).join(', ')}.`));
  const kind = name as Name;
  if (!atLeast(role, MESSAGES[kind].role)) return reply(failure('forbidden', `"${kind}" needs the role ${MESSAGES[kind].role}; you are ${role}.`));
  const parsed = MESSAGES[kind].schema.safeParse(body);
  if (!parsed.success) {
    const [issue] = parsed.error.issues;
    return reply(failure('bad-message', `${kind}: ${issue.path.join('.') || 'the message'}: ${issue.message}`));
  }
  // The table ties each name to its schema; TypeScript does not follow that through a union of names.
  await (handlers[kind] as (message: unknown, reply: Reply) => Promise<void> | void)(parsed.data, reply);
}

function replyOnce(name: string, last: unknown, logger: Logger): Reply {
  let answered = false;
  return (ack) => {
    if (answered) return;
    answered = true;
    if (typeof last === 'function') (last as Reply)(ack);
    else if (!ack.ok) logger.warn({ name: name.slice(0, 40), ...ack }, 'message without acknowledgement refused');
  };
}
