import { issueNext } from './issueNext';
import { readSettings } from '../settings';

/** Issues the demo's next advisory: `npm run demo:next`, with the server running. */
try {
  const settings = readSettings(process.env);
  const key = settings.BOOTSTRAP_KEY ?? process.env.LEEBOARD_KEY;
  if (!key) throw new Error('no key: set LEEBOARD_KEY to an operator key, or LEEBOARD_BOOTSTRAP_KEY to the one the server was started with');
  console.log(await issueNext({ base: `http://${settings.HOST}:${settings.PORT}`, key }));
} catch (error) {
  console.error((error as Error).message);
  process.exitCode = 1;
}
