import { expect, it } from 'vitest';
import { signInBeat } from '../../../scripts/sign-in-beat/sign-in-beat';
import { beatData } from '../../../src/features/sign-in/beat-data';

it('the sign-in page shows what the engine draws (npm run sign-in-beat makes it anew)', () => {
  expect(JSON.parse(JSON.stringify(beatData))).toEqual(signInBeat());
});
