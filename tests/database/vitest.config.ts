import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');

/** Tests against a MariaDB whose address is in DATABASE_URL; one file at a time. */
export default defineConfig({
  root,
  resolve: { alias: { '@': root } },
  test: {
    include: ['tests/database/**/*.test.ts'],
    execArgv: ['--import', 'tsx'],
    fileParallelism: false,
    testTimeout: 30_000,
  },
});
