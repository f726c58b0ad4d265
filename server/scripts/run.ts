import { spawn } from 'node:child_process';

/** Runs a command with this terminal's streams; answers its exit code. */
export function run(command: string, args: readonly string[], env: Record<string, string> = {}): Promise<number> {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { stdio: 'inherit', env: { ...process.env, NEXT_TELEMETRY_DISABLED: '1', ...env } });
    child.once('error', reject);
    child.once('exit', (code) => resolve(code ?? 1));
  });
}

/** A package's own command, from this project's node_modules. */
export const bin = (name: string): string => `node_modules/.bin/${name}`;
