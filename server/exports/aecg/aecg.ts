import type { StripRecording } from '../../../shared/engine/render';
import type { ExportOptions, ExportResult } from '../../../shared/formats/export-format';
import { educationCaution, syntheticCaution } from '../../../shared/paper/cautions';
import { leadNames } from '../../../shared/parameters/sheet';
import { stripUuid } from '../deterministic-id';
import { coded, hl7Namespace, schemaInstanceNamespace } from './aecg-codes';
import { hl7Time, writeSeries } from './aecg-series';
import { writeXml, type XmlWriter } from './xml-writer';

/** Who the strip is of: nobody. */
function writeSubject(xml: XmlWriter, subjectId: string, trialId: string): void {
  const nested = (names: readonly string[], content: () => void): void => {
    const [name, ...rest] = names;
    xml.element(name, {}, () => (rest.length > 0 ? nested(rest, content) : content()));
  };
  nested(['componentOf', 'timepointEvent', 'componentOf', 'subjectAssignment'], () => {
    nested(['subject', 'trialSubject'], () => {
      xml.element('id', { root: subjectId, extension: 'SYNTHETIC' });
      xml.element('subjectDemographicPerson', {}, () => {
        xml.element('name', {}, syntheticCaution);
      });
    });
    nested(['componentOf', 'clinicalTrial'], () =>
      xml.element('id', { root: trialId, extension: 'none, synthetic' }),
    );
  });
}

function gaps(recording: StripRecording): string[] {
  return leadNames.flatMap((lead) => {
    const count = recording.leads[lead].reduce((sum, value) => sum + (Number.isNaN(value) ? 1 : 0), 0);
    return count > 0 ? [`${lead}: ${count} samples without a value written as 0`] : [];
  });
}

/**
 * A strip as HL7 annotated ECG (R1, 2004): one rhythm series of twelve leads in whole steps of the quantiser (half
 * steps for aVR, aVL and aVF), with every stimulus and depolarization as an annotation. Well-formed XML in the
 * structure of public readers and writers; not checked against the schema, which is not at hand. Events stand at a
 * tenth of a millisecond. Identifiers follow from parameters, engine and `madeAt`.
 */
export function encodeAecg(recording: StripRecording, { madeAt }: ExportOptions): ExportResult {
  const { parameters, leads, sampleRateHz } = recording;
  const title = parameters.title.trim();
  const note = [`${syntheticCaution}. ${educationCaution}`, title].filter((text) => text !== '').join(' ');
  const root = {
    namespace: hl7Namespace,
    name: 'AnnotatedECG',
    attributes: { 'xmlns:xsi': schemaInstanceNamespace, classCode: 'OBS', moodCode: 'EVN' },
  };
  const parts = writeXml(root, (xml) => {
    xml.element('id', { root: stripUuid(recording, madeAt, 'document') });
    xml.element('code', coded('cpt', '93000', 'Electrocardiogram'));
    xml.element('text', {}, note);
    xml.element('effectiveTime', {}, () => {
      xml.element('low', { value: hl7Time(madeAt, 0) });
      xml.element('high', { value: hl7Time(madeAt, leads.I.length / sampleRateHz) });
    });
    writeSubject(xml, stripUuid(recording, madeAt, 'subject'), stripUuid(recording, madeAt, 'study'));
    writeSeries(xml, recording, madeAt, stripUuid(recording, madeAt, 'series'));
  });
  return {
    files: [{ name: 'strip.xml', mediaType: 'application/xml', parts }],
    warnings: gaps(recording),
  };
}
