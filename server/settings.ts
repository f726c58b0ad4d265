import * as z from 'zod';

const onOff = z.enum(['on', 'off'], 'expected on or off');

/** Every environment variable, parsed once. The names are `LEEBOARD_` and the key. */
const settingsSchema = z.object({
  /** Port to serve on. */
  PORT: z.coerce.number().int().min(0).max(65535).default(4600),
  /** Address to listen on; loopback unless said otherwise. */
  HOST: z.string().min(1).default('127.0.0.1'),
  /** Folder of the embedded database and of everything else that must be kept. */
  DATA_DIR: z.string().min(1).default('./data'),
  /** An admin key given from outside, for installs without a browser. */
  BOOTSTRAP_KEY: z.string().min(24, 'a bootstrap key needs at least 24 characters').optional(),
  /** PostgreSQL instead of the embedded database. */
  DATABASE_URL: z.string().regex(/^postgres(ql)?:\/\//, 'expected postgres://...').optional(),
  /** Several processes on one event (not in this release: a value stops the start). */
  REDIS_URL: z.undefined('several processes are not supported in this release; unset it').optional(),
  /** Load the demo exercise at first start. */
  DEMO: onOff.default('on'),
  /** Members of a run. */
  MEMBERS: z.coerce.number().int().min(10, 'at least 10 members').max(5000, 'at most 5000 members').default(1000),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent']).default('warn'),
});

export type Settings = Readonly<z.infer<typeof settingsSchema>>;

/** Reads the settings, or throws one line that names the variable, what it held and what it should be. */
export function readSettings(env: Record<string, string | undefined>): Settings {
  const given = Object.fromEntries(
    Object.keys(settingsSchema.shape).flatMap((key) => {
      const value = env[`LEEBOARD_${key}`];
      return value === undefined || value === '' ? [] : [[key, value]];
    }),
  );
  const parsed = settingsSchema.safeParse(given);
  if (parsed.success) return Object.freeze(parsed.data);
  const issue = parsed.error.issues[0];
  const name = String(issue.path[0]);
  throw new Error(`LEEBOARD_${name}: ${issue.message}${name.endsWith('KEY') || name.endsWith('URL') ? '' : ` (got "${given[name]}")`}`);
}
