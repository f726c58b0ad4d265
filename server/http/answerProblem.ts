import type { FastifyError, FastifyReply, FastifyRequest } from 'fastify';
import { hasZodFastifySchemaValidationErrors } from 'fastify-type-provider-zod';
import { problemDocument, Refusal } from './problems';
import type { RefusalCode } from './problems';

const megabytes = (bytes: number): string => `${Math.round(bytes / 1024 / 1024)} MB`;

/** The one mapper from anything thrown to a problem document. What is not known is logged whole and told in one sentence. */
export function answerProblem(error: FastifyError | Refusal | Error, request: FastifyRequest, reply: FastifyReply): FastifyReply {
  const refusal = refusalOf(error, request);
  if (refusal.code === 'fault') request.log.error({ err: error, request: request.id, method: request.method, url: request.routeOptions.url }, 'request failed');
  // Hanging up on a client that is still sending loses it the answer: what it sends is read and dropped instead.
  if (refusal.code === 'too-large') void reply.removeHeader('connection');
  if (refusal.code === 'unauthorized') void reply.header('www-authenticate', 'Bearer');
  const problem = problemDocument(refusal, request.id);
  return reply.code(problem.status).header('cache-control', 'no-store').type('application/problem+json').send(problem);
}

function refusalOf(error: FastifyError | Refusal | Error, request: FastifyRequest): Refusal {
  if (error instanceof Refusal) return error;
  if (hasZodFastifySchemaValidationErrors(error)) {
    const part = { body: 'body', querystring: 'query', params: 'path', headers: 'headers' }[(error as FastifyError).validationContext ?? 'body'] ?? 'request';
    const errors = error.validation.map(({ instancePath, message }) => ({ path: instancePath.slice(1).replaceAll('/', '.'), message: message ?? 'not as expected' }));
    return new Refusal(part === 'body' ? 'invalid' : 'bad-request', `The ${part} is not as expected: ${errors.map((one) => (one.path ? `${one.path}: ${one.message}` : one.message)).join('; ')}.`, errors);
  }
  return new Refusal(...toldByServer(error as FastifyError, request));
}

/** Refusals of the HTTP library itself. */
function toldByServer({ code, statusCode = 500, message }: FastifyError, request: FastifyRequest): [RefusalCode, string] {
  const { accepts } = request.routeOptions.config;
  switch (code) {
    case 'FST_ERR_CTP_BODY_TOO_LARGE':
      return ['too-large', `At most ${megabytes(request.routeOptions.bodyLimit)} are taken here; nothing was stored.`];
    case 'FST_ERR_CTP_INVALID_MEDIA_TYPE':
      return ['wrong-type', `The content type is ${JSON.stringify(request.headers['content-type'] ?? '')}; here it may be ${(accepts ?? ['application/json']).join(', ')}. Nothing was stored.`];
    case 'FST_ERR_CTP_EMPTY_JSON_BODY':
      return ['bad-request', 'The body is empty; JSON is expected.'];
    case 'FST_ERR_CTP_INVALID_JSON_BODY':
      return ['bad-request', `The body is not JSON: ${message}.`];
    case 'FST_ERR_NOT_FOUND':
      return ['not-found', `There is no ${request.method} ${request.url.split('?')[0]} here.`];
  }
  if (statusCode >= 400 && statusCode < 500) return ['bad-request', message];
  return ['fault', 'The reason is in the server log, under the number of this answer. Nothing was changed by halves; try again.'];
}
