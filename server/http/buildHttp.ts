import { randomUUID } from 'node:crypto';
import compress from '@fastify/compress';
import helmet from '@fastify/helmet';
import rateLimit from '@fastify/rate-limit';
import Fastify, { LogController } from 'fastify';
import type { FastifyBaseLogger, FastifyInstance } from 'fastify';
import { serializerCompiler, validatorCompiler } from 'fastify-type-provider-zod';
import type { ZodTypeProvider } from 'fastify-type-provider-zod';
import { guardAccess } from './access';
import { answerGarbled } from './answerGarbled';
import { answerProblem } from './answerProblem';
import { assetReader } from './assetsOf';
import { describeApi } from './describeApi';
import { headersFor } from './headers';
import type { Api, HttpServices } from './httpServices';
import { serveMetrics } from './metrics';
import { keepToOwnSite } from './ownSite';
import { Refusal } from './problems';
import { refuseNul } from './refuseNul';
import { advisoryRoutes } from './routes/advisories';
import { demoRoutes } from './routes/demo';
import { eventRoutes } from './routes/events';
import { exportRoutes } from './routes/exports';
import { healthRoutes } from './routes/health';
import { impactRoutes } from './routes/impact';
import { keyRoutes } from './routes/keys';
import { layerRoutes } from './routes/layers';
import { logRoutes } from './routes/log';
import { peopleRoutes } from './routes/people';
import { sessionRoutes } from './routes/session';

/** A thousand screens behind one address, each fetching a handful at a new revision, stay well below. */
const REQUESTS_A_MINUTE = 12_000;
const SLOWEST_REQUEST_MS = 300_000;
const JSON_BYTES = 1024 * 1024;

/**
 * The HTTP server with everything under `/api` and `/metrics`. It does not listen, and knows no pages: whoever starts it sets
 * the not-found handler that shows them. `development` allows what page reload needs.
 */
export async function buildHttp(services: HttpServices, { development = false } = {}): Promise<FastifyInstance> {
  const { logger, settings } = services;
  const app: Api = Fastify({
    loggerInstance: logger as FastifyBaseLogger,
    // A line for each request would bury the lines that matter; times and counts are in /metrics, failures are logged.
    logController: new LogController({ disableRequestLogging: true }),
    genReqId: () => randomUUID(),
    bodyLimit: JSON_BYTES,
    requestTimeout: SLOWEST_REQUEST_MS,
    clientErrorHandler: answerGarbled,
    frameworkErrors: (error, request, reply) => void answerProblem(error, request, reply),
  }).withTypeProvider<ZodTypeProvider>();
  app.setValidatorCompiler(validatorCompiler);
  app.setSerializerCompiler(serializerCompiler);
  app.setErrorHandler(answerProblem);

  await app.register(helmet, headersFor(development));
  keepToOwnSite(app, settings);
  await app.register(rateLimit, { max: REQUESTS_A_MINUTE, timeWindow: 60_000, errorResponseBuilder: (_request, { after }) => new Refusal('too-many-requests', `Wait ${after} and try again.`) });
  // Files that come in are kept as they are, so none is unpacked on the way.
  await app.register(compress, { encodings: ['gzip', 'identity'], globalDecompression: false });
  guardAccess(app, services);
  refuseNul(app);
  await describeApi(app, services.version);
  serveMetrics(app, services);
  await app.register(
    async (api) => {
      await api.register(async (scope) => apiRoutes(scope.withTypeProvider<ZodTypeProvider>(), services), { prefix: '/v1' });
      api.setNotFoundHandler((request) => {
        throw new Refusal('not-found', `There is no ${request.method} ${request.url.split('?')[0]} in this API; GET /api/v1/openapi.json lists what there is.`);
      });
    },
    { prefix: '/api' },
  );
  return app as unknown as FastifyInstance;
}

async function apiRoutes(api: Api, services: HttpServices): Promise<void> {
  const assetsOf = assetReader(services);
  healthRoutes(api, services);
  sessionRoutes(api, services);
  keyRoutes(api, services);
  peopleRoutes(api, services);
  eventRoutes(api, services);
  logRoutes(api, services);
  impactRoutes(api, services, assetsOf);
  exportRoutes(api, services, assetsOf);
  demoRoutes(api, services);
  await api.register(async (scope) => advisoryRoutes(scope.withTypeProvider<ZodTypeProvider>(), services));
  await api.register(async (scope) => layerRoutes(scope.withTypeProvider<ZodTypeProvider>(), services));
  api.get('/openapi.json', { config: { access: 'anyone' }, schema: { hide: true } }, async (_request, reply) => reply.header('cache-control', 'no-cache').send(api.swagger()));
}
