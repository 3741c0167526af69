import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');

/** Tests in Chromium against the site at SITE_URL; one file at a time. */
export default defineConfig({
  root,
  resolve: { alias: { '@': root } },
  test: {
    include: ['tests/browser/**/*.test.ts'],
    execArgv: ['--import', 'tsx'],
    fileParallelism: false,
    testTimeout: 480_000,
  },
});
