import { greatestCount, type LeadCounts } from '../sixteen-bit';
import { decimalField } from './decimal-field';

/** Characters of a physical extreme; one of the eight is the minus sign of the minimum. */
const extremeWidth = 7;
/** Two steps are the same below this, relative. */
const sameStep = 1e-12;
/** Digital maxima worth trying; a lower one gives range away for nothing. */
const leastDigitalMax = 20_000;

/** The four extremes of an EDF signal: ±physicalMaxUv at ±digitalMax, so that zero is zero. */
export interface EdfRange {
  physicalMaxUv: string;
  digitalMax: number;
  /** The step a reader computes from the fields, µV. */
  stepUv: number;
  /** Whether that is the step meant, to 1e-12. */
  exact: boolean;
}

function greatestUsed(counts: Int16Array): number {
  let greatest = 1;
  for (let i = 0; i < counts.length; i++) greatest = Math.max(greatest, Math.abs(counts[i]));
  return greatest;
}

/**
 * Extremes whose step is that of the lead: a digital maximum is sought at which the physical one can be written in the
 * seven characters there are (3.337 µV × 32000 = 106784). Failing that, the pair whose step is nearest.
 */
export function edfRange({ counts, stepUv }: LeadCounts): EdfRange {
  const least = Math.max(greatestUsed(counts), leastDigitalMax);
  let best: (EdfRange & { error: number }) | null = null;
  for (let digitalMax = greatestCount; digitalMax >= least; digitalMax--) {
    const physicalMaxUv = decimalField(digitalMax * stepUv, extremeWidth);
    const written = Number(physicalMaxUv) / digitalMax;
    const error = Math.abs(written / stepUv - 1);
    if (!best || error < best.error) {
      best = { physicalMaxUv, digitalMax, stepUv: written, exact: error < sameStep, error };
    }
    if (best.exact) break;
  }
  if (!best) throw new RangeError(`counts beyond ±${greatestCount}`);
  return best;
}
