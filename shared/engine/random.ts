/**
 * Seeded chance. One independent stream per use ("sinus", "muscle:V1", …), so that switching one disturbance
 * on never shifts the draws of another.
 */
export interface RandomStream {
  /** Uniform in [0, 1), 32 bits. */
  uniform(): number;
  /** Standard normal (Box–Muller, polar free of rejection so that the count of draws is fixed). */
  normal(): number;
}

/** 32-bit FNV-1a hash of a text. */
function hashText(text: string): number {
  let hash = 0x811c9dc5;
  for (let i = 0; i < text.length; i++) {
    hash = Math.imul(hash ^ text.charCodeAt(i), 0x01000193);
  }
  return hash >>> 0;
}

/**
 * A stream of numbers decided by `seed` (0 … 2^32 − 1) and the name of its use: the public-domain sfc32
 * generator on integer arithmetic only, so every JavaScript engine gives the same bits.
 */
export function randomStream(seed: number, use: string): RandomStream {
  let a = seed >>> 0;
  let b = hashText(use);
  let c = 0x9e3779b9;
  let counter = 1;
  const next = (): number => {
    const sum = (a + b + counter) | 0;
    counter = (counter + 1) | 0;
    a = b ^ (b >>> 9);
    b = (c + (c << 3)) | 0;
    c = (c << 21) | (c >>> 11);
    c = (c + sum) | 0;
    return sum >>> 0;
  };
  // The first outputs still carry the seed's pattern.
  for (let i = 0; i < 20; i++) next();
  const uniform = (): number => next() / 4294967296;
  const normal = (): number => {
    const radius = Math.sqrt(-2 * Math.log(1 - uniform()));
    return radius * Math.cos(2 * Math.PI * uniform());
  };
  return { uniform, normal };
}
