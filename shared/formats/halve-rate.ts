import { measuredLeads, type MeasuredLead } from '../engine/leads';
import { quantiseLeads } from '../engine/recorder/quantiser';
import type { LeadName } from '../parameters/sheet';
import type { SampledLeads } from './csv';

/** Coefficients of the low-pass; odd, so that its delay is whole and can be removed. */
const taps = 101;
/** −6 dB point over the old rate: 450 Hz of 2000/s, flat to 0.02 dB at 400 Hz, 50 dB down at the new Nyquist limit. */
const cutoff = 0.225;

/** A sinc under a Hamming window, of gain 1 at 0 Hz (the window method; SciPy's `firwin` is the same design). */
export function halvingFilter(): Float64Array {
  const middle = (taps - 1) / 2;
  const filter = Float64Array.from({ length: taps }, (_, i) => {
    const x = i - middle;
    const sinc = x === 0 ? 2 * cutoff : Math.sin(2 * Math.PI * cutoff * x) / (Math.PI * x);
    return sinc * (0.54 - 0.46 * Math.cos((2 * Math.PI * i) / (taps - 1)));
  });
  const gain = filter.reduce((sum, value) => sum + value, 0);
  return filter.map((value) => value / gain);
}

/** Every second sample of the filtered lead, mV; before and after the strip its first and last value are held. */
function halve(samplesMv: Float32Array, filter: Float64Array): Float64Array {
  const { length } = samplesMv;
  const middle = (filter.length - 1) / 2;
  const halved = new Float64Array(Math.ceil(length / 2));
  for (let k = 0; k < halved.length; k++) {
    let sum = 0;
    for (let j = 0; j < filter.length; j++) {
      sum += filter[j] * samplesMv[Math.max(0, Math.min(length - 1, 2 * k + j - middle))];
    }
    halved[k] = sum;
  }
  return halved;
}

/**
 * Leads at half their rate, for formats that end at 1000/s: low-pass without delay, every second sample (sample k is
 * the old sample 2k), quantised again as the recorder does it, limb leads from I and II.
 */
export function halveRate({ leads, sampleRateHz, resolutionUv }: SampledLeads): SampledLeads {
  const filter = halvingFilter();
  const measured = Object.fromEntries(
    measuredLeads.map((lead) => [lead, halve(leads[lead], filter)]),
  ) as Record<MeasuredLead, Float64Array>;
  const quantised: Record<LeadName, Float32Array> = quantiseLeads(measured, resolutionUv);
  return { sampleRateHz: sampleRateHz / 2, resolutionUv, leads: quantised };
}
