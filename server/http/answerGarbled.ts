import { randomUUID } from 'node:crypto';
import { maxHeaderSize, STATUS_CODES } from 'node:http';
import type { Socket } from 'node:net';
import type { FastifyInstance } from 'fastify';
import { problemDocument, Refusal } from './problems';

const refusalOf = (code: string | undefined): Refusal => {
  if (code === 'HPE_HEADER_OVERFLOW') return new Refusal('headers-too-large', `The headers hold more than ${maxHeaderSize / 1024} KB: clear the cookies that other programs on this host have left.`);
  if (code === 'ERR_HTTP_REQUEST_TIMEOUT') return new Refusal('too-slow', 'The request did not come to its end in time; nothing was stored. Send it again over a faster line.');
  return new Refusal('bad-request', 'This is not HTTP as RFC 9112 has it. Is it meant for an encrypted port?');
};

/** Answers what never became a request, on the bare connection, and hangs up: what follows cannot be told apart. */
export function answerGarbled(this: FastifyInstance, error: Error & { code?: string }, socket: Socket): void {
  // A connection that was reset has nobody at the other end; one that sent nothing asked nothing.
  if (error.code === 'ECONNRESET' || socket.destroyed) return;
  if (!socket.writable) return void socket.destroy(error);
  const problem = problemDocument(refusalOf(error.code), randomUUID());
  this.log.debug({ err: error, request: problem.instance }, 'not a request');
  const body = JSON.stringify(problem);
  socket.write(`HTTP/1.1 ${problem.status} ${STATUS_CODES[problem.status]}\r\nConnection: close\r\nContent-Type: application/problem+json\r\nContent-Length: ${Buffer.byteLength(body)}\r\n\r\n${body}`);
  socket.destroySoon();
}
