import { createServer } from 'node:net';
import type { AddressInfo } from 'node:net';
import { expect, test } from 'vitest';
import { cannotListen, freePort } from '../../server/listening';

test('a port that is taken is said to be taken, with the setting that mends it', async () => {
  const taken = createServer();
  await new Promise<void>((resolve) => taken.listen(0, '127.0.0.1', resolve));
  const { port } = taken.address() as AddressInfo;
  await expect(freePort({ HOST: '127.0.0.1', PORT: port })).rejects.toThrow(new RegExp(`^127\\.0\\.0\\.1 port ${port} is taken[^\\n]*LEEBOARD_PORT`));
  await new Promise((resolve) => taken.close(resolve));
  expect(await freePort({ HOST: '127.0.0.1', PORT: port })).toBe(port);
});

test('for port 0 a free port is found, and left free', async () => {
  const port = await freePort({ HOST: '127.0.0.1', PORT: 0 });
  expect(port).toBeGreaterThan(0);
  expect(await freePort({ HOST: '127.0.0.1', PORT: port })).toBe(port);
});

// 192.0.2.1 is set aside for documentation (RFC 5737): no machine has it.
test('an address of another machine is said to be none of this one', async () => {
  await expect(freePort({ HOST: '192.0.2.1', PORT: 0 })).rejects.toThrow(/192\.0\.2\.1 is no address of this machine: set LEEBOARD_HOST/);
});

test('a port kept for the system names a range that is not', () => {
  expect(cannotListen({ HOST: '127.0.0.1', PORT: 80 }, Object.assign(new Error('listen EACCES'), { code: 'EACCES' })).message).toMatch(/port 80 may not be listened on.*1024 or above/);
});
