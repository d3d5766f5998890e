// `npm run dev`: the server through tsx, restarted on changes, and Vite's page server, which passes /api on to it.
import { spawn } from 'node:child_process';

const commands = [
  ['npx', ['tsx', 'watch', '--clear-screen=false', 'server/main.ts']],
  ['npx', ['vite']],
];

const children = commands.map(([command, args]) => spawn(command, args, { stdio: 'inherit' }));

function stopAll() {
  for (const child of children) child.kill('SIGTERM');
}

for (const child of children) child.on('exit', stopAll);
process.on('SIGINT', stopAll);
process.on('SIGTERM', stopAll);
