import type { Signal } from './record-signal';

export const testSignalIds = ['pulse', 'sine', 'triangle', 'smallStimulus', 'largeStimulus'] as const;
export type TestSignalId = (typeof testSignalIds)[number];

/** A standard test signal that can stand on the bench instead of a strip. */
export interface TestSignal {
  label: string;
  /** What is applied, and where it comes from. */
  help: string;
  durationS: number;
  signal: Signal;
}

/** A rectangular pulse of 1 that starts at 0. */
export function rectangle(widthS: number): Signal {
  return (timeS) => (timeS >= 0 && timeS < widthS ? 1 : 0);
}

/** A triangular pulse of 1 over a base that starts at 0. */
export function triangle(baseS: number): Signal {
  return (timeS) => Math.max(0, 1 - Math.abs(timeS - baseS / 2) / (baseS / 2));
}

/** A pulse with straight edges: `riseS` up, as long as `widthS` at half height, `riseS` down. */
export function trapezoid(widthS: number, riseS: number): Signal {
  return (timeS) => Math.max(0, Math.min(1, timeS / riseS, (widthS + riseS - timeS) / riseS));
}

/**
 * A signal as a synthesizer samples it: the mean over one sample either side, weighted with a triangle, so that a pulse
 * shorter than a sample keeps its area wherever it falls.
 */
export function areaExact(signal: Signal, rateHz: number): Signal {
  const points = 16;
  return (timeS) => {
    let sum = 0;
    for (let i = 1 - points; i < points; i++) {
      sum += (1 - Math.abs(i) / points) * signal(timeS + i / (points * rateHz));
    }
    return sum / points;
  };
}

/** A signal that comes again every `periodS`, the first time at `fromS`. */
export function repeated(signal: Signal, periodS: number, fromS: number): Signal {
  return (timeS) => {
    const since = timeS - fromS;
    return since < 0 ? 0 : signal(since - periodS * Math.floor(since / periodS));
  };
}

/** 3 mV for 100 ms (BW-25: IEC 60601-2-25:2011, 201.12.4.107). */
export const lowFrequencyPulse = { amplitudeMv: 3, widthS: 0.1 } as const;
/** 200 mV for 1 ms, edges of 100 µs, 100 a minute, beside 1 mV peak to valley at 40 Hz (BW-36). */
export const pacingPulse = { amplitudeMv: 200, widthS: 0.001, riseS: 0.0001, everyS: 0.6 } as const;
export const besidePulse = { amplitudeMv: 0.5, frequencyHz: 40 } as const;

/** 40 Hz with pacing pulses on top, the first pulse at 0.3 s. */
export function pacingPulseTest(pulseMv: number = pacingPulse.amplitudeMv): Signal {
  const pulse = repeated(trapezoid(pacingPulse.widthS, pacingPulse.riseS), pacingPulse.everyS, 0.3);
  const { amplitudeMv, frequencyHz } = besidePulse;
  return (timeS) => pulseMv * pulse(timeS) + amplitudeMv * Math.sin(2 * Math.PI * frequencyHz * timeS);
}

const pulse = rectangle(lowFrequencyPulse.widthS);
const peak = triangle(0.02);
const small = rectangle(0.0005);

/** The signals one can put on the bench. */
export const testSignals: Readonly<Record<TestSignalId, TestSignal>> = {
  pulse: {
    label: 'Pulse, 3 mV for 100 ms',
    help: '0.3 mV·s: tells how a low-cut displaces what follows (IEC 60601-2-25:2011, 201.12.4.107).',
    durationS: 6,
    signal: (timeS) => lowFrequencyPulse.amplitudeMv * pulse(timeS - 1),
  },
  sine: {
    label: 'Sine, 10 Hz, 2 mV peak to valley',
    help: 'The reference of the sine series.',
    durationS: 4,
    signal: (timeS) => Math.sin(2 * Math.PI * 10 * timeS),
  },
  triangle: {
    label: 'Triangle, 1.5 mV, 20 ms base',
    help: 'Narrow as a steep R wave: a low limit at the top takes its peak (amplitude and base from memory).',
    durationS: 4,
    signal: repeated((timeS) => 1.5 * peak(timeS), 1, 0.5),
  },
  smallStimulus: {
    label: 'Stimulus, 2 mV for 0.5 ms',
    help: 'The least that monitors are asked to mark (PP-02, PP-05).',
    durationS: 4,
    signal: repeated((timeS) => 2 * small(timeS), 0.7503, 0.5),
  },
  largeStimulus: {
    label: 'Stimulus, 200 mV for 1 ms, on 40 Hz',
    help: 'Does the trace come back after a large pulse? (BW-36: read in an extract of the diagnostic standard.)',
    durationS: 6,
    signal: pacingPulseTest(),
  },
};
