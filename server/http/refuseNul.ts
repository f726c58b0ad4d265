import { holdsNul } from '../holdsNul';
import type { Api } from './httpServices';
import { Refusal } from './problems';

/** After the schemas have bounded what there is. Files are bytes, and are looked at by their readers. */
export function refuseNul(app: Api): void {
  app.addHook('preHandler', async ({ params, query, body }) => {
    if (holdsNul([params, query])) throw new Refusal('bad-request', 'The address holds a NUL character (%00); take it out.');
    if (!Buffer.isBuffer(body) && holdsNul(body)) throw new Refusal('invalid', 'A text holds a NUL character (U+0000); take it out. Nothing was stored.');
  });
}
