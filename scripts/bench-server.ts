// `npm run bench:server`: what the server bears, as JSON.
import { measureServer } from './bench/server';

const rounded = (_key: string, value: unknown): unknown =>
  typeof value === 'number' ? Math.round(value * 100) / 100 : value;

console.log(JSON.stringify(await measureServer(), rounded, 2));
