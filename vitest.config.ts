import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('.', import.meta.url));
const alias = { '@': root.replace(/\/$/, '') };

/** Pure tests run side by side; those that share the one test database or the one browser run one file after another. */
export default defineConfig({
  resolve: { alias },
  test: {
    projects: [
      {
        resolve: { alias },
        test: { name: 'pure', include: ['tests/unit/**/*.test.{ts,tsx}', 'tests/checks/**/*.test.ts'], testTimeout: 60_000 },
      },
      {
        resolve: { alias },
        test: {
          name: 'integration',
          include: ['tests/integration/**/*.test.ts'],
          fileParallelism: false,
          pool: 'forks',
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
      {
        resolve: { alias },
        test: { name: 'e2e', include: ['tests/e2e/**/*.test.ts'], fileParallelism: false, pool: 'forks', testTimeout: 900_000, hookTimeout: 300_000 },
      },
    ],
  },
});
