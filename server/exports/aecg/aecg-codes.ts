import type { CodedEvent } from '../../../shared/formats/coded-events';
import type { Attributes } from './xml-writer';

/** HL7 version 3 (FM-60). */
export const hl7Namespace = 'urn:hl7-org:v3';
export const schemaInstanceNamespace = 'http://www.w3.org/2001/XMLSchema-instance';

/** Code systems: HL7 acts (FM-61), medical device nomenclature (FM-62); CPT-4. */
const systems = {
  act: { codeSystem: '2.16.840.1.113883.5.4', codeSystemName: 'ActCode' },
  mdc: { codeSystem: '2.16.840.1.113883.6.24', codeSystemName: 'MDC' },
  cpt: { codeSystem: '2.16.840.1.113883.6.12', codeSystemName: 'CPT-4' },
} as const;

/** Attributes of a code element. */
export function coded(system: keyof typeof systems, code: string, displayName?: string): Attributes {
  return { code, ...systems[system], ...(displayName ? { displayName } : {}) };
}

/** What an annotation of a kind of event is called; its value holds the exact term. */
export const annotationCodes: Readonly<Record<CodedEvent['kind'], string>> = {
  stimulus: 'MDC_ECG_WAVP',
  ventricles: 'MDC_ECG_BEAT',
  atria: 'MDC_ECG_WAVC',
};
