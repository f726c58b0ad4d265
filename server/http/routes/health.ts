import * as z from 'zod';
import type { Api, HttpServices } from '../httpServices';

const health = z.object({ status: z.enum(['ok', 'failing']), version: z.string(), store: z.enum(['ok', 'failing']), queue: z.number().int() });

export function healthRoutes(app: Api, { store, runs, version }: HttpServices): void {
  app.get('/health', { config: { access: 'anyone' }, logLevel: 'warn', schema: { summary: 'Whether the server works', response: { 200: health, 503: health } } }, async (request, reply) => {
    const answer = await store.ping().then(
      () => 'ok' as const,
      (err: unknown) => {
        request.log.error({ err }, 'the store does not answer');
        return 'failing' as const;
      },
    );
    return reply.code(answer === 'ok' ? 200 : 503).header('cache-control', 'no-store').send({ status: answer, version, store: answer, queue: runs.waiting });
  });
}
