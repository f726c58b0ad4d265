import * as z from 'zod';

/** Each role holds the rights of those before it. */
export const ROLES = ['viewer', 'operator', 'admin'] as const;
export const roleSchema = z.enum(ROLES);
export type Role = z.infer<typeof roleSchema>;

export const atLeast = (held: Role, needed: Role): boolean => ROLES.indexOf(held) >= ROLES.indexOf(needed);

export const identitySchema = z.object({ id: z.string(), name: z.string(), role: roleSchema });
export type Identity = z.infer<typeof identitySchema>;

export const newKeySchema = z.object({ name: z.string().trim().min(1).max(80), role: roleSchema });
export const keySchema = z.object({ id: z.string(), name: z.string(), role: roleSchema, start: z.string().nullable(), createdAt: z.string(), lastUsedAt: z.string().nullable() });
/** `key` is shown once. */
export const madeKeySchema = keySchema.extend({ key: z.string() });

/** Someone who was given a one-time link. */
export const personSchema = z.object({ id: z.string(), name: z.string(), role: roleSchema, everSignedIn: z.boolean(), createdAt: z.string() });
export type Person = z.infer<typeof personSchema>;
