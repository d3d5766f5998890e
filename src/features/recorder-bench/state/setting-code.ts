import { bandwidthNames } from '../../../../shared/parameters/recorder';
import { readStripParameters } from '../../../../shared/parameters/parse';
import { zeroPhaseLimitsHz, type BenchSetting } from '../../../../shared/recorder-bench/bench-setting';

/**
 * A setting as a short word for the address bar: `monitor`, `0.67to100`, `zero0.67to150`, `sampled`, followed where they
 * are not usual by `-notch50`, `-rate1000`, `-step1`.
 */
export function settingCode(setting: BenchSetting): string {
  const { bandwidth, mainsNotchHz, sampleRateHz, resolutionUv } = setting.recorder;
  const band = typeof bandwidth === 'string' ? bandwidth : `${bandwidth.lowHz}to${bandwidth.highHz}`;
  const kind = { recorder: '', zeroPhase: 'zero', pointSampled: 'sampled' }[setting.kind];
  const low = setting.kind === 'zeroPhase' ? `${setting.lowHz}with` : '';
  return [
    `${kind}${low}${setting.kind === 'pointSampled' ? '' : band}`,
    ...(mainsNotchHz === 0 ? [] : [`notch${mainsNotchHz}`]),
    ...(sampleRateHz === 500 ? [] : [`rate${sampleRateHz}`]),
    ...(resolutionUv === 5 ? [] : [`step${resolutionUv}`]),
  ].join('-');
}

function bandwidthOf(text: string): unknown {
  if (bandwidthNames.some((name) => name === text)) return text;
  const limits = /^([\d.]+)to([\d.]+)$/u.exec(text);
  return limits ? { lowHz: Number(limits[1]), highHz: Number(limits[2]) } : null;
}

function modifier(parts: readonly string[], name: string, usual: number): number {
  const part = parts.find((one) => one.startsWith(name));
  return part ? Number(part.slice(name.length)) : usual;
}

/** Reads a setting's word; null when it is none, or one that the recorder refuses. */
export function readSettingCode(code: string): BenchSetting | null {
  const [first, ...parts] = code.split('-');
  const zero = /^zero([\d.]+)with(.+)$/u.exec(first);
  const sampled = first === 'sampled';
  const bandwidth = sampled ? 'diagnostic' : bandwidthOf(zero ? zero[2] : first);
  if (bandwidth === null) return null;
  const recorder = {
    bandwidth,
    mainsNotchHz: modifier(parts, 'notch', 0),
    sampleRateHz: modifier(parts, 'rate', 500),
    resolutionUv: modifier(parts, 'step', 5),
  };
  const read = readStripParameters({ recorder });
  if (!read.ok) return null;
  if (sampled) return { kind: 'pointSampled', recorder: read.parameters.recorder };
  if (!zero) return { kind: 'recorder', recorder: read.parameters.recorder };
  const lowHz = Number(zero[1]);
  const { min, max } = zeroPhaseLimitsHz;
  if (!(lowHz >= min && lowHz <= max) || bandwidth === 'unfiltered') return null;
  return { kind: 'zeroPhase', lowHz, recorder: read.parameters.recorder };
}
