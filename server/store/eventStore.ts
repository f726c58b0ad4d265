import type { Store } from './model';
import type { Database } from './openStore';
import { eventOf } from './rows';
import { listed } from './shared';

export const eventStore = ({ db }: Database): Store['events'] => ({
  async add(event) {
    const row = {
      id: event.id,
      name: event.name,
      time_zone: event.timeZone,
      exercise: event.exercise ? 1 : 0,
      demo: event.demo ? 1 : 0,
      clock: event.clock ? JSON.stringify(event.clock) : null,
      created_at: event.createdAt,
      revision: 0,
      advisory_id: null,
    };
    await db.insertInto('events').values(row).execute();
    return eventOf(row);
  },
  async get(id) {
    const row = await db.selectFrom('events').selectAll().where('id', '=', id).executeTakeFirst();
    return row ? eventOf(row) : null;
  },
  async list(page) {
    const { total } = await db.selectFrom('events').select((e) => e.fn.countAll<number | string>().as('total')).executeTakeFirstOrThrow();
    const rows = await db.selectFrom('events').selectAll().orderBy('created_at', 'desc').orderBy('id').offset(page.offset).limit(page.limit).execute();
    return listed(rows.map(eventOf), Number(total), page);
  },
  async setClock(id, clock) {
    await db.updateTable('events').set({ clock: clock ? JSON.stringify(clock) : null }).where('id', '=', id).execute();
  },
});
