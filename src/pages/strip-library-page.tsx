import { StripLibrary } from '../features/strip-library/strip-library';

export function Component() {
  return <StripLibrary />;
}
