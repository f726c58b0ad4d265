import boundaries from 'eslint-plugin-boundaries';
import hooks from 'eslint-plugin-react-hooks';
import ts from 'typescript-eslint';

/** The path of a forecast. A folder of lib imports only from itself and from those before it. */
const LIB_ORDER = ['units', 'geo', 'advisory', 'track', 'wind', 'rain', 'members', 'exposure', 'hazard', 'impact', 'wire'];

const allow = (from, to) => ({ from: { element: { type: from } }, allow: { to: { element: to } } });
/** A folder of lib is entered through its index.ts alone. */
const doors = (names) => ({ types: { anyOf: names.map((name) => `lib-${name}`) }, fileInternalPath: 'index.ts' });

export default ts.config(
  { ignores: ['node_modules', '.next', 'dist', 'data', 'public', 'test-results', 'playwright-report', 'next-env.d.ts'] },
  ...ts.configs.recommended,
  {
    rules: {
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-non-null-assertion': 'off',
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'max-lines': ['error', { max: 400, skipBlankLines: true, skipComments: true }],
    },
  },
  { files: ['app/**/*.{ts,tsx}'], plugins: { 'react-hooks': hooks }, rules: hooks.configs.recommended.rules },
  {
    // The core does no I/O, has no clock and no randomness of its own.
    files: ['lib/**/*.ts'],
    rules: {
      'no-restricted-globals': ['error', 'process', 'fetch', 'window', 'document'],
      'no-restricted-properties': ['error', { object: 'Math', property: 'random' }, { object: 'Date', property: 'now' }],
      'no-restricted-imports': ['error', { paths: ['fs', 'path'], patterns: ['node:*'] }],
    },
  },
  {
    files: ['app/**/*.{ts,tsx}', 'lib/**/*.ts', 'server/**/*.ts'],
    plugins: { boundaries },
    settings: {
      'import/resolver': { node: { extensions: ['.ts', '.tsx', '.js'] } },
      'boundaries/elements': [
        ...LIB_ORDER.map((name) => ({ type: `lib-${name}`, pattern: `lib/${name}` })),
        { type: 'app', pattern: 'app' },
        { type: 'server', pattern: 'server' },
      ],
    },
    rules: {
      'boundaries/dependencies': ['error', {
        default: 'disallow',
        message: `A folder of lib imports from itself and, through their index.ts, from those before it: ${LIB_ORDER.join(', ')}. app and server import lib through index.ts, never one another.`,
        policies: [
          ...LIB_ORDER.flatMap((name, i) => [allow(`lib-${name}`, { type: `lib-${name}` }), allow(`lib-${name}`, doors(LIB_ORDER.slice(0, i)))]),
          allow('app', { type: 'app' }),
          allow('app', doors(LIB_ORDER)),
          allow('server', { type: 'server' }),
          allow('server', doors(LIB_ORDER)),
        ],
      }],
    },
  },
);
