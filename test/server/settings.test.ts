import { describe, expect, test } from 'vitest';
import { readSettings } from '../../server/settings';

test('without any variable, the settings are those of the contract', () => {
  expect(readSettings({})).toMatchObject({ PORT: 4600, HOST: '127.0.0.1', DATA_DIR: './data', DEMO: 'on', MEMBERS: 1000 });
});

test('variables of others, and empty ones, are not looked at', () => {
  expect(readSettings({ PORT: 'nonsense', LEEBOARD_PORT: '', LEEBOARD_DEMO: '' })).toMatchObject({ PORT: 4600, DEMO: 'on' });
});

test('what is given is taken', () => {
  const env = { LEEBOARD_PORT: '8080', LEEBOARD_HOST: '0.0.0.0', LEEBOARD_DATA_DIR: '/var/lib/leeboard', LEEBOARD_BOOTSTRAP_KEY: 'k'.repeat(24), LEEBOARD_DATABASE_URL: 'postgres://u:p@db/leeboard', LEEBOARD_DEMO: 'off', LEEBOARD_MEMBERS: '200', LEEBOARD_LOG_LEVEL: 'debug' };
  expect(readSettings(env)).toEqual({ PORT: 8080, HOST: '0.0.0.0', DATA_DIR: '/var/lib/leeboard', BOOTSTRAP_KEY: 'k'.repeat(24), DATABASE_URL: 'postgres://u:p@db/leeboard', DEMO: 'off', MEMBERS: 200, LOG_LEVEL: 'debug' });
});

test('the settings do not change while the program runs', () => {
  expect(() => Object.assign(readSettings({}), { PORT: 1 })).toThrow(TypeError);
});

describe('a bad value stops the start with one line that names it', () => {
  test.each([
    ['PORT', 'eighty', /LEEBOARD_PORT.*"eighty"/],
    ['PORT', '70000', /LEEBOARD_PORT.*65535.*"70000"/],
    ['PORT', '80.5', /LEEBOARD_PORT.*"80.5"/],
    ['DEMO', 'yes', /LEEBOARD_DEMO: expected on or off \(got "yes"\)/],
    ['MEMBERS', '5', /LEEBOARD_MEMBERS: at least 10 members \(got "5"\)/],
    ['MEMBERS', '1e6', /LEEBOARD_MEMBERS: at most 5000 members/],
    ['LOG_LEVEL', 'loud', /LEEBOARD_LOG_LEVEL.*"loud"/],
    ['DATABASE_URL', 'mysql://u:hunter2@db/x', /LEEBOARD_DATABASE_URL: expected postgres/],
    ['BOOTSTRAP_KEY', 'hunter2', /LEEBOARD_BOOTSTRAP_KEY: a bootstrap key needs at least 24 characters/],
    ['REDIS_URL', 'redis://x', /LEEBOARD_REDIS_URL: several processes are not supported in this release/],
  ])('%s=%s', (name, value, says) => {
    const read = (): unknown => readSettings({ [`LEEBOARD_${name}`]: value });
    expect(read).toThrow(says);
    expect(read).toThrow(/^[^\n]+$/);
  });

  test.each(['BOOTSTRAP_KEY', 'DATABASE_URL'])('and never says what %s held', (name) => {
    let message = '';
    try {
      readSettings({ [`LEEBOARD_${name}`]: 'hunter2' });
    } catch (error) {
      message = (error as Error).message;
    }
    expect(message).toContain(name);
    expect(message).not.toContain('hunter2');
  });
});
