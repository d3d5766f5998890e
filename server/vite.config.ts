import { defineConfig } from 'vite';

// The server as files for Node: `main.js` and one for each kind of worker. Packages stay in node_modules, so that native
// code and the worker threads find them; our own TypeScript needs no transpiler at run time.
export default defineConfig({
  publicDir: false,
  build: {
    ssr: true,
    target: 'node20',
    outDir: 'dist/server',
    emptyOutDir: true,
    minify: false,
    sourcemap: true,
    rollupOptions: {
      input: {
        main: 'server/main.ts',
        'render-worker': 'server/workers/render-worker.ts',
        'report-worker': 'server/workers/report-worker.ts',
        'export-worker': 'server/workers/export-worker.ts',
        'sheet-worker': 'server/workers/sheet-worker.ts',
      },
      output: { entryFileNames: '[name].js', chunkFileNames: 'chunks/[name]-[hash].js' },
    },
  },
});
