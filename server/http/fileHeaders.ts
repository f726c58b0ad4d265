import type { Source } from '../store';

/** `attachment`, with the name twice (RFC 6266): plain letters for old clients, all letters for others. */
export const asAttachment = (fileName: string): string => `attachment; filename="${fileName.replace(/[^\w.-]+/g, '_')}"; filename*=UTF-8''${percentEncoded(fileName)}`;

/** RFC 8187. Half a letter, left where a long name was cut, cannot be encoded and goes. */
const percentEncoded = (text: string): string => encodeURIComponent(text.replace(/\p{Surrogate}/gu, '')).replace(/['()*]/g, (letter) => `%${letter.charCodeAt(0).toString(16).toUpperCase()}`);

/** Headers of a stored file: never changed, never shown as a page. */
export const fileHeaders = ({ contentType, fileName }: Source, fallback: string): Record<string, string> => ({
  'content-type': contentType,
  'content-disposition': asAttachment(fileName ?? fallback),
  'cache-control': FOR_EVER,
});

/** What belongs to a revision, an advisory or a layer never changes (RFC 8246), and is only for whoever asked. */
export const FOR_EVER = 'private, max-age=31536000, immutable';
