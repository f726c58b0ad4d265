import { collectDefaultMetrics, Counter, Gauge, Histogram, Registry } from 'prom-client';
import type { Api, HttpServices } from './httpServices';

/**
 * Figures for Prometheus, of this process and of what it did. They are read with a viewer's key: an open port on loopback would
 * be open to the world behind a proxy on the same machine, and a scraper needs no more rights than to read.
 */
export function serveMetrics(app: Api, { bus, runs, logger }: HttpServices): void {
  const registry = new Registry();
  collectDefaultMetrics({ register: registry, prefix: 'leeboard_' });
  const registers = [registry];
  const requests = new Histogram({ registers, name: 'leeboard_http_request_seconds', help: 'Time to answer a request', labelNames: ['method', 'route', 'status'] as const, buckets: [0.005, 0.025, 0.1, 0.5, 2, 10] });
  const advisories = new Counter({ registers, name: 'leeboard_advisories_total', help: 'Advisories accepted since the start' });
  const revisions = new Counter({ registers, name: 'leeboard_revisions_total', help: 'Impacts published since the start', labelNames: ['stage'] as const });
  const failures = new Counter({ registers, name: 'leeboard_runs_failed_total', help: 'Runs that ended in an error since the start' });
  new Gauge({ registers, name: 'leeboard_runs_waiting', help: 'Runs waiting or under way', collect() { this.set(runs.waiting); } });

  const stops = [bus.on('advisory', () => advisories.inc()), bus.on('impact', ({ stage }) => revisions.inc({ stage })), bus.on('failed', () => failures.inc())];
  app.addHook('onResponse', async (request, reply) => {
    requests.observe({ method: request.method, route: request.routeOptions.url ?? 'page', status: reply.statusCode }, reply.elapsedTime / 1000);
  });
  app.addHook('onClose', async () => {
    stops.forEach((stop) => stop());
    registry.clear();
    logger.debug('metrics stopped');
  });

  app.get('/metrics', { config: { access: 'viewer' }, schema: { summary: 'Figures for Prometheus', hide: true } }, async (_request, reply) => reply.header('content-type', registry.contentType).send(await registry.metrics()));
}
