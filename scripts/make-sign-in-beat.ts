// Writes the beats that the sign-in page shows, so that the page needs no engine: `npm run sign-in-beat`.
import { writeFileSync } from 'node:fs';
import { signInBeat } from './sign-in-beat/sign-in-beat';

const file = 'src/features/sign-in/beat-data.ts';
const data = signInBeat();
const source = `// Made by scripts/make-sign-in-beat.ts from the engine; a test holds it to the engine's output.
export const beatData = ${JSON.stringify(data)} as const;
`;
writeFileSync(file, source);
process.stdout.write(`${file}\n`);
