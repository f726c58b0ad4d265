import { promisify } from 'node:util';
import { gunzip } from 'node:zlib';
import * as z from 'zod';
import type { assetReader } from '../assetsOf';
import { eventOf, nowOf } from '../eventOf';
import { assetsCsv, swathGeoJson, zonesCsv } from '../exports/files';
import { fileStem } from '../exports/heading';
import type { Exported } from '../exports/heading';
import { asAttachment } from '../fileHeaders';
import type { Api, HttpServices } from '../httpServices';
import { impactOf } from '../impactOf';
import { Refusal } from '../problems';
import { fileAnswer, revision } from '../schemas';

const unpack = promisify(gunzip);
const MADE = ['zones.csv', 'assets.csv', 'swath.geojson'] as const;
const isMade = (name: string): name is (typeof MADE)[number] => (MADE as readonly string[]).includes(name);

export function exportRoutes(app: Api, services: HttpServices, assetsOf: ReturnType<typeof assetReader>): void {
  const { store, version } = services;

  app.get(
    '/events/:id/exports/:name',
    {
      config: { access: 'viewer' },
      schema: {
        summary: `A file to take away: ${MADE.join(', ')}`,
        params: z.object({ id: z.string(), name: z.string() }),
        querystring: z.strictObject({ revision }),
        response: fileAnswer('The file, with the caution, the advisory and the revision at its head', 'text/csv', 'application/geo+json'),
      },
    },
    async ({ params: { id, name }, query }, reply) => {
      if (!isMade(name)) throw new Refusal('not-found', `There is no export ${name} in this release; there are ${MADE.join(', ')}.`);
      const event = await eventOf(services, id);
      const impact = await impactOf(services, event, query.revision);
      const advisory = await store.advisories.get(event.id, impact.advisoryId);
      if (!advisory) throw new Error(`Revision ${impact.revision} stands on advisory ${impact.advisoryId}, which is not stored.`);
      const exported: Exported = { event, impact, advisory, now: nowOf(services, event), version };
      const [what, ending] = name.split('.');
      void reply.headers({ 'content-disposition': asAttachment(`${fileStem(exported, what)}.${ending}`), 'cache-control': 'no-store', 'content-type': ending === 'csv' ? 'text/csv; charset=utf-8' : 'application/geo+json' });
      switch (name) {
        case 'zones.csv':
          return reply.send(zonesCsv(exported));
        case 'assets.csv':
          return reply.send(assetsCsv(exported, await assetsOf(event.id, impact.revision)));
        case 'swath.geojson': {
          const peak = await store.impacts.bulk(event.id, impact.revision, 'peak');
          if (!peak) throw new Refusal('not-computed', `Revision ${impact.revision} has no swath.`);
          return reply.send(swathGeoJson(exported, await unpack(peak)));
        }
      }
    },
  );
}
