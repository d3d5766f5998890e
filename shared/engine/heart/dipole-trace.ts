import { dipoleScale } from './heart-model-data';

/** Heart vector at every whole ms, interleaved x, y, z, mV. */
export interface DipoleTrace {
  startMs: number;
  sampleCount: number;
  values: Float64Array;
}

/** mV per mm² of area vector; a negative sign because the source points from excited to resting muscle. */
export const millivoltsPerArea = -dipoleScale * 1e-3;
