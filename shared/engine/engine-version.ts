/**
 * Version of everything that decides a sample. It changes whenever the same parameters and seed no longer give
 * the same strip; saved strips carry the version that made them.
 */
export const engineVersion = '1.1.0';
