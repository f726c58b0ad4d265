import { roleSchema } from '../../lib/wire';
import type { Person } from '../../lib/wire';
import type { AuthLibrary } from './library';
import type { LeeboardAuth } from './model';

/** Records of the auth library that stand for people and for holders of keys: it wants an address, and `.invalid` (RFC 2606) is nobody's. */
export const address = (name: string): string => `${name}@leeboard.invalid`;
export const PERSON = 'person-';

const MOST = 1000;

interface StoredPerson {
  id: string;
  email: string;
  name: string;
  role: string;
  emailVerified: boolean;
  createdAt: Date | string;
}

const personOf = (row: StoredPerson): Person => ({
  id: row.id,
  name: row.name,
  role: roleSchema.parse(row.role),
  everSignedIn: row.emailVerified,
  createdAt: new Date(row.createdAt).toISOString(),
});

export async function peopleOf(library: AuthLibrary): Promise<LeeboardAuth['people']> {
  const { internalAdapter, adapter } = await library.$context;
  return {
    async list() {
      const rows = await adapter.findMany<StoredPerson>({ model: 'user', where: [{ field: 'email', operator: 'starts_with', value: PERSON }], sortBy: { field: 'createdAt', direction: 'desc' }, limit: MOST });
      return rows.map(personOf);
    },
    async remove(id) {
      const row = await adapter.findOne<StoredPerson>({ model: 'user', where: [{ field: 'id', value: id }] });
      if (!row?.email.startsWith(PERSON)) return false;
      await internalAdapter.deleteUserSessions(id);
      // A link still open leads to nobody once the person is gone.
      await internalAdapter.deleteUser(id);
      return true;
    },
  };
}

/** Ends sessions opened with a bootstrap key that is no longer the one in force. */
export async function endSessionsOfFormer(library: AuthLibrary, prefix: string, current: string | null): Promise<void> {
  const { internalAdapter, adapter } = await library.$context;
  const holders = await adapter.findMany<StoredPerson>({ model: 'user', where: [{ field: 'email', operator: 'starts_with', value: prefix }], limit: MOST });
  for (const { id, email } of holders) if (email !== current) await internalAdapter.deleteUserSessions(id);
}
