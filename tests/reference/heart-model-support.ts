import { readFileSync } from 'node:fs';
import type { ActivationPattern } from '../../shared/engine/heart/activation';
import { computeVentricularLoop, type VentricularLoop } from '../../shared/engine/heart/compute-loop';
import { fascicles, type Fascicle, type MuscleSite } from '../../shared/engine/heart/heart-model-data';
import { nativeShape } from '../../shared/engine/heart/ventricular-shape';
import { twelveLeadRows } from '../../shared/engine/leads';
import type { LeadName } from '../../shared/parameters/sheet';

type PerLead = Record<LeadName, number>;

export interface AcceptanceCheck {
  configuration: string;
  check: string;
  expected: string;
  source: string;
  fitted: string;
}

interface Fixture {
  /** Of the model that the figures come from. */
  version: number;
  checks: AcceptanceCheck[];
  golden: {
    values: Record<
      string,
      {
        actMin: number;
        actMax: number;
        actMeanAreaWeighted: number;
        peak: number;
        H: Record<string, [number, number, number]>;
      }
    >;
  };
  prototypeValues: Record<
    string,
    { qrs: number; qrsFromStim: number; axis: number; R: PerLead; S: PerLead; T: PerLead; J: PerLead }
  >;
  biventricularSweep: {
    lvMinusRv: number;
    qrsFromStim: number;
    qrs: number;
    V1net: number;
    V1RS: number;
    Inet: number;
    Iq: number;
    axis: number;
  }[];
  fusionSweep: { intrinsicOnset: number; pacedFraction: number; qrs: number }[];
  qtScaling: { rateFactor: number; qt: number; qrs: number }[];
  qrsVersusSpeedScale: Record<string, number>;
  nodeDoubling: Record<string, { rmsRel: number }>;
  spectrumDb: Record<string, number>;
}

const read = (name: string): object =>
  JSON.parse(readFileSync(new URL(`../fixtures/${name}`, import.meta.url), 'utf8')) as object;

/**
 * Acceptance ranges with their sources (heart-model-checks.json, from the model's design), and the figures of this
 * version of the model, which guard against drift and validate nothing (heart-model-figures.json).
 */
export const fixture = {
  ...read('heart-model-checks.json'),
  ...read('heart-model-figures.json'),
} as Fixture;

function muscle(...sources: [MuscleSite, number][]): ActivationPattern {
  return { muscle: sources.map(([site, timeMs]) => ({ site, timeMs })), fascicles: [] };
}

function through(names: readonly Fascicle[], delayMs = 0): ActivationPattern {
  return {
    muscle: [],
    fascicles: names.map((fascicle) => ({ fascicle, timeMs: fascicles[fascicle].delayMs + delayMs })),
  };
}

/** Right ventricular apex and posterolateral left ventricle, the left `lvMinusRvMs` after the right. */
export function biventricular(lvMinusRvMs: number): ActivationPattern {
  return muscle(['rvApex', Math.max(0, -lvMinusRvMs)], ['lvPostlat', Math.max(0, lvMinusRvMs)]);
}

/** Apical stimulus at 0 and a conducted beat that arrives at `onsetMs`. */
export function fusedWithApex(onsetMs: number): ActivationPattern {
  return { ...through(['LAF', 'LSF', 'LPF', 'RBB'], onsetMs), muscle: muscle(['rvApex', 0]).muscle };
}

/** The configurations of the fixture, written out from the recipe and not through `activationPattern`. */
export const configurations = {
  normal: through(['LAF', 'LSF', 'LPF', 'RBB']),
  lbbb: through(['RBB']),
  rbbb: through(['LAF', 'LSF', 'LPF']),
  lafb: through(['LSF', 'LPF', 'RBB']),
  lpfb: through(['LAF', 'LSF', 'RBB']),
  rvApex: muscle(['rvApex', 0]),
  rvSept: muscle(['rvSept', 0]),
  rvOt: muscle(['rvOt', 0]),
  rvFree: muscle(['rvFree', 0]),
  lvLat: muscle(['lvLat', 0]),
  lvPostlat: muscle(['lvPostlat', 0]),
  lvAntlat: muscle(['lvAntlat', 0]),
  lvAnt: muscle(['lvAnt', 0]),
  lvApex: muscle(['lvApex', 0]),
  lvInf: muscle(['lvInf', 0]),
  lvSummit: muscle(['lvSummit', 0]),
  lvBasalPost: muscle(['lvBasalPost', 0]),
  lvSeptal: muscle(['lbb', 0]),
  biv0: biventricular(0),
  bivL30: biventricular(-30),
  bivR30: biventricular(30),
  bivL40: biventricular(-40),
  bivR40: biventricular(40),
  bivL70: biventricular(-70),
  bivR70: biventricular(70),
  hisSel: through(['LAF', 'LSF', 'LPF', 'RBB']),
  hisNonsel: {
    ...through(['LAF', 'LSF', 'LPF', 'RBB'], 35),
    muscle: [{ site: 'hisSept', timeMs: 0 }],
  },
  lbap: {
    muscle: [{ site: 'lbb', timeMs: 0 }],
    fascicles: [...through(['LAF', 'LSF', 'LPF'], 16).fascicles, { fascicle: 'RBB', timeMs: 36.9 }],
  },
} as const satisfies Record<string, ActivationPattern>;
export type ConfigurationName = keyof typeof configurations;

