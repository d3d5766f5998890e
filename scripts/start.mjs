// `npm start`: installs and builds what is missing, then serves. Plain JavaScript, because it must run before
// anything is installed. Settings: PORT (4280), HOST (127.0.0.1), DATA_DIR (data), LOG_LEVEL (warn), TRUST_PROXY (0).
// `--build-only` stops before serving.
import { dirname } from 'node:path';
import { fileURLToPath } from 'node:url';
import { ensureNodeModules } from './install/node-modules.mjs';
import { buildWhenChanged } from './start/build-when-changed.mjs';

process.chdir(dirname(dirname(fileURLToPath(import.meta.url))));
process.env.NODE_ENV = 'production';

ensureNodeModules();
await buildWhenChanged({
  name: 'pages',
  configFile: 'vite.config.ts',
  sources: ['index.html', 'public', 'src', 'shared'],
  output: 'dist/client',
});
await buildWhenChanged({
  name: 'server',
  configFile: 'server/vite.config.ts',
  sources: ['server', 'shared'],
  output: 'dist/server',
});
if (!process.argv.includes('--build-only')) await import('../dist/server/main.js');
