import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');

/** Tests against the MariaDB at DATABASE_URL, in a database of their own that is dropped afterwards; one file at a time. */
export default defineConfig({
  root,
  resolve: { alias: { '@': root } },
  test: {
    include: ['tests/database/**/*.test.ts'],
    execArgv: ['--import', 'tsx'],
    globalSetup: ['tests/database/scratch-database.ts'],
    fileParallelism: false,
    testTimeout: 30_000,
  },
});
