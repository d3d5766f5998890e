import { leadNames, type LeadName } from '../../../shared/parameters/sheet';
import { parseStripParameters } from '../../../shared/parameters/parse';
import type { StripParametersInput } from '../../../shared/parameters/strip-parameters';
import type { PaperStrip } from '../../../shared/paper/paper-strip';

/** Value in mV of a lead at a time. */
export type Shape = (timeS: number, lead: LeadName) => number;

/** A recording made of a formula, with parameters parsed from `input`. */
export function stripOf(shape: Shape, input: StripParametersInput = {}): PaperStrip {
  const parameters = parseStripParameters(input);
  const { sampleRateHz } = parameters.recorder;
  const count = Math.round(parameters.durationS * sampleRateHz);
  const leads = Object.fromEntries(
    leadNames.map((lead) => [
      lead,
      Float32Array.from({ length: count }, (_, i) => shape(i / sampleRateHz, lead)),
    ]),
  ) as Record<LeadName, Float32Array>;
  return { sampleRateHz, leads, engineVersion: '0.0.0-test', parameters };
}

function bump(timeS: number, atS: number, widthS: number, heightMv: number): number {
  return heightMv * Math.exp(-0.5 * ((timeS - atS) / widthS) ** 2);
}

/** Height of QRS, T and P by lead, mV: a made-up paced beat, for looks only. */
const heights: Record<LeadName, readonly [number, number, number]> = {
  I: [0.7, -0.25, 0.08],
  II: [-1.1, 0.45, 0.15],
  III: [-1.8, 0.7, 0.07],
  aVR: [0.2, -0.1, -0.11],
  aVL: [1.25, -0.45, 0.03],
  aVF: [-1.4, 0.55, 0.1],
  V1: [-1.6, 0.6, 0.06],
  V2: [-2.1, 0.9, 0.06],
  V3: [-1.9, 0.8, 0.06],
  V4: [-1.2, 0.5, 0.07],
  V5: [-0.5, 0.3, 0.08],
  V6: [0.5, -0.2, 0.08],
};

/** A paced-looking rhythm: small spike, P, larger spike, wide QRS, opposite T, every `cycleS`. */
export function pacedShape(cycleS = 0.857): Shape {
  return (timeS, lead) => {
    const [qrs, t, p] = heights[lead];
    const phase = (timeS + 0.55) % cycleS;
    const spike = (atS: number, heightMv: number) => (phase >= atS && phase < atS + 0.004 ? heightMv : 0);
    return (
      spike(0.1, 0.25 * Math.sign(p)) +
      bump(phase, 0.15, 0.025, p) +
      spike(0.28, 0.6 * Math.sign(-qrs)) +
      bump(phase, 0.35, 0.028, qrs) +
      bump(phase, 0.39, 0.02, qrs * 0.35) +
      bump(phase, 0.62, 0.06, t)
    );
  };
}
