import type { StripParameters } from '../../parameters/strip-parameters';
import { createDisturbance, isDisturbed, type Disturbance } from '../disturbance/disturbance';
import { dowerMatrix, measuredLeads, type MeasuredLead } from '../leads';
import type { ElectrodeSignal, RenderedEvents } from './electrode-signal';
import type { SampleClock, VectorWindow } from './wave-painter';

/** The eight measured leads in doubles, mV. */
export type MeasuredSamples = Record<MeasuredLead, Float64Array>;

/**
 * The signal as the channels that a linear recorder has to band-limit.
 *
 * The recorder is linear, so an undisturbed strip is band-limited as the three components of the heart vector and
 * projected to leads afterwards; disturbance enters at the electrodes, and then the eight leads are band-limited.
 * Both are the same sums in another order.
 */
export interface ChannelSource {
  readonly channelCount: number;
  /**
   * Channels over samples [first, first + length) of a clock, and the events that came with them. The channels are
   * good until the next call.
   */
  render(clock: SampleClock, first: number, length: number): { channels: Float64Array[] } & RenderedEvents;
  /** Band-limited channels to the eight measured leads. */
  toMeasured(channels: readonly Float64Array[]): MeasuredSamples;
}

/** Dower projection of a heart vector onto the eight measured leads. */
function project({ x, y, z }: VectorWindow, length: number): MeasuredSamples {
  const entries = measuredLeads.map((lead) => {
    const [wx, wy, wz] = dowerMatrix[lead];
    const samples = new Float64Array(length);
    for (let i = 0; i < length; i++) samples[i] = wx * x[i] + wy * y[i] + wz * z[i];
    return [lead, samples] as const;
  });
  return Object.fromEntries(entries) as MeasuredSamples;
}

/** One window that is used again and again; samples beyond `length` are left over from longer ones. */
function reusedWindow(): (length: number) => VectorWindow {
  let window: VectorWindow = { x: new Float64Array(0), y: new Float64Array(0), z: new Float64Array(0) };
  return (length) => {
    if (window.x.length < length) {
      window = { x: new Float64Array(length), y: new Float64Array(length), z: new Float64Array(length) };
    }
    return window;
  };
}

function undisturbedSource(signal: ElectrodeSignal): ChannelSource {
  const windowOf = reusedWindow();
  return {
    channelCount: 3,
    render(clock, first, length) {
      const window = windowOf(length);
      const rendered = signal.render(window, clock, first, length);
      const channels = [window.x, window.y, window.z].map((axis) => axis.subarray(0, length));
      return { channels, ...rendered };
    },
    toMeasured: ([x, y, z]) => project({ x, y, z }, x.length),
  };
}

function disturbedSource(
  parameters: Pick<StripParameters, 'seed' | 'patient' | 'disturbance'>,
  signal: ElectrodeSignal,
  fullRateHz: number,
): ChannelSource {
  const windowOf = reusedWindow();
  let running: { clock: SampleClock; disturbance: Disturbance } | null = null;
  return {
    channelCount: measuredLeads.length,
    render(clock, first, length) {
      const window = windowOf(length);
      const rendered = signal.render(window, clock, first, length);
      const leads = project(window, length);
      if (running?.clock !== clock) {
        const slowOnly = clock.rateHz < fullRateHz;
        running = { clock, disturbance: createDisturbance(parameters, clock, first, { slowOnly }) };
      }
      running.disturbance.add(leads, length);
      return { channels: measuredLeads.map((lead) => leads[lead]), ...rendered };
    },
    toMeasured: (channels) =>
      Object.fromEntries(measuredLeads.map((lead, i) => [lead, channels[i]])) as MeasuredSamples,
  };
}

/** Three channels when nothing disturbs the strip, eight otherwise. Below `fullRateHz` only slow disturbance is drawn. */
export function createChannelSource(
  parameters: Pick<StripParameters, 'seed' | 'patient' | 'disturbance'>,
  signal: ElectrodeSignal,
  fullRateHz: number,
): ChannelSource {
  return isDisturbed(parameters)
    ? disturbedSource(parameters, signal, fullRateHz)
    : undisturbedSource(signal);
}
