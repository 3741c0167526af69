import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('.', import.meta.url));

export default defineConfig({
  resolve: { alias: { '@': root.replace(/\/$/, '') } },
  test: {
    include: ['tests/**/*.test.{ts,tsx}'],
    exclude: ['tests/database/**', 'tests/browser/**', 'node_modules/**'],
    execArgv: ['--import', 'tsx'],
    setupFiles: ['tests/fixed-seed.ts'],
    testTimeout: 30_000,
  },
});
