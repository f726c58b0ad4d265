import boundaries from 'eslint-plugin-boundaries';
import hooks from 'eslint-plugin-react-hooks';
import ts from 'typescript-eslint';

/** The path of a forecast. A folder of lib imports only from itself and from those before it. */
const LIB_ORDER = ['units', 'geo', 'advisory', 'track', 'wind', 'rain', 'members', 'exposure', 'hazard', 'impact', 'wire'];

const allow = (from, to) => ({ from: { type: from }, allow: { to: to.map((type) => ({ type })) } });

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
  { files: ['lib/**/*.ts'], rules: { 'no-restricted-globals': ['error', 'process', 'fetch', 'window', 'document'], 'no-restricted-properties': ['error', { object: 'Math', property: 'random' }, { object: 'Date', property: 'now' }], 'no-restricted-imports': ['error', { patterns: ['node:*', 'fs', 'path'] }] } },
  {
    files: ['app/**/*.{ts,tsx}', 'lib/**/*.ts', 'server/**/*.ts'],
    plugins: { boundaries },
    settings: {
      'boundaries/elements': [
        ...LIB_ORDER.map((name) => ({ type: `lib-${name}`, pattern: `lib/${name}` })),
        { type: 'app', pattern: 'app' },
        { type: 'server', pattern: 'server' },
      ],
    },
    rules: {
      'boundaries/dependencies': ['error', {
        default: 'disallow',
        rules: [
          ...LIB_ORDER.map((name, i) => allow(`lib-${name}`, LIB_ORDER.slice(0, i + 1).map((n) => `lib-${n}`))),
          allow('app', ['app', ...LIB_ORDER.map((n) => `lib-${n}`)]),
          allow('server', ['server', ...LIB_ORDER.map((n) => `lib-${n}`)]),
        ],
      }],
    },
  },
);
