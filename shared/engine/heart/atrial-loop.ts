import { twelveLeadRows } from '../leads';
import { atrialFronts, tablePDurationMs, type AtrialFront, type AtrialSite } from './atrial-data';
import { loopStepMs, type VectorLoop } from './vector-loop';

export type { AtrialSite } from './atrial-data';

/** Heart vector of one P wave; times on the clock of the atrial event, ms. */
export interface AtrialLoop extends VectorLoop {
  onsetMs: number;
  offsetMs: number;
}

/** Zero samples on either side, so that interpolation of any kind starts and ends at rest. */
const paddingSamples = 2;

/** Share of a front's peak at a time: the dipole of a front crossing a thin sphere, zero outside its passage. */
function frontShare({ startMs, durationMs }: AtrialFront, timeMs: number): number {
  const phase = (timeMs - startMs) / durationMs;
  return phase > 0 && phase < 1 ? Math.sin(Math.PI * phase) ** 2 : 0;
}

function unit({ direction }: AtrialFront): readonly [number, number, number] {
  const length = Math.hypot(...direction);
  return [direction[0] / length, direction[1] / length, direction[2] / length];
}

/** Peak of the table's sinus P in lead II, mV. */
function sinusPeakInLeadII(): number {
  const [cx, cy, cz] = twelveLeadRows.II;
  const gains = atrialFronts.sinus.map((front) => {
    const [x, y, z] = unit(front);
    return front.amplitudeMv * (cx * x + cy * y + cz * z);
  });
  let peak = 0;
  for (let t = 0; t <= tablePDurationMs; t += 0.1) {
    const value = atrialFronts.sinus.reduce((sum, front, i) => sum + gains[i] * frontShare(front, t), 0);
    peak = Math.max(peak, value);
  }
  return peak;
}

const tablePAmplitudeMv = sinusPeakInLeadII();

/**
 * P wave from a site, mV at 1 ms, zero at both ends: two fronts, one for each atrium.
 *
 * @param shape amplitude and duration of a *sinus* P in lead II; P waves from other sites keep their proportion to
 *   it. The table's own sinus P is 0.117 mV, so that the default 0.12 mV scales it up by 2 %.
 */
export function atrialLoop(
  site: AtrialSite,
  shape: { pAmplitudeMv: number; pDurationMs: number },
): AtrialLoop {
  const gain = shape.pAmplitudeMv / tablePAmplitudeMv;
  const stretch = shape.pDurationMs / tablePDurationMs;
  const fronts = atrialFronts[site];
  const offsetMs = stretch * Math.max(...fronts.map(({ startMs, durationMs }) => startMs + durationMs));
  const startMs = -paddingSamples;
  const length = Math.ceil(offsetMs) + 2 * paddingSamples + 1;
  const x = new Float64Array(length);
  const y = new Float64Array(length);
  const z = new Float64Array(length);
  for (const front of fronts) {
    const [dx, dy, dz] = unit(front);
    for (let i = 0; i < length; i++) {
      const value = gain * front.amplitudeMv * frontShare(front, (startMs + i) / stretch);
      x[i] += value * dx;
      y[i] += value * dy;
      z[i] += value * dz;
    }
  }
  return { startMs, stepMs: loopStepMs, x, y, z, onsetMs: 0, offsetMs };
}
