import type { StripRecording } from '../../engine/render';
import { bandLimits } from '../../parameters/recorder';
import type { RecorderParameters } from '../../parameters/strip-parameters';
import { syntheticCaution } from '../../paper/cautions';
import { toAscii } from '../ascii';
import { asciiBytes } from '../utf8';
import { utcText } from '../utc';
import { decimalField } from './decimal-field';

/** Fixed part and each signal's share of the header, bytes (FM-03). */
const headerBytesPerPart = 256;
const textFieldWidth = 80;
const months = ['JAN', 'FEB', 'MAR', 'APR', 'MAY', 'JUN', 'JUL', 'AUG', 'SEP', 'OCT', 'NOV', 'DEC'];

/** What the header says of one signal. */
export interface EdfSignal {
  label: string;
  transducer: string;
  dimension: string;
  physicalMin: string;
  physicalMax: string;
  digitalMin: number;
  digitalMax: number;
  prefiltering: string;
  samplesPerRecord: number;
}

export interface EdfHeader {
  patient: string;
  recording: string;
  madeAt: Date;
  recordCount: number;
  recordS: number;
  signals: readonly EdfSignal[];
}

/** A text field: left-justified, filled with spaces. Text that does not fit throws rather than being cut unnoticed. */
function field(text: string | number, width: number): string {
  const written = String(text);
  if (written.length > width) throw new RangeError(`${written} does not fit into ${width} characters`);
  return written.padEnd(width);
}

/** A subfield of the patient or recording field: no spaces, never empty. */
function subfield(text: string): string {
  return toAscii(text).trim().replace(/ +/gu, '_') || 'X';
}

/** Patient: code, sex, birthdate unknown, and as name that there is none (FM-08). */
export function patientField(): string {
  return `X X X ${subfield(syntheticCaution)}`;
}

/** Recording: start date, administration code, technician, equipment, then seed and title as far as they fit (FM-09). */
export function recordingField({ engineVersion, parameters }: StripRecording, madeAt: Date): string {
  const { day, year } = utcText(madeAt);
  const date = `${day}-${months[madeAt.getUTCMonth()]}-${year}`;
  const known = `Startdate ${date} X X Paceloom_${subfield(engineVersion)} seed_${parameters.seed}`;
  const whole = parameters.title.trim() === '' ? known : `${known} ${subfield(parameters.title)}`;
  return whole.slice(0, textFieldWidth);
}

/** The recorder's filters (FM-15); empty when there are none. */
export function prefiltering({ bandwidth, mainsNotchHz }: RecorderParameters): string {
  const limits = bandLimits(bandwidth);
  const parts = limits
    ? [`HP:${decimalField(limits.lowHz, 8)}Hz`, `LP:${decimalField(limits.highHz, 8)}Hz`]
    : [];
  if (mainsNotchHz !== 0) parts.push(`N:${mainsNotchHz}Hz`);
  return parts.join(' ');
}

/** The header as bytes: 256, and 256 for every signal (FM-01 to FM-03). */
export function edfHeader({
  patient,
  recording,
  madeAt,
  recordCount,
  recordS,
  signals,
}: EdfHeader): Uint8Array {
  const { day, month, year, hours, minutes, seconds } = utcText(madeAt);
  const column = (width: number, of: (signal: EdfSignal) => string | number): string =>
    signals.map((signal) => field(of(signal), width)).join('');
  return asciiBytes(
    [
      field('0', 8),
      field(patient, textFieldWidth),
      field(recording, textFieldWidth),
      `${day}.${month}.${year.slice(-2)}`,
      `${hours}.${minutes}.${seconds}`,
      field(headerBytesPerPart * (1 + signals.length), 8),
      field('EDF+C', 44),
      field(recordCount, 8),
      field(decimalField(recordS, 8), 8),
      field(signals.length, 4),
      column(16, ({ label }) => label),
      column(textFieldWidth, ({ transducer }) => transducer),
      column(8, ({ dimension }) => dimension),
      column(8, ({ physicalMin }) => physicalMin),
      column(8, ({ physicalMax }) => physicalMax),
      column(8, ({ digitalMin }) => digitalMin),
      column(8, ({ digitalMax }) => digitalMax),
      column(textFieldWidth, (signal) => signal.prefiltering),
      column(8, ({ samplesPerRecord }) => samplesPerRecord),
      column(32, () => ''),
    ].join(''),
  );
}
