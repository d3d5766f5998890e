import { bandLimits } from '../../parameters/recorder';
import type { BenchSetting } from '../bench-setting';
import { gainAt, measurableHz } from '../sine-response';
import { claimedBy, iec25, signed, type Measured, type Requirement } from './requirement';

/** Frequency that the series is compared with, Hz. */
const referenceHz = 10;

/** The largest deviation from the gain at 10 Hz, in %, and the frequency where it is nearest to its limit. */
function worstDeviation(
  setting: BenchSetting,
  frequencies: readonly number[],
  limits: { below: number; above: number },
): Measured {
  const reference = gainAt(setting, referenceHz);
  const rateHz = setting.recorder.sampleRateHz;
  const deviations = frequencies.map((wantedHz) => {
    const frequencyHz = measurableHz(wantedHz, rateHz);
    const deviation = 100 * (gainAt(setting, frequencyHz) / reference - 1);
    const room = deviation < 0 ? 1 + deviation / limits.below : 1 - deviation / limits.above;
    return { frequencyHz, deviation, room };
  });
  const worst = deviations.reduce((least, one) => (one.room < least.room ? one : least));
  return {
    text: `${signed(worst.deviation, 1)} % at ${Number(worst.frequencyHz.toPrecision(3))} Hz`,
    value: worst.deviation,
    margin: worst.room,
  };
}

const series = [
  { test: 'A', id: 'sine-a', band: '0.67–40 Hz', at: [0.67, 1, 2, 5, 20, 40], below: 10, above: 10 },
  { test: 'B', id: 'sine-b', band: '40–100 Hz', at: [40, 50, 60, 75, 90, 100], below: 30, above: 10 },
  { test: 'C', id: 'sine-c', band: '100–150 Hz', at: [100, 120, 135, 150], below: 30, above: 10 },
  {
    test: 'D',
    id: 'sine-d',
    band: '150–500 Hz',
    at: [150, 180, 220, 270, 320, 380, 430, 480],
    below: Infinity,
    above: 10,
  },
] as const;

const wideOnly = 'declares no diagnostic band';

/** Gain of 0.67 Hz against 10 Hz, dB. */
function loss(setting: BenchSetting, frequencyHz: number): number {
  return 20 * Math.log10(gainAt(setting, frequencyHz) / gainAt(setting, referenceHz));
}

function lossAt067(setting: BenchSetting, most: number): Measured {
  const value = loss(setting, 0.67);
  return { text: `${signed(value, 2)} dB`, value, margin: 1 + value / most };
}

/** Monitoring band: the worse of its two edges. */
function monitorBand(setting: BenchSetting): Measured {
  const edges = [0.67, 40].map((hz) => ({ hz, value: loss(setting, hz) }));
  const worst = edges.reduce((a, b) => (b.value < a.value ? b : a));
  // −3 dB means half of the power: 3.01 dB.
  return {
    text: `${signed(worst.value, 2)} dB at ${worst.hz} Hz`,
    value: worst.value,
    margin: 1 + worst.value / halfPowerDb,
  };
}

const halfPowerDb = 10 * Math.log10(2) + 0.005;
/** Own contract: the band's limits hold within this, dB. */
const edgeToleranceDb = 0.1;

/** How far a setting is from −3.01 dB at the limits that it declares: the worse of the two, dB. */
function declaredEdges(setting: BenchSetting): Measured | null {
  const limits = declaredLimits(setting);
  if (limits.length === 0) return null;
  const middleHz = limits.length === 2 ? Math.sqrt(limits[0] * limits[1]) : limits[0];
  const passed = limits.length === 2 ? analogueGain(setting, middleHz) : 1;
  const off = limits
    .map((hz) => 20 * Math.log10(gainAt(setting, hz) / (gainAt(setting, middleHz) / passed)) + halfPower)
    .reduce((most, one) => (Math.abs(one) > Math.abs(most) ? one : most));
  return {
    text: `${signed(off - halfPower, 2)} dB`,
    value: off - halfPower,
    margin: 1 - Math.abs(off) / edgeToleranceDb,
  };
}

const halfPower = 10 * Math.log10(2);

function declaredLimits(setting: BenchSetting): number[] {
  const limits = bandLimits(setting.recorder.bandwidth);
  if (setting.kind === 'pointSampled' || !limits) return [];
  return [setting.kind === 'zeroPhase' ? setting.lowHz : limits.lowHz, limits.highHz];
}

