import { createHash } from 'node:crypto';
import { mkdir, readdir, readFile, rename, stat, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { InputError } from '../../lib/advisory';
import { MOST_ADVISORY_BYTES } from '../../lib/wire';
import type { Services } from '../services';
import type { EventRecord } from '../store';
import type { Timers } from '../timers';
import { acceptAdvisory } from './acceptAdvisory';

const LOOK_EVERY_MS = 2_000;
const MOST_EVENTS = 1_000;
/** Who the advisory was received by, as history shows it. */
const RECEIVED_BY = 'watched folder';

export interface InboxOptions {
  services: Pick<Services, 'store' | 'bus' | 'runs' | 'clock' | 'logger'>;
  /** Holds a folder for each event, named by its id; each is made here. */
  folder: string;
  timers: Timers;
}

export interface Inbox {
  /** Looks now; answers when everything found has been dealt with. A look under way is not begun twice. */
  look(): Promise<void>;
  /** Looks no more; answers when a look under way is over. */
  close(): Promise<void>;
}

/**
 * Takes in the forecasts that are put into a folder: `<folder>/<eventId>/file` is accepted as if it had been posted, then moved
 * to `done/`, or to `refused/` with a text beside it that says why. A file is taken once it has kept its size and time from one
 * look to the next, so one that is still being written waits. Names that begin with a dot are left alone. Looking at intervals,
 * rather than asking the system for notices, works on network folders too and misses nothing.
 */
export function openInbox({ services, folder, timers }: InboxOptions): Inbox {
  const { store, logger } = services;
  /** Size and time of each file at the look before. */
  let before = new Map<string, string>();
  const complained = new Set<string>();
  let looking: Promise<void> | null = null;

  async function lookOnce(): Promise<void> {
    const { items } = await store.events.list({ offset: 0, limit: MOST_EVENTS });
    const events = new Map(items.map((event) => [event.id, event]));
    for (const id of events.keys()) await mkdir(join(folder, id), { recursive: true });
    const now = new Map<string, string>();
    for (const entry of await readdir(folder, { withFileTypes: true })) {
      if (!entry.isDirectory() || entry.name.startsWith('.')) continue;
      const event = events.get(entry.name);
      if (event) await lookInto(event, now);
      else complain(entry.name, { folder: join(folder, entry.name) }, 'a watched folder is named for no event; its files stay as they are');
    }
    before = now;
  }

  async function lookInto(event: EventRecord, now: Map<string, string>): Promise<void> {
    const files = [];
    for (const entry of await readdir(join(folder, event.id), { withFileTypes: true })) {
      if (!entry.isFile() || entry.name.startsWith('.')) continue;
      const { size, mtimeMs } = await stat(join(folder, event.id, entry.name));
      files.push({ name: entry.name, size, mtimeMs });
    }
    // Forecasts that were put in together are issued in the order they were written.
    files.sort((a, b) => a.mtimeMs - b.mtimeMs || a.name.localeCompare(b.name, 'en', { numeric: true }));
    for (const { name, size, mtimeMs } of files) {
      const path = join(folder, event.id, name);
      const state = `${size} ${mtimeMs}`;
      now.set(path, state);
      if (before.get(path) !== state) continue;
      try {
        await take(event, name, size);
        complained.delete(path);
      } catch (err) {
        complain(path, { err, path }, 'a file in a watched folder could not be taken in; it stays there and is tried again');
      }
    }
  }

  /** Moving comes last: a file that is met again, after a crash in between, is known by its content. */
  async function take(event: EventRecord, name: string, size: number): Promise<void> {
    const path = join(folder, event.id, name);
    if (size > MOST_ADVISORY_BYTES) {
      return refuse(event.id, name, [{ message: `the file has ${size} bytes; an advisory has ${MOST_ADVISORY_BYTES} at most` }]);
    }
    const bytes = await readFile(path);
    const accepted = await acceptAdvisory(services, {
      event,
      source: { bytes, contentType: 'text/plain', fileName: name },
      by: RECEIVED_BY,
      idempotencyKey: `watched folder ${createHash('sha256').update(bytes).digest('hex')}`,
    });
    if (!accepted.ok) return refuse(event.id, name, accepted.errors);
    await moveTo(event.id, 'done', name);
    logger.info({ eventId: event.id, file: name, advisory: accepted.advisory.number, repeated: accepted.repeated }, 'advisory taken from the watched folder');
  }

  async function refuse(eventId: string, name: string, errors: InputError[]): Promise<void> {
    const moved = await moveTo(eventId, 'refused', name);
    await writeFile(`${moved}.txt`, `${name} was not issued; nothing was stored.\n${errors.map(line).join('\n')}\n`);
    logger.warn({ eventId, file: name, why: errors[0]?.message }, 'a file in a watched folder was refused');
  }

  /** Answers where the file is now. A name that is taken gets a number. */
  async function moveTo(eventId: string, kind: 'done' | 'refused', name: string): Promise<string> {
    const target = join(folder, eventId, kind);
    await mkdir(target, { recursive: true });
    const taken = new Set(await readdir(target));
    let free = name;
    for (let n = 2; taken.has(free) || taken.has(`${free}.txt`); n++) free = `${n}-${name}`;
    await rename(join(folder, eventId, name), join(target, free));
    return join(target, free);
  }

  function complain(about: string, what: Record<string, unknown>, message: string): void {
    if (complained.has(about)) return;
    complained.add(about);
    logger.warn(what, message);
  }

  function look(): Promise<void> {
    looking ??= lookOnce()
      .catch((err: unknown) => complain(folder, { err, folder }, 'the watched folder could not be looked at'))
      .finally(() => {
        looking = null;
      });
    return looking;
  }

  void look();
  const stop = timers.every(LOOK_EVERY_MS, () => void look());
  return {
    look,
    async close() {
      stop();
      await looking;
    },
  };
}

function line({ path, line: at, column, message }: InputError): string {
  const where = [at !== undefined && `line ${at}`, column !== undefined && `column ${column}`, path].filter(Boolean).join(', ');
  return where ? `${where}: ${message}` : message;
}
