import type { StripRecording } from '../../../shared/engine/render';
import { codedEvents, type CodedEvent } from '../../../shared/formats/coded-events';
import { leadTerms } from '../../../shared/formats/mdc-codes';
import { exactStepUv } from '../../../shared/formats/sixteen-bit';
import { utcText } from '../../../shared/formats/utc';
import { bandLimits } from '../../../shared/parameters/recorder';
import { leadNames, type LeadName } from '../../../shared/parameters/sheet';
import type { RecorderParameters } from '../../../shared/parameters/strip-parameters';
import { msPerS, uvPerMv } from '../../../shared/units';
import { annotationCodes, coded } from './aecg-codes';
import type { XmlWriter } from './xml-writer';

/** Fraction digits of an HL7 time stamp (TS): a tenth of a millisecond. */
const fractionDigits = 4;
/** Significant digits of a step or an interval. */
const significantDigits = 10;

function decimal(value: number): string {
  return String(Number(value.toPrecision(significantDigits)));
}

/** The moment `timeS` after the start as an HL7 time stamp, YYYYMMDDHHMMSS.UUUU. */
export function hl7Time(madeAt: Date, timeS: number): string {
  const ticksPerS = 10 ** fractionDigits;
  const ticks = Math.round(timeS * ticksPerS);
  const wholeS = Math.floor(ticks / ticksPerS);
  // Whole seconds by the calendar; the start itself is taken to whole seconds.
  const startMs = Math.floor(madeAt.getTime() / msPerS) * msPerS;
  const { year, month, day, hours, minutes, seconds } = utcText(new Date(startMs + wholeS * msPerS));
  const fraction = String(ticks - wholeS * ticksPerS).padStart(fractionDigits, '0');
  return `${year}${month}${day}${hours}${minutes}${seconds}.${fraction}`;
}

/** Samples as whole steps, parted by spaces; a gap (NaN) is 0. */
function digits(samplesMv: Float32Array, stepUv: number): string {
  const steps = new Array<number>(samplesMv.length);
  // Adding 0 turns −0 into 0; NaN is falsy.
  for (let i = 0; i < steps.length; i++) steps[i] = Math.round((samplesMv[i] * uvPerMv) / stepUv) + 0 || 0;
  return steps.join(' ');
}

function component(xml: XmlWriter, name: string, content: () => void): void {
  xml.element('component', {}, () => xml.element(name, {}, content));
}

function writeFilter(xml: XmlWriter, filter: string, frequency: string, valueHz: number): void {
  xml.element('controlVariable', {}, () =>
    xml.element('controlVariable', {}, () => {
      xml.element('code', coded('mdc', filter));
      component(xml, 'controlVariable', () => {
        xml.element('code', coded('mdc', frequency));
        xml.element('value', { 'xsi:type': 'PQ', value: decimal(valueHz), unit: 'Hz' });
      });
    }),
  );
}

function writeFilters(xml: XmlWriter, { bandwidth, mainsNotchHz }: RecorderParameters): void {
  const prefix = 'MDC_ECG_CTL_VBL_ATTR_FILTER';
  const limits = bandLimits(bandwidth);
  if (limits) {
    writeFilter(xml, `${prefix}_LOW_PASS`, `${prefix}_CUTOFF_FREQ`, limits.highHz);
    writeFilter(xml, `${prefix}_HIGH_PASS`, `${prefix}_CUTOFF_FREQ`, limits.lowHz);
  }
  if (mainsNotchHz !== 0) writeFilter(xml, `${prefix}_NOTCH`, `${prefix}_NOTCH_FREQ`, mainsNotchHz);
}

function writeLead(xml: XmlWriter, recording: StripRecording, lead: LeadName): void {
  const stepUv = exactStepUv(lead, recording.resolutionUv);
  component(xml, 'sequence', () => {
    xml.element('code', coded('mdc', leadTerms[lead].name));
    xml.element('value', { 'xsi:type': 'SLIST_PQ' }, () => {
      xml.element('origin', { value: '0', unit: 'uV' });
      xml.element('scale', { value: decimal(stepUv), unit: 'uV' });
      xml.element('digits', {}, digits(recording.leads[lead], stepUv));
    });
  });
}

/** The samples: a time sequence (FM-61), then a sequence a lead (FM-62). */
function writeSequences(xml: XmlWriter, recording: StripRecording, madeAt: Date): void {
  component(xml, 'sequenceSet', () => {
    component(xml, 'sequence', () => {
      xml.element('code', coded('act', 'TIME_ABSOLUTE'));
      xml.element('value', { 'xsi:type': 'GLIST_TS' }, () => {
        xml.element('head', { value: hl7Time(madeAt, 0) });
        xml.element('increment', { value: decimal(1 / recording.sampleRateHz), unit: 's' });
      });
    });
    for (const lead of leadNames) writeLead(xml, recording, lead);
  });
}

/** An event: its term as the value, its words as original text, its time as the boundary of a region of interest. */
function writeAnnotation(xml: XmlWriter, { kind, term, words, timeS }: CodedEvent, madeAt: Date): void {
  component(xml, 'annotation', () => {
    xml.element('code', coded('mdc', annotationCodes[kind]));
    xml.element('value', { 'xsi:type': 'CE', ...coded('mdc', term.name, term.meaning) }, () =>
      xml.element('originalText', {}, words),
    );
    xml.element('support', {}, () =>
      xml.element('supportingROI', { classCode: 'ROIBND' }, () => {
        xml.element('code', coded('act', 'ROIPS'));
        component(xml, 'boundary', () => {
          xml.element('code', coded('act', 'TIME_ABSOLUTE'));
          xml.element('value', { 'xsi:type': 'IVL_TS' }, () =>
            xml.element('low', { value: hl7Time(madeAt, timeS) }),
          );
        });
      }),
    );
  });
}

/** The one series of a strip: time, maker, filters, samples, annotations. */
export function writeSeries(xml: XmlWriter, recording: StripRecording, madeAt: Date, id: string): void {
  const { events, parameters, engineVersion, leads, sampleRateHz } = recording;
  component(xml, 'series', () => {
    xml.element('id', { root: id });
    xml.element('code', coded('act', 'RHYTHM', 'Rhythm Waveforms'));
    xml.element('effectiveTime', {}, () => {
      xml.element('low', { value: hl7Time(madeAt, 0) });
      xml.element('high', { value: hl7Time(madeAt, leads.I.length / sampleRateHz) });
    });
    xml.element('author', {}, () =>
      xml.element('seriesAuthor', {}, () => {
        xml.element('manufacturedSeriesDevice', {}, () => {
          xml.element('manufacturerModelName', {}, 'Synthetic strip');
          xml.element('softwareName', {}, `Paceloom, engine ${engineVersion}, seed ${parameters.seed}`);
        });
      }),
    );
    writeFilters(xml, parameters.recorder);
    writeSequences(xml, recording, madeAt);
    xml.element('subjectOf', {}, () =>
      xml.element('annotationSet', {}, () => {
        xml.element('activityTime', { value: hl7Time(madeAt, 0) });
        for (const event of codedEvents(events, parameters)) writeAnnotation(xml, event, madeAt);
      }),
    );
  });
}
