import type { z } from 'zod';
import type { keySchema, madeKeySchema, Role } from '../../lib/wire';
import { getJson, request, sendJson } from '../http/request';

export type Key = z.infer<typeof keySchema>;
export type MadeKey = z.infer<typeof madeKeySchema>;

export const fetchKeys = async (signal: AbortSignal): Promise<Key[]> => (await getJson<{ items: Key[] }>('/keys', signal)).items;
export const makeKey = (name: string, role: Role): Promise<MadeKey> => sendJson('/keys', { name, role });
export const revokeKey = async (id: string): Promise<void> => void (await request(`/keys/${encodeURIComponent(id)}`, { method: 'DELETE' }));
export const makeLink = (name: string, role: Role): Promise<{ url: string }> => sendJson('/sign-in-links', { name, role });
