import type { Vector3 } from './heart-model-data';

/** Where an atrial depolarization starts. */
export type AtrialSite =
  'sinus' | 'raa' | 'bachmann' | 'raLateral' | 'lowAtrial' | 'retrograde' | 'leftLateral';

/** One front crossing one atrium, at the default P amplitude and duration. */
export interface AtrialFront {
  /** Direction of travel in body axes; normalized before use. */
  direction: Vector3;
  amplitudeMv: number;
  startMs: number;
  durationMs: number;
}

/** Duration of the sinus P that the table below draws, ms: 30 + 88. */
export const tablePDurationMs = 118;

/** Right and left atrial fronts by site. Tuned by hand, from memory; tested for the polarities it must show. */
export const atrialFronts: Readonly<Record<AtrialSite, readonly [AtrialFront, AtrialFront]>> = {
  sinus: [
    { direction: [0.52, 0.76, -0.38], amplitudeMv: 0.11, startMs: 0, durationMs: 88 },
    { direction: [0.84, 0.22, 0.5], amplitudeMv: 0.085, startMs: 30, durationMs: 88 },
  ],
  raa: [
    { direction: [0.05, 0.82, 0.5], amplitudeMv: 0.095, startMs: 0, durationMs: 98 },
    { direction: [0.72, 0.4, 0.57], amplitudeMv: 0.08, startMs: 46, durationMs: 92 },
  ],
  bachmann: [
    { direction: [0.05, 0.95, 0.05], amplitudeMv: 0.08, startMs: 0, durationMs: 86 },
    { direction: [0.84, 0.42, 0.34], amplitudeMv: 0.09, startMs: 4, durationMs: 90 },
  ],
  raLateral: [
    { direction: [0.7, 0.65, -0.25], amplitudeMv: 0.105, startMs: 0, durationMs: 94 },
    { direction: [0.86, 0.2, 0.46], amplitudeMv: 0.085, startMs: 44, durationMs: 92 },
  ],
  leftLateral: [
    { direction: [-0.7, 0.5, -0.45], amplitudeMv: 0.08, startMs: 46, durationMs: 92 },
    { direction: [-0.85, 0.15, -0.5], amplitudeMv: 0.1, startMs: 0, durationMs: 92 },
  ],
  lowAtrial: [
    { direction: [0.3, -0.9, -0.2], amplitudeMv: 0.075, startMs: 0, durationMs: 88 },
    { direction: [0.35, -0.85, 0.25], amplitudeMv: 0.06, startMs: 12, durationMs: 90 },
  ],
  retrograde: [
    { direction: [0.18, -0.95, -0.25], amplitudeMv: 0.078, startMs: 0, durationMs: 82 },
    { direction: [0.25, -0.93, 0.05], amplitudeMv: 0.062, startMs: 6, durationMs: 84 },
  ],
};
