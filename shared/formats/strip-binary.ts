import type { StripEvent } from '../engine/events';
import type { Reading } from '../engine/reading/reading';
import { leadNames, type LeadName } from '../parameters/sheet';
import type { StripParameters } from '../parameters/strip-parameters';

/**
 * A rendered strip as bytes, for the way from a renderer to a page: a 4-byte length, a header in JSON, then the
 * samples of one lead after another. Everything is little-endian.
 *
 * The header is ASCII (other characters are escaped) and padded with spaces so that the samples start at a
 * multiple of 8, where a reader may lay typed arrays straight over the received buffer.
 */
export const stripBinaryVersion = 1;

/** `float32`: as recorded, after the quantiser. `float64`: before it. */
export type SampleType = 'float32' | 'float64';

/** What comes with the samples. */
export interface StripBinaryHeader {
  format: 'paceloom-strip';
  formatVersion: number;
  sampleType: SampleType;
  sampleRateHz: number;
  resolutionUv: number;
  delayRemovedMs: number;
  /** Samples a lead; the first is at 0 s. */
  samples: number;
  /** Order in which the leads follow. */
  leads: LeadName[];
  engineVersion: string;
  parameters: StripParameters;
  events: StripEvent[];
  stimulusMarkersS: number[] | null;
  reading: Reading;
}

/** What `encodeStripBinary` takes: a recording, or its samples before the quantiser. Leads in mV. */
export interface RenderedStrip<Samples extends Float32Array | Float64Array> {
  sampleRateHz: number;
  resolutionUv: number;
  delayRemovedMs: number;
  leads: Record<LeadName, Samples>;
  events: StripEvent[];
  stimulusMarkersS: number[] | null;
  reading: Reading;
  parameters: StripParameters;
  engineVersion: string;
}

export type DecodedStrip =
  | ({ sampleType: 'float32' } & RenderedStrip<Float32Array>)
  | ({ sampleType: 'float64' } & RenderedStrip<Float64Array>);

const lengthBytes = 4;
const alignment = 8;
const bytesPerSample: Record<SampleType, number> = { float32: 4, float64: 8 };
/** Longest stretch handed to String.fromCharCode at once; engines limit the number of arguments. */
const charactersAtOnce = 8192;

/** Bytes that are no strip of ours, cut short, or of a version not known here. */
export class StripBinaryError extends Error {
  constructor(message: string) {
    super(message);
    this.name = 'StripBinaryError';
  }
}

/** JSON without a character above 126. */
function asciiJson(value: unknown): string {
  return JSON.stringify(value).replace(
    /[^ -~]/g,
    (character) => `\\u${character.charCodeAt(0).toString(16).padStart(4, '0')}`,
  );
}

function asciiText(bytes: Uint8Array): string {
  let text = '';
  for (let i = 0; i < bytes.length; i += charactersAtOnce) {
    text += String.fromCharCode(...bytes.subarray(i, i + charactersAtOnce));
  }
  return text;
}

function headerOf(strip: RenderedStrip<Float32Array | Float64Array>): StripBinaryHeader {
  return {
    format: 'paceloom-strip',
    formatVersion: stripBinaryVersion,
    sampleType: strip.leads.I instanceof Float64Array ? 'float64' : 'float32',
    sampleRateHz: strip.sampleRateHz,
    resolutionUv: strip.resolutionUv,
    delayRemovedMs: strip.delayRemovedMs,
    samples: strip.leads.I.length,
    leads: [...leadNames],
    engineVersion: strip.engineVersion,
    parameters: strip.parameters,
    events: strip.events,
    stimulusMarkersS: strip.stimulusMarkersS,
    reading: strip.reading,
  };
}

/**
 * Encodes a recording (Float32Array leads) or its unquantised samples (Float64Array leads). All leads must be
 * of one kind and length; throws `StripBinaryError` when they are not.
 */
