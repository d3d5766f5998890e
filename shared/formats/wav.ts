import type { StripRecording } from '../engine/render';
import { syntheticCaution } from '../paper/cautions';
import type { LeadName } from '../parameters/sheet';
import type { SheetParameters } from '../parameters/strip-parameters';
import { toAscii } from './ascii';
import type { ExportResult } from './export-format';
import { greatestCount, shortNumber } from './sixteen-bit';
import { asciiBytes } from './utf8';

/** Stands in every WAV file and beside it, because a WAV file can drive hardware. */
export const playbackCaution = 'For isolated, attenuated simulator inputs only; never connect to a person.';

/** What full scale may mean, mV; the smallest that holds the strip is taken, so that the gain is a round number. */
const fullScalesMv = [5, 10, 20, 50, 100] as const;
/** Format tag of integer samples, bits of one, and its bytes. */
const pcm = 1;
const sampleBits = 16;
const sampleBytes = 2;
/** A line that an INFO chunk holds. */
const longestInfo = 1000;

/** Leads that are played: the first of the sheet alone, or its first two. */
export function playedLeads({ layout, leads }: Pick<SheetParameters, 'layout' | 'leads'>): LeadName[] {
  return leads.slice(0, layout === 'single' ? 1 : 2);
}

function peakMv(channels: readonly Float32Array[]): number {
  let peak = 0;
  for (const channel of channels) {
    for (let i = 0; i < channel.length; i++) {
      const magnitude = Math.abs(channel[i]);
      if (magnitude > peak) peak = magnitude;
    }
  }
  return peak;
}

/** Chunks of a RIFF file begin at even places. */
function chunk(id: string, content: Uint8Array): Uint8Array {
  const bytes = new Uint8Array(8 + content.length + (content.length % 2));
  bytes.set(asciiBytes(id));
  new DataView(bytes.buffer).setUint32(4, content.length, true);
  bytes.set(content, 8);
  return bytes;
}

function joined(parts: readonly Uint8Array[]): Uint8Array {
  const bytes = new Uint8Array(parts.reduce((sum, part) => sum + part.length, 0));
  let at = 0;
  for (const part of parts) {
    bytes.set(part, at);
    at += part.length;
  }
  return bytes;
}

function formatChunk(channels: number, sampleRateHz: number): Uint8Array {
  const content = new Uint8Array(16);
  const view = new DataView(content.buffer);
  view.setUint16(0, pcm, true);
  view.setUint16(2, channels, true);
  view.setUint32(4, sampleRateHz, true);
  view.setUint32(8, sampleRateHz * channels * sampleBytes, true);
  view.setUint16(12, channels * sampleBytes, true);
  view.setUint16(14, sampleBits, true);
  return chunk('fmt ', content);
}

/** A LIST chunk of INFO: texts that end with a zero. */
function infoChunk(texts: Readonly<Record<string, string>>): Uint8Array {
  const entries = Object.entries(texts)
    .map(([id, text]) => [id, toAscii(text).trim().slice(0, longestInfo)])
    .filter(([, text]) => text !== '')
    .map(([id, text]) => chunk(id, asciiBytes(`${text}\0`)));
  return chunk('LIST', joined([asciiBytes('INFO'), ...entries]));
}

interface WavSamples {
  content: Uint8Array;
  clipped: number;
  gaps: number;
}

function interleaved(channels: readonly Float32Array[], fullScaleMv: number): WavSamples {
  const { length } = channels[0];
  const content = new Uint8Array(length * channels.length * sampleBytes);
  const view = new DataView(content.buffer);
  const result: WavSamples = { content, clipped: 0, gaps: 0 };
  let at = 0;
  for (let i = 0; i < length; i++) {
    for (const channel of channels) {
      const count = Math.round((channel[i] / fullScaleMv) * greatestCount);
      if (Math.abs(count) > greatestCount) result.clipped++;
      if (Number.isNaN(count)) result.gaps++;
      const held = Math.max(-greatestCount, Math.min(greatestCount, count));
      view.setInt16(at, Number.isNaN(held) ? 0 : held, true);
      at += sampleBytes;
    }
  }
  return result;
}

/**
 * One or two leads of a strip as a WAV file of 16-bit samples at the strip's own rate, to drive the isolated, attenuated
 * inputs of a simulator: the leads of the sheet (`playedLeads`), 5, 10, 20, 50 or 100 mV at full scale. The LIST INFO
 * chunk holds the cautions, the leads and the scale; the first warning is the caution.
 */
export function encodeWav(recording: StripRecording): ExportResult {
  const { parameters, sampleRateHz, engineVersion } = recording;
  const leads = playedLeads(parameters.sheet);
  const channels = leads.map((lead) => recording.leads[lead]);
  const peak = peakMv(channels);
  const fullScaleMv = fullScalesMv.find((scale) => peak <= scale) ?? fullScalesMv[fullScalesMv.length - 1];
  const { content, clipped, gaps } = interleaved(channels, fullScaleMv);
  const scale = `Leads ${leads.join(', ')}; ${fullScaleMv} mV = ${greatestCount} counts`;
  const info = infoChunk({
    INAM: parameters.title,
    ICMT: `${syntheticCaution}. ${playbackCaution} ${scale}.`,
    ISFT: `Paceloom, engine ${engineVersion}, seed ${parameters.seed}`,
  });
  const body = joined([
    asciiBytes('WAVE'),
    formatChunk(channels.length, sampleRateHz),
    info,
    chunk('data', content),
  ]);
  const count = (many: number): string => (many === 1 ? '1 sample' : `${many} samples`);
  return {
    files: [{ name: 'strip.wav', mediaType: 'audio/wav', parts: [chunk('RIFF', body)] }],
    warnings: [
      playbackCaution,
      `${scale}, a step of ${shortNumber((fullScaleMv * 1000) / greatestCount)} µV`,
      ...(clipped > 0 ? [`${count(clipped)} beyond ±${fullScaleMv} mV clipped`] : []),
      ...(gaps > 0 ? [`${count(gaps)} without a value written as 0`] : []),
    ],
  };
}
