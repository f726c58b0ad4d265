export {};

Object.assign(process.env, { NODE_ENV: 'development', NEXT_TELEMETRY_DISABLED: '1' });
process.argv.push('--dev');
await import('../main');
