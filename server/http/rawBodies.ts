import type { FastifyRequest } from 'fastify';
import type { Source } from '../store';
import type { Api } from './httpServices';
import { Refusal } from './problems';

/** In the routes of this scope, bodies of these types are kept byte for byte as they were received. */
export function keepBodiesRaw(app: Api, contentTypes: readonly string[]): void {
  app.removeAllContentTypeParsers();
  app.addContentTypeParser([...contentTypes], { parseAs: 'buffer' }, (request, body, done) => {
    const encoding = request.headers['content-encoding'];
    if (encoding !== undefined && encoding !== 'identity') done(new Refusal('wrong-type', `The body is packed (${encoding}); send it as it is. Nothing was stored.`));
    else done(null, body);
  });
}

/** The body as a file. Its name comes percent-encoded in `X-File-Name`, where the sender gives one. */
export function sourceOf(request: FastifyRequest): Source {
  if (!Buffer.isBuffer(request.body) || request.body.length === 0) throw new Refusal('invalid', 'The file is empty: nothing to read. Nothing was stored.', [{ message: 'the file is empty: nothing to read' }]);
  return { bytes: request.body, contentType: request.headers['content-type'] ?? 'application/octet-stream', fileName: fileNameOf(request.headers['x-file-name']) };
}

const MOST_NAME_LETTERS = 200;

function fileNameOf(header: string | string[] | undefined): string | null {
  const given = [header].flat()[0];
  if (!given) return null;
  return [...decoded(given).replace(/\p{Cc}/gu, '')].slice(0, MOST_NAME_LETTERS).join('') || null;
}

function decoded(text: string): string {
  try {
    return decodeURIComponent(text);
  } catch {
    return text;
  }
}

const MOST_KEY_LETTERS = 200;

/** The `Idempotency-Key` of a call, or null. */
export function idempotencyKeyOf(request: FastifyRequest): string | null {
  const key = [request.headers['idempotency-key']].flat()[0];
  if (key === undefined || key === '') return null;
  if (key.length > MOST_KEY_LETTERS) throw new Refusal('bad-request', `The Idempotency-Key has ${key.length} letters; at most ${MOST_KEY_LETTERS} are kept.`);
  return key;
}
