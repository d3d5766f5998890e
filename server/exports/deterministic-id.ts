import { createHash } from 'node:crypto';
import type { StripRecording } from '../../shared/engine/render';

/** What an identifier names, so that several of one strip differ. */
export type IdPurpose = 'study' | 'series' | 'instance' | 'document' | 'device' | 'subject';

/**
 * 16 bytes that depend on the strip's parameters, the engine, the start named in the file and the purpose, and on
 * nothing else; laid out as a version 8 UUID (RFC 9562, section 5.8: custom contents).
 */
function idBytes({ parameters, engineVersion }: StripRecording, madeAt: Date, purpose: IdPurpose): Buffer {
  const named = JSON.stringify(['paceloom', purpose, engineVersion, madeAt.toISOString(), parameters]);
  const bytes = createHash('sha256').update(named).digest().subarray(0, 16);
  bytes[6] = (bytes[6] & 0x0f) | 0x80;
  bytes[8] = (bytes[8] & 0x3f) | 0x80;
  return bytes;
}

/** A UUID as text, such as `61d1a24f-b47e-81aa-ae95-f8ac302f4eeb`. */
export function stripUuid(recording: StripRecording, madeAt: Date, purpose: IdPurpose): string {
  const hex = idBytes(recording, madeAt, purpose).toString('hex');
  return hex.replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/u, '$1-$2-$3-$4-$5');
}

/** A DICOM UID: `2.25.` and the UUID as a decimal number (DICOM PS3.5, annex B.2). */
export function stripUid(recording: StripRecording, madeAt: Date, purpose: IdPurpose): string {
  return `2.25.${BigInt(`0x${idBytes(recording, madeAt, purpose).toString('hex')}`)}`;
}
