import type { AtrialLead, PatientParameters, StripParameters } from '../../parameters/strip-parameters';
import { msPerMinute, msPerS } from '../../units';
import type { AtrialDepolarization, DepolarizationEvent, VentricularDepolarization } from '../events';
import { activationPattern, type VentricularSource } from '../heart/activation-pattern';
import { atrialLoop, type AtrialSite } from '../heart/atrial-loop';
import type { Injury } from '../heart/injury';
import { fibrillationLoop, flutterLoop } from '../heart/atrial-waves';
import { rateFactorForQt, ventricularLoop, type VentricularLoop } from '../heart/ventricular-loop';
import { randomStream } from '../random';
import type { SampledVector } from './wave-painter';

/** Model site of each place an atrial lead can sit (engine contract). */
const atrialSiteOfLead: Record<AtrialLead['site'], AtrialSite> = {
  appendage: 'raa',
  septum: 'bachmann',
  lateral: 'raLateral',
};

/** RR before the first two beats have shown one, s. */
const firstRrS = 1;
/** RR outside these limits no longer moves the QT target, s (the Framingham line is not meant for them). */
const rrLimitsS = { min: 0.3, max: 2 };
/** The QT follows the rate with a lag; each beat moves it by this share of the way (chosen). */
const qtFollowsRate = 0.125;
/** QT targets are stepped, so that beats of nearly the same rate share one loop, ms. */
const qtStepMs = 5;

/**
 * QT of a conducted beat at a rate, by the Framingham line QT = QTc − 154 (1 − RR)
 * (Sagie et al. 1992, Am J Cardiol 70:797; formula from memory).
 */
function targetQtMs(qtcMs: number, rrS: number): number {
  return Math.round((qtcMs - 154 * (1 - rrS)) / qtStepMs) * qtStepMs;
}

/** The model's injury; none without a territory or a deviation. */
function injuryOf({ territory, stElevationMv }: PatientParameters['injury']): Injury | null {
  return territory === 'none' || stElevationMv === 0 ? null : { territory, stElevationMv };
}

/** A depolarization's wave, from its event on. */
export type HeartWave =
  | { chamber: 'atrium'; event: AtrialDepolarization; wave: SampledVector }
  | { chamber: 'ventricle'; event: VentricularDepolarization; wave: VentricularLoop };

/** Turns depolarizations into waves of the heart vector; keeps the recent rate, because QT follows it. */
export interface HeartWaves {
  /** The wave of the next depolarization; call in time order. */
  waveOf(event: DepolarizationEvent): HeartWave;
}

/** Starts at rest, with an RR of 1 s. */
export function createHeartWaves(
  parameters: Pick<StripParameters, 'seed' | 'patient' | 'pacing' | 'waveform'>,
): HeartWaves {
  const { patient, pacing, waveform } = parameters;
  const fibrillation = randomStream(parameters.seed, 'fibrillationWaves');
  let followedRrS = firstRrS;
  let lastOnsetS: number | null = null;

  const followRate = (onsetS: number): void => {
    if (lastOnsetS !== null) {
      const rrS = Math.min(rrLimitsS.max, Math.max(rrLimitsS.min, onsetS - lastOnsetS));
      followedRrS += qtFollowsRate * (rrS - followedRrS);
    }
    lastOnsetS = onsetS;
  };

  const ventricularSources = (event: VentricularDepolarization): VentricularSource[] =>
    event.sources.map((source): VentricularSource => {
      const timeMs = (source.timeS - event.timeS) * msPerS;
      switch (source.site) {
        case 'rightVentricle':
          return {
            kind: 'rightVentricle',
            site: pacing.rightVentricularLead.site,
            hisCapture: pacing.hisCapture,
            timeMs,
          };
        case 'leftVentricle':
          return { kind: 'leftVentricle', site: pacing.leftVentricularLead.site, timeMs };
        default:
          return { kind: source.site, timeMs };
      }
    });

  const ventricularWave = (event: VentricularDepolarization): VentricularLoop => {
    followRate(event.timeS);
    const pattern = activationPattern(ventricularSources(event), patient.bundleBranchBlock);
    return ventricularLoop(pattern, {
      rateFactor: rateFactorForQt(targetQtMs(waveform.qtcMs, followedRrS)),
      qrsDurationMs: waveform.qrsDurationMs,
      qrsScale: waveform.qrsScale,
      axisRotationDeg: waveform.axisRotationDeg,
      tScale: waveform.tScale,
      injury: injuryOf(patient.injury),
    });
  };

  const atrialWave = (event: AtrialDepolarization): SampledVector => {
    const cycleMs = msPerMinute / patient.atrialRateBpm;
    switch (event.origin) {
      case 'paced':
        return atrialLoop(atrialSiteOfLead[pacing.atrialLead.site], waveform);
      case 'premature':
        return atrialLoop('lowAtrial', waveform);
      case 'retrograde':
        return atrialLoop('retrograde', waveform);
      case 'flutter':
        return flutterLoop(cycleMs, waveform.pAmplitudeMv);
      case 'fibrillation': {
        const draw = (): number => fibrillation.uniform();
        return fibrillationLoop(cycleMs, waveform.pAmplitudeMv, [draw(), draw(), draw(), draw()]);
      }
      case 'sinus':
      case 'tachycardia':
        return atrialLoop('sinus', waveform);
    }
  };

  return {
    waveOf(event) {
      if (event.chamber === 'ventricle') {
        return { chamber: 'ventricle', event, wave: ventricularWave(event) };
      }
      return { chamber: 'atrium', event, wave: atrialWave(event) };
    },
  };
}