export function encodeStripBinary(
  strip: RenderedStrip<Float32Array> | RenderedStrip<Float64Array>,
): Uint8Array<ArrayBuffer> {
  const header = headerOf(strip);
  const json = asciiJson(header);
  const headerEnd = Math.ceil((lengthBytes + json.length) / alignment) * alignment;
  const leadBytes = header.samples * bytesPerSample[header.sampleType];
  const bytes = new Uint8Array(headerEnd + header.leads.length * leadBytes);
  const view = new DataView(bytes.buffer);
  view.setUint32(0, headerEnd - lengthBytes, true);
  bytes.fill(' '.charCodeAt(0), lengthBytes, headerEnd);
  for (let i = 0; i < json.length; i++) bytes[lengthBytes + i] = json.charCodeAt(i);
  header.leads.forEach((lead, i) => {
    const samples = strip.leads[lead];
    if (samples.length !== header.samples || samples.constructor !== strip.leads.I.constructor) {
      throw new StripBinaryError(`lead ${lead} differs from lead I in length or kind`);
    }
    writeSamples(view, headerEnd + i * leadBytes, samples);
  });
  return bytes;
}

function writeSamples(view: DataView, start: number, samples: Float32Array | Float64Array): void {
  if (samples instanceof Float32Array) {
    for (let k = 0; k < samples.length; k++) view.setFloat32(start + 4 * k, samples[k], true);
  } else {
    for (let k = 0; k < samples.length; k++) view.setFloat64(start + 8 * k, samples[k], true);
  }
}

function readHeader(bytes: Uint8Array, view: DataView): { header: StripBinaryHeader; headerEnd: number } {
  if (bytes.length < lengthBytes) throw new StripBinaryError('shorter than its length field');
  const headerEnd = lengthBytes + view.getUint32(0, true);
  if (headerEnd > bytes.length) throw new StripBinaryError('cut off inside its header');
  let header: StripBinaryHeader;
  try {
    header = JSON.parse(asciiText(bytes.subarray(lengthBytes, headerEnd))) as StripBinaryHeader;
  } catch {
    throw new StripBinaryError('the header is not JSON');
  }
  if (header?.format !== 'paceloom-strip') throw new StripBinaryError('not a strip');
  if (header.formatVersion !== stripBinaryVersion) {
    throw new StripBinaryError(`format version ${header.formatVersion}; this reads ${stripBinaryVersion}`);
  }
  if (!Object.hasOwn(bytesPerSample, header.sampleType)) throw new StripBinaryError('unknown kind of sample');
  if (leadNames.some((lead) => !header.leads.includes(lead))) throw new StripBinaryError('a lead is missing');
  return { header, headerEnd };
}

/** Decodes what `encodeStripBinary` made; throws `StripBinaryError` on anything else. Samples are copied. */
export function decodeStripBinary(buffer: ArrayBuffer | Uint8Array): DecodedStrip {
  const bytes = buffer instanceof Uint8Array ? buffer : new Uint8Array(buffer);
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const { header, headerEnd } = readHeader(bytes, view);
  const { sampleType, samples, leads, sampleRateHz, resolutionUv, delayRemovedMs } = header;
  const { engineVersion, parameters, events, stimulusMarkersS, reading } = header;
  const leadBytes = samples * bytesPerSample[sampleType];
  if (bytes.length !== headerEnd + leads.length * leadBytes) {
    throw new StripBinaryError(
      `${bytes.length - headerEnd} bytes of samples; the header announces ${leads.length * leadBytes}`,
    );
  }
  const common = {
    sampleRateHz,
    resolutionUv,
    delayRemovedMs,
    events,
    stimulusMarkersS,
    reading,
    parameters,
    engineVersion,
  };
  const startOf = (lead: LeadName): number => headerEnd + leads.indexOf(lead) * leadBytes;
  return sampleType === 'float64'
    ? { sampleType, ...common, leads: perLead((lead) => readFloat64(view, startOf(lead), samples)) }
    : { sampleType, ...common, leads: perLead((lead) => readFloat32(view, startOf(lead), samples)) };
}

function perLead<Samples>(read: (lead: LeadName) => Samples): Record<LeadName, Samples> {
  return Object.fromEntries(leadNames.map((lead) => [lead, read(lead)])) as Record<LeadName, Samples>;
}

function readFloat32(view: DataView, start: number, length: number): Float32Array {
  const samples = new Float32Array(length);
  for (let k = 0; k < length; k++) samples[k] = view.getFloat32(start + 4 * k, true);
  return samples;
}

function readFloat64(view: DataView, start: number, length: number): Float64Array {
  const samples = new Float64Array(length);
  for (let k = 0; k < length; k++) samples[k] = view.getFloat64(start + 8 * k, true);
  return samples;
}
