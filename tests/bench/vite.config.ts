import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vite';

const at = (path: string) => fileURLToPath(new URL(path, import.meta.url));

/** The bench is built as the site is, so that no loader made for development weighs on its figures. */
export default defineConfig({
  logLevel: 'warn',
  resolve: { alias: { '@': at('../..').replace(/\/$/, '') } },
  build: {
    ssr: true,
    outDir: at('../../node_modules/.cache/bench'),
    rollupOptions: {
      input: { run: at('./run.ts'), measure: at('./measure.ts') },
      output: { entryFileNames: '[name].js' },
    },
  },
});
