import type { StripRecording } from '../../engine/render';
import { bandwidthLabel } from '../../paper/bandwidth-label';
import { educationCaution, syntheticCaution } from '../../paper/cautions';
import { uvPerMv } from '../../units';
import { toAscii } from '../ascii';
import type { ExportOptions, ExportResult } from '../export-format';
import { sixteenBitLeads, sixteenBitWarnings, type LeadCounts } from '../sixteen-bit';
import { utcText } from '../utc';
import { encodeWfdbAnnotations, wfdbAnnotations } from './wfdb-annotations';

const record = 'strip';
/** 16-bit two's complement, low byte first, signals interleaved (FM-25). */
const signalFormat = 16;
const adcBits = 16;
const sampleBytes = 2;
/** Significant digits of a gain that is no short decimal. */
const gainDigits = 10;
/** Frames made at a time. */
const framesAtOnce = 50_000;

/** Sum of a signal's samples as a signed 16-bit number (FM-24). */
export function wfdbChecksum(counts: Int16Array): number {
  let sum = 0;
  for (let i = 0; i < counts.length; i++) sum = (sum + counts[i]) & 0xffff;
  return sum > 0x7fff ? sum - 0x10000 : sum;
}

/** Counts to the millivolt. */
function gain(stepUv: number): string {
  return String(Number((uvPerMv / stepUv).toPrecision(gainDigits)));
}

/** A signal's line (FM-21): gain with baseline 0, 16 bits, first value, checksum, lead. */
function signalLine({ lead, counts, stepUv }: LeadCounts): string {
  return `${record}.dat ${signalFormat} ${gain(stepUv)}(0)/mV ${adcBits} 0 ${counts[0]} ${wfdbChecksum(counts)} 0 ${lead}`;
}

function headerText(recording: StripRecording, leads: readonly LeadCounts[], madeAt: Date): string {
  const { sampleRateHz, parameters, engineVersion } = recording;
  const { year, month, day, hours, minutes, seconds } = utcText(madeAt);
  const title = toAscii(parameters.title).trim();
  const comments = [
    `${syntheticCaution}.`,
    educationCaution,
    ...(title === '' ? [] : [`Title: ${title}`]),
    `Made by Paceloom, engine ${engineVersion}, seed ${parameters.seed}; ${toAscii(bandwidthLabel(parameters.recorder))}.`,
    'Annotations stand at onsets, rounded to the sample: QRS by beat codes (channel 0), P waves as ( (channel 1),',
    'stimuli without capture as ^ and with capture as comments (channels 2 to 4: atrium, right ventricle or chest pads, left ventricle).',
  ];
  return [
    `${record} ${leads.length} ${sampleRateHz} ${leads[0].counts.length} ${hours}:${minutes}:${seconds} ${day}/${month}/${year}`,
    ...leads.map(signalLine),
    ...comments.map((comment) => `# ${comment}`),
    '',
  ].join('\n');
}

/** The signals frame by frame, low byte first. */
function* signalParts(leads: readonly LeadCounts[]): Generator<Uint8Array> {
  const { length } = leads[0].counts;
  for (let from = 0; from < length; from += framesAtOnce) {
    const to = Math.min(length, from + framesAtOnce);
    const bytes = new Uint8Array((to - from) * leads.length * sampleBytes);
    const view = new DataView(bytes.buffer);
    let at = 0;
    for (let i = from; i < to; i++) {
      for (const { counts } of leads) {
        view.setInt16(at, counts[i], true);
        at += sampleBytes;
      }
    }
    yield bytes;
  }
}

/**
 * A strip as a WFDB record (header(5), signal(5), annot(5) of release 10.7): `strip.hea`, `strip.dat` in format 16 with
 * the quantiser's steps (half of them for aVR, aVL and aVF), and `strip.atr` with beats and stimuli. Warnings: wider
 * steps, clipping, a title that ASCII cannot hold.
 */
export function encodeWfdb(recording: StripRecording, { madeAt }: ExportOptions): ExportResult {
  const { events, parameters, sampleRateHz } = recording;
  const leads = sixteenBitLeads(recording);
  const annotations = wfdbAnnotations(events, parameters, sampleRateHz, leads[0].counts.length);
  const title = parameters.title.trim();
  return {
    files: [
      {
        name: `${record}.hea`,
        mediaType: 'text/plain; charset=us-ascii',
        parts: [headerText(recording, leads, madeAt)],
      },
      { name: `${record}.dat`, mediaType: 'application/octet-stream', parts: signalParts(leads) },
      {
        name: `${record}.atr`,
        mediaType: 'application/octet-stream',
        parts: [encodeWfdbAnnotations(annotations)],
      },
    ],
    warnings: [
      ...sixteenBitWarnings(leads),
      ...(toAscii(title) === title ? [] : ['the title stands in the header without accents']),
    ],
  };
}
