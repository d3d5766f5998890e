/**
 * Version of everything that decides a sample. It changes whenever the same parameters and seed no longer give
 * the same strip; saved strips carry the version that made them.
 */
export const engineVersion = '2.0.0';

/** Whether two engines draw the same parameters differently: their first numbers differ. */
export function drawsDifferently(savedWith: string, current: string = engineVersion): boolean {
  return savedWith.split('.')[0] !== current.split('.')[0];
}