const loops = new Map<string, VentricularLoop>();

/** The loop of a configuration at the fitted shape; computed once. */
export function loopOf(name: ConfigurationName): VentricularLoop {
  const kept = loops.get(name);
  if (kept) return kept;
  const loop = computeVentricularLoop(configurations[name], nativeShape);
  loops.set(name, loop);
  return loop;
}

/** Heart vector at a whole ms of the loop's clock; zero outside. */
export function vectorAt(loop: VentricularLoop, timeMs: number): [number, number, number] {
  const i = timeMs - loop.startMs;
  return i < 0 || i >= loop.x.length ? [0, 0, 0] : [loop.x[i], loop.y[i], loop.z[i]];
}

/** One lead from `fromMs` to `toMs`, mV. */
export function leadBetween(loop: VentricularLoop, lead: LeadName, fromMs: number, toMs: number): number[] {
  const [cx, cy, cz] = twelveLeadRows[lead];
  return Array.from({ length: toMs - fromMs + 1 }, (_, i) => {
    const [x, y, z] = vectorAt(loop, fromMs + i);
    return cx * x + cy * y + cz * z;
  });
}

/** The whole QRS in one lead, mV. */
export function qrsOf(loop: VentricularLoop, lead: LeadName): number[] {
  return leadBetween(loop, lead, loop.measures.qrsOnsetMs, loop.measures.qrsOffsetMs);
}

/** The last `share` of the QRS in one lead, mV ("late" in the fixture is the second half). */
export function lateQrsOf(loop: VentricularLoop, lead: LeadName, share = 0.5): number[] {
  const { qrsOnsetMs, qrsOffsetMs } = loop.measures;
  const from = Math.floor(qrsOffsetMs - share * (qrsOffsetMs - qrsOnsetMs));
  return leadBetween(loop, lead, from, qrsOffsetMs);
}

/** To the two decimals of the fixture's figures. */
export function toHundredths(value: number): number {
  return Math.round(value * 100) / 100;
}

/** Integral of the heart vector over its QRS, mV ms. */
export function qrsArea(loop: VentricularLoop): [number, number, number] {
  const sum: [number, number, number] = [0, 0, 0];
  for (let t = loop.startMs; t <= loop.measures.qrsOffsetMs; t++) {
    vectorAt(loop, t).forEach((value, axis) => (sum[axis] += value));
  }
  return sum;
}

/** Where a fused beat's QRS area lies between the conducted (0) and the paced (1) one, along their difference. */
export function pacedFraction(fused: VentricularLoop): number {
  const conducted = qrsArea(loopOf('normal'));
  const difference = qrsArea(loopOf('rvApex')).map((value, axis) => value - conducted[axis]);
  const dot = (a: readonly number[]): number =>
    a.reduce((sum, value, axis) => sum + value * difference[axis], 0);
  return dot(qrsArea(fused).map((value, axis) => value - conducted[axis])) / dot(difference);
}

/** Largest amplitude at 145 Hz and above against the spectrum's peak, dB; 300 ms from the loop's start, cut abruptly. */
export function highFrequencyDb(loop: VentricularLoop): number {
  const magnitudeAt = (hz: number): number => {
    let power = 0;
    for (const values of [loop.x, loop.y, loop.z]) {
      let re = 0;
      let im = 0;
      for (let i = 0; i < 300; i++) {
        const phase = (2 * Math.PI * hz * i) / 1000;
        re += values[i] * Math.cos(phase);
        im += values[i] * Math.sin(phase);
      }
      power += re * re + im * im;
    }
    return Math.sqrt(power);
  };
  const magnitudes = Array.from({ length: 251 }, (_, k) => magnitudeAt(2 * k));
  return 20 * Math.log10(Math.max(...magnitudes.slice(73)) / Math.max(...magnitudes));
}

/** RMS difference of two loops relative to the first, over the whole of both. */
export function relativeDifference(a: VentricularLoop, b: VentricularLoop): number {
  let error = 0;
  let size = 0;
  const from = Math.min(a.startMs, b.startMs);
  const to = Math.max(a.startMs + a.x.length, b.startMs + b.x.length);
  for (let t = from; t < to; t++) {
    const other = vectorAt(b, t);
    vectorAt(a, t).forEach((value, axis) => {
      error += (value - other[axis]) ** 2;
      size += value ** 2;
    });
  }
  return Math.sqrt(error / size);
}
