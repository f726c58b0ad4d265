import { problemFrom, RequestFailed } from './problem';

const BASE = '/api/v1';

export interface Call {
  method?: 'GET' | 'POST' | 'DELETE' | 'PUT' | 'PATCH';
  body?: BodyInit | undefined;
  contentType?: string | undefined;
  headers?: Record<string, string>;
  signal?: AbortSignal | undefined;
}

/** One way to the server. Throws RequestFailed for every answer that is not 2xx and for a server that cannot be reached. */
export async function request(path: string, { method = 'GET', body, contentType, headers, signal }: Call = {}): Promise<Response> {
  let response: Response;
  try {
    response = await fetch(`${BASE}${path}`, {
      method,
      credentials: 'same-origin',
      headers: { ...(contentType ? { 'content-type': contentType } : {}), ...headers },
      ...(body === undefined ? {} : { body }),
      ...(signal ? { signal } : {}),
    });
  } catch (error) {
    if (signal?.aborted) throw error;
    throw new RequestFailed(0, 'The server cannot be reached. Nothing was sent or lost; try again.');
  }
  if (response.ok) return response;
  throw problemFrom(response.status, await response.json().catch(() => null));
}

export async function getJson<T>(path: string, signal?: AbortSignal): Promise<T> {
  return (await (await request(path, { signal })).json()) as T;
}

export async function sendJson<T>(path: string, value: unknown, headers: Record<string, string> = {}, method: Call['method'] = 'POST'): Promise<T> {
  const response = await request(path, { method, body: JSON.stringify(value), contentType: 'application/json', headers });
  return (response.status === 204 ? undefined : await response.json()) as T;
}

export const query = (parameters: Record<string, string | number | boolean | undefined>): string => {
  const given = Object.entries(parameters).filter(([, value]) => value !== undefined) as [string, string | number | boolean][];
  return given.length === 0 ? '' : `?${new URLSearchParams(given.map(([key, value]) => [key, String(value)]))}`;
};
