import next from 'eslint-config-next/core-web-vitals';
import tseslint from 'typescript-eslint';

const pureFolders = ['lib/bibliography/**', 'lib/linking/**', 'lib/network/**', 'lib/evaluation/**'];

/** The layers of DEVELOPERS.md, kept by rule: pure code reaches nothing outside itself, pages never touch the database. tests/unit/layers.test.ts proves that the rule bites. */
const config = [
  { ignores: ['.next/**', '.heddle/**', 'node_modules/**', 'next-env.d.ts', 'coverage/**'] },
  ...next,
  ...tseslint.configs.recommended,
  {
    files: ['**/*.{ts,tsx}'],
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
    },
  },
  {
    files: pureFolders,
    rules: {
      'no-restricted-imports': ['error', {
        patterns: [{
          group: ['@/models', '@/models/*', '@/app/*', '@/components/*', 'next', 'next/*', 'next-auth', 'next-auth/*', 'react', 'sequelize', 'mariadb', 'node:*', 'fs', 'fs/*',
            '@/lib/imports/*', '@/lib/analyses/*', '@/lib/reports/*', '@/lib/jobs/*', '@/lib/access/*', '@/lib/api/*', '@/lib/services/*', '@/lib/db/*', '@/lib/environment'],
          message: 'lib/bibliography, linking, network and evaluation are pure: plain data in, plain data out.',
        }],
      }],
      'no-restricted-properties': ['error',
        { object: 'Math', property: 'random', message: 'Pass a seeded generator in.' },
        { object: 'Date', property: 'now', message: 'Pure code knows no clock.' }],
      'no-restricted-globals': ['error', { name: 'process', message: 'Pure code knows no process.' }],
    },
  },
  {
    files: ['app/**', 'components/**'],
    rules: {
      'no-restricted-imports': ['error', {
        patterns: [{ group: ['@/models', '@/models/*', 'sequelize', 'mariadb', '@/lib/db/*'], message: 'Pages and components call services; they never touch the database.' }],
      }],
      'no-restricted-properties': ['error', { object: 'process', property: 'env', message: 'Read settings from lib/environment.' }],
    },
  },
];

export default config;
