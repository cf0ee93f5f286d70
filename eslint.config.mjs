import next from 'eslint-config-next';
import nextTypescript from 'eslint-config-next/typescript';

/** Who may import whom: the table of DEVELOPERS.md. A folder lists what it must not reach. */
const forbidden = {
  lib: ['app', 'components', 'server', 'stations', 'db'],
  db: ['app', 'components', 'server', 'stations'],
  stations: ['app', 'components', 'server', 'db'],
  components: ['app', 'server', 'stations', 'db'],
  'server/operations': ['app', 'components', 'stations', 'server/live'],
  'server/mail': ['app', 'components', 'stations', 'server/live'],
  'server/files': ['app', 'components', 'stations', 'server/live'],
  'server/jobs': ['app', 'components', 'stations', 'server/live'],
  'server/live': ['app', 'components'],
  app: ['stations', 'server/live', 'db/client', 'db/schema', 'db/queries'],
};
const impure = [
  'node:*',
  'fs',
  'path',
  'crypto',
  'pg',
  'drizzle-orm',
  'drizzle-orm/*',
  'serialport',
  'next',
  'next/*',
  'react',
];

const layer = ([folder, others]) => ({
  files: [`${folder}/**/*.{ts,tsx}`],
  rules: {
    'no-restricted-imports': [
      'error',
      {
        patterns: [
          {
            group: others.flatMap((other) => [`@/${other}`, `@/${other}/**`, `**/../${other}`, `**/../${other}/**`]),
            message: `${folder} may not import this folder; see the table in DEVELOPERS.md.`,
          },
          ...(folder === 'lib' ? [{ group: impure, message: 'lib is pure: no I/O, clock or framework.' }] : []),
        ],
      },
    ],
  },
});

const config = [
  {
    ignores: [
      '.next/**',
      '.sillwright/**',
      'dist/**',
      'node_modules/**',
      'next-env.d.ts',
      'db/migrations/**',
      'coverage/**',
    ],
  },
  ...next,
  ...nextTypescript,
  { settings: { react: { version: '19.3' } } },
  {
    rules: {
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/consistent-type-imports': 'error',
      'no-console': 'error',
    },
  },
  {
    files: ['lib/**/*.{ts,tsx}'],
    ignores: ['lib/messages/**'],
    rules: {
      'no-restricted-properties': [
        'error',
        { object: 'Math', property: 'random', message: 'lib is pure: the random source is passed in.' },
        { object: 'Date', property: 'now', message: 'lib is pure: the clock is passed in.' },
      ],
    },
  },
  ...Object.entries(forbidden).map(layer),
  { files: ['lib/messages/**'], rules: { 'no-restricted-imports': 'off' } },
  {
    files: ['tests/**', 'server/setup/**', 'server/index.ts', 'server/welcome.ts', 'server/verify-trail.ts'],
    rules: { 'no-console': 'off' },
  },
];
export default config;
