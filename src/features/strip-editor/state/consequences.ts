import { isTemporary, usualMode } from '../../../../shared/parameters/pacing';
import { pacesBothVentricles, temporaryModes } from '../../../../shared/parameters/pacing-mode';
import { usualAtrialRateBpm } from '../../../../shared/parameters/patient';
import type { PacingParameters, StripParameters } from '../../../../shared/parameters/strip-parameters';

/** Both ventricles exactly when the mode has the fifth letter V. */
function chambersFor({ mode, ventricularChambers }: PacingParameters): 'right' | 'left' | 'both' {
  if (pacesBothVentricles(mode)) return 'both';
  return ventricularChambers === 'both' ? 'right' : ventricularChambers;
}

function afterMode(parameters: StripParameters): StripParameters {
  const { pacing } = parameters;
  return { ...parameters, pacing: { ...pacing, ventricularChambers: chambersFor(pacing) } };
}

/** A source that cannot have the mode gets its usual one. */
function afterSource(parameters: StripParameters): StripParameters {
  const { pacing } = parameters;
  const fits = !isTemporary(pacing.source) || temporaryModes.includes(pacing.mode);
  const mode = fits ? pacing.mode : usualMode(pacing.source);
  return afterMode({ ...parameters, pacing: { ...pacing, mode } });
}

/** A rhythm brings its usual rate: a flutter at 70 /min is none. */
function afterAtrialRhythm(parameters: StripParameters): StripParameters {
  const { patient } = parameters;
  return { ...parameters, patient: { ...patient, atrialRateBpm: usualAtrialRateBpm[patient.atrialRhythm] } };
}

/** The left lead never senses. */
function afterFaultKind(parameters: StripParameters): StripParameters {
  const { pacing } = parameters;
  const faults = pacing.faults.map((fault) =>
    fault.kind.endsWith('sensing') && fault.chamber === 'leftVentricle'
      ? { ...fault, chamber: 'rightVentricle' as const }
      : fault,
  );
  return { ...parameters, pacing: { ...pacing, faults } };
}

/** What must change along with one parameter, so that a choice that makes sense is not refused. */
export function withConsequences(parameters: StripParameters, changed: string): StripParameters {
  if (changed === 'pacing.mode') return afterMode(parameters);
  if (changed === 'pacing.source') return afterSource(parameters);
  if (changed === 'patient.atrialRhythm') return afterAtrialRhythm(parameters);
  if (/^pacing\.faults\.\d+\.kind$/u.test(changed)) return afterFaultKind(parameters);
  return parameters;
}
