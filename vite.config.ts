import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

// The pages. Nothing is inlined, because the content security policy allows files of our own origin only.
export default defineConfig({
  plugins: [react(), tailwindcss()],
  build: {
    outDir: 'dist/client',
    emptyOutDir: true,
    assetsInlineLimit: 0,
    modulePreload: { polyfill: false },
    target: 'es2022',
  },
  worker: { format: 'es' },
  server: { port: 4281, proxy: { '/api': 'http://127.0.0.1:4280' } },
});
