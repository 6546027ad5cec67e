import next from 'eslint-config-next/core-web-vitals';
import typescript from 'eslint-config-next/typescript';

const config = [
  ...next,
  ...typescript,
  { ignores: ['.next*/**', '.local/**', '.local-*/**', 'node_modules/**', 'next-env.d.ts'] },
  {
    rules: {
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      'no-console': 'error',
    },
  },
  // Scripts talk to a person at a terminal; everything else logs through pino.
  { files: ['docker-local/**', 'tests/**', 'seeders/**', 'migrations/**'], rules: { 'no-console': 'off' } },
];

export default config;
