import type { FastifyBaseLogger, FastifyInstance, RawReplyDefaultExpression, RawRequestDefaultExpression, RawServerDefault } from 'fastify';
import type { ZodTypeProvider } from 'fastify-type-provider-zod';
import type { LeeboardAuth } from '../auth';
import type { Accepted } from '../feeds';
import type { Services } from '../services';
import type { EventRecord } from '../store';

/** The exercise that ships with the program. */
export interface Demo {
  /** Issues the next advisory through `acceptAdvisory`; null when none is left. */
  next(event: EventRecord, by: string): Promise<Accepted | null>;
}

/** What the routes need besides the services of the process. */
export interface HttpServices extends Services<LeeboardAuth> {
  demo?: Demo;
  /** Of the program, for `/health` and the API's description. */
  version: string;
}

/** The server as routes see it: what their schemas say is what their handlers get. */
export type Api = FastifyInstance<RawServerDefault, RawRequestDefaultExpression, RawReplyDefaultExpression, FastifyBaseLogger, ZodTypeProvider>;