/** What the middle of a narrow band may lose by the limits' own slopes: first order below, fourth above. */
function analogueGain(setting: BenchSetting, hz: number): number {
  const [lowHz, highHz] = declaredLimits(setting);
  const order = setting.kind === 'zeroPhase' ? 0 : 2;
  const low = order === 0 ? 1 : 1 / Math.sqrt(1 + (lowHz / hz) ** order);
  return low / Math.sqrt(1 + (hz / highHz) ** 8);
}

const aha = {
  text: 'Kligfield et al. 2007, AHA/ACC/HRS recommendations, part I',
  provenance: 'read in a public text',
} as const;

/** −3 dB at the frequency where a limit is wanted, or better. */
function limitRow(row: {
  id: string;
  applied: string;
  frequencyHz: number;
  notClaimed: Requirement['notClaimed'];
}): Requirement {
  return {
    id: row.id,
    applied: row.applied,
    source: aha,
    limit: 'at most 3 dB down',
    unit: 'dB',
    notClaimed: row.notClaimed,
    measure: (setting) => {
      const value = loss(setting, measurableHz(row.frequencyHz, setting.recorder.sampleRateHz));
      return { text: `${signed(value, 2)} dB`, value, margin: 1 + value / halfPowerDb };
    },
  };
}

/** Responses to sines. */
export const sineRequirements: readonly Requirement[] = [
  ...series.map(({ test, id, band, at, below, above }): Requirement => ({
    id,
    applied: `Sines of 1 mV, ${band}, against 10 Hz`,
    source: iec25(`table 201.107, test ${test}`),
    limit: below === Infinity ? `at most +${above} %` : `−${below} to +${above} %`,
    unit: '%',
    notClaimed: claimedBy(['diagnostic'], wideOnly),
    measure: (setting) => worstDeviation(setting, at, { below, above }),
  })),
  {
    id: 'loss-diagnostic',
    applied: 'Sine of 0.67 Hz against 10 Hz, diagnostic use',
    source: {
      text: 'J Electrocardiol 2009, high-pass and ST-segment requirements (abstract)',
      provenance: 'read in a public text',
    },
    limit: 'at most 0.9 dB down',
    unit: 'dB',
    notClaimed: claimedBy(['diagnostic', 'slowWave'], 'its low limit is above 0.05 Hz'),
    measure: (setting) => lossAt067(setting, 0.9),
  },
  {
    id: 'monitor-band',
    applied: 'Sines at the edges of the monitoring band, 0.67 and 40 Hz',
    source: { text: 'IEC 60601-2-27:2011, monitoring band', provenance: 'from memory' },
    limit: 'at most 3 dB down',
    unit: 'dB',
    notClaimed: claimedBy(['diagnostic', 'slowWave', 'monitor'], 'declares no monitoring band'),
    measure: monitorBand,
  },
  limitRow({
    id: 'low-limit',
    applied: 'Sine of 0.05 Hz: the low limit of a running filter',
    frequencyHz: 0.05,
    notClaimed: claimedBy(
      ['diagnostic', 'slowWave'],
      'its low limit is above 0.05 Hz, or it is not a running filter',
    ),
  }),
  limitRow({
    id: 'zero-phase-limit',
    applied: 'Sine of 0.67 Hz: the low limit of a zero-phase filter',
    frequencyHz: 0.67,
    notClaimed: (setting) => (setting.kind === 'zeroPhase' ? null : 'not a zero-phase filter'),
  }),
  limitRow({
    id: 'high-limit-adults',
    applied: 'Sine of 150 Hz: the high limit for adults',
    frequencyHz: 150,
    notClaimed: claimedBy(['diagnostic'], 'declares no diagnostic band'),
  }),
  limitRow({
    id: 'high-limit-children',
    applied: 'Sine of 250 Hz: the high limit for infants and children',
    frequencyHz: 250,
    notClaimed: (setting) =>
      setting.kind === 'recorder' && (bandLimits(setting.recorder.bandwidth)?.highHz ?? 0) >= 250
        ? null
        : 'a band for adults',
  }),
  {
    id: 'declared-edges',
    applied: 'Sines at the two limits that the setting names',
    source: { text: 'What the setting declares of itself', provenance: 'own contract' },
    limit: `−3.01 dB within ${edgeToleranceDb} dB`,
    unit: 'dB',
    notClaimed: (setting) => (declaredLimits(setting).length === 0 ? 'names no limits' : null),
    measure: declaredEdges,
  },
];
