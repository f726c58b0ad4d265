import { startServer } from './app';

const development = process.argv.includes('--dev');

try {
  const server = await startServer({ env: process.env, dir: process.cwd(), development });
  console.log(server.signInLink ? `Leeboard is at ${server.url} ; sign in once with ${server.signInLink}` : `Leeboard is at ${server.url}`);
  let stopping = false;
  const stop = (): void => {
    if (stopping) process.exit(1);
    stopping = true;
    void server.close().then(() => process.exit(0), () => process.exit(1));
  };
  process.on('SIGINT', stop);
  process.on('SIGTERM', stop);
} catch (error) {
  console.error(`Leeboard did not start: ${(error as Error).message}`);
  process.exit(1);
}
