import { promisify } from 'node:util';
import { gunzip } from 'node:zlib';
import type { FastifyReply, FastifyRequest } from 'fastify';

const unpack = promisify(gunzip);

const takesGzip = (header: string | string[] | undefined): boolean => /(^|,)\s*(gzip|\*)\s*(?!;\s*q=0(\.0*)?\s*(,|$))(;[^,]*)?(,|$)/i.test([header ?? ''].flat().join(','));

/** Sends bytes that are kept packed: as they are to whoever takes gzip, unpacked to others. */
export async function sendPacked(request: FastifyRequest, reply: FastifyReply, contentType: string, packed: Uint8Array): Promise<FastifyReply> {
  void reply.header('vary', 'accept-encoding').header('content-type', contentType);
  if (takesGzip(request.headers['accept-encoding'])) return reply.header('content-encoding', 'gzip').send(Buffer.from(packed.buffer, packed.byteOffset, packed.byteLength));
  return reply.send(await unpack(packed));
}
