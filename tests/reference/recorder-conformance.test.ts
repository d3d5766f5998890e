import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { gallery, presetParameters } from '../../shared/gallery/gallery';
import type { BenchSetting } from '../../shared/recorder-bench/bench-setting';
import { builtInSettings, recorderWith } from '../../shared/recorder-bench/built-in-settings';
import { fails, measureConformance, requirements } from '../../shared/recorder-bench/conformance';
import { markerRow, markStrip } from '../../shared/recorder-bench/marker-figures';

// Limits from tests/fixtures/bandwidth.json and pacing-pulse.json (BW and PP codes with their sources).

interface Entry {
  id: string;
  value: unknown;
}
function entries(file: string): Entry[] {
  const text = readFileSync(new URL(`../fixtures/${file}`, import.meta.url), 'utf8');
  return (JSON.parse(text) as { entries: Entry[] }).entries;
}
const all = [...entries('bandwidth.json'), ...entries('pacing-pulse.json')];
const limit = <T>(id: string): T => all.find((one) => one.id === id)!.value as T;

const named = [
  builtInSettings.diagnostic,
  builtInSettings.slowWave,
  builtInSettings.monitor,
  builtInSettings.unfiltered,
];
const table = measureConformance(named);
const running = (settings: Parameters<typeof recorderWith>[0]): BenchSetting => ({
  kind: 'recorder',
  recorder: recorderWith(settings),
});
const finding = (id: string, setting: number) => {
  const row = table.rows.find((one) => one.id === id);
  if (!row) throw new Error(`no requirement ${id}`);
  return row.findings[setting];
};
const verdicts = (setting: BenchSetting) =>
  Object.fromEntries(measureConformance([setting]).rows.map(({ id, findings }) => [id, findings[0].verdict]));

describe('the standards table', () => {
  it('every built-in setting meets everything that it claims', () => {
    named.forEach((_, i) => expect(fails(table, i)).toBe(false));
    const claimed = named.map((_, i) => table.rows.filter((row) => row.findings[i].verdict === 'met').length);
    // Diagnostic, slow-wave, monitor, unfiltered: a table in which nothing is claimed would prove nothing.
    expect(claimed).toEqual([24, 14, 9, 3]);
  });

  it.each([
    ['sine-a', 'BW-20'],
    ['sine-b', 'BW-21'],
    ['sine-c', 'BW-22'],
  ])('%s has the limits of %s', (id, code) => {
    const [below, above] = limit<{ deviation: [number, number] }>(code).deviation;
    const { value, margin } = finding(id, 0);
    const share = value! < 0 ? value! / 100 / below : value! / 100 / above;
    expect(margin).toBeCloseTo(1 - share, 9);
  });

  it.each([
    ['pulse-displacement', limit<number>('BW-26')],
    ['pulse-slope', limit<number>('BW-27')],
    ['amplitude', 100 * limit<number>('BW-31')],
    ['noise', limit<number>('BW-32')],
    ['quantiser', limit<{ uV_per_LSB_max: number }>('BW-29').uV_per_LSB_max],
    ['pulse-drift', limit<{ drift_in_10_s_mm_max: number }>('BW-36').drift_in_10_s_mm_max],
    ['offset', 100 * limit<{ amplitude_change_max: number }>('BW-43').amplitude_change_max],
    ['reproduction', 100 * limit<{ error_fraction: number }>('BW-42').error_fraction],
    ['loss-diagnostic', -limit<{ diagnostic_dB: number }>('BW-41').diagnostic_dB],
  ])('%s is judged against %d', (id, most) => {
    const { value, margin } = finding(id, 0);
    expect(margin).toBeCloseTo(1 - Math.abs(value!) / most, 9);
  });

  it('at least so much: sampling rate (BW-29), visible mark (PP-05), recovery (BW-36)', () => {
    const rate = limit<{ samples_per_s_min: number }>('BW-29').samples_per_s_min;
    expect(finding('sampling-rate', 0)).toMatchObject({ value: rate, margin: 0, verdict: 'met' });
    const mark = limit<{ mark_mV_RTI_min: number }>('PP-05').mark_mV_RTI_min;
    expect(finding('stimulus-visible', 0).margin).toBeCloseTo(
      finding('stimulus-visible', 0).value! / mark - 1,
      9,
    );
    expect(finding('pulse-recovery', 0).margin).toBeCloseTo(finding('pulse-recovery', 0).value! / 70 - 1, 9);
  });

  it('2 mV for 0.5 ms leaves what the closed form says, lowest over positions (PP-52)', () => {
    const { min_ratio } = limit<{ min_ratio: number }>('PP-52');
    expect(finding('stimulus-visible', 0).value! / (2 * min_ratio)).toBeGreaterThan(0.97);
    expect(finding('stimulus-visible', 0).value! / (2 * min_ratio)).toBeLessThan(1.01);
  });

  it('a monitor claims no diagnostic band, and that is not the same as meeting it', () => {
    for (const id of ['sine-a', 'pulse-displacement', 'stimulus-visible', 'low-limit']) {
      expect(finding(id, 2)).toMatchObject({ verdict: 'notClaimed' });
      expect(finding(id, 2).margin).toBeLessThan(0);
      expect(finding(id, 2).reason).toMatch(/\w/);
    }
  });

  it('what nobody has read is never judged (BW-24 and the EC11 triangle)', () => {
    for (const id of ['triangle-20', 'triangle-200', 'notch-depth', 'notch-ringing']) {
      const row = measureConformance([...named, builtInSettings.notched]).rows.find((one) => one.id === id);
      expect(row?.limit).toBe('not judged');
      expect(row?.findings.every(({ verdict }) => verdict === 'notClaimed')).toBe(true);
    }
  });

  it('a setting that breaks its claims fails', () => {
    expect(verdicts(builtInSettings.notched)).toMatchObject({ 'sine-b': 'failed', 'sine-a': 'met' });
    expect(verdicts(running({ resolutionUv: 10 }))).toMatchObject({ quantiser: 'failed' });
    expect(verdicts(running({ bandwidth: 'slowWave', mainsNotchHz: 50 }))['pulse-displacement']).toBe(
      'failed',
    );
  });

  it('children need 250 Hz (BW-04): claimed by limits that reach it, and met', () => {
    const wide = running({ bandwidth: { lowHz: 0.05, highHz: 250 }, sampleRateHz: 1000 });
    expect(verdicts(wide)).toMatchObject({ 'high-limit-children': 'met', 'declared-edges': 'met' });
    expect(finding('high-limit-children', 0).verdict).toBe('notClaimed');
  });

  it('a zero-phase low-cut meets the limit that is meant for it (BW-02), and no other', () => {
    const found = verdicts(builtInSettings.zeroPhase);
    expect(found).toMatchObject({ 'zero-phase-limit': 'met', 'low-limit': 'notClaimed' });
  });

  it('every requirement names where it comes from and how that is known', () => {
    for (const { source, applied, limit: words } of requirements) {
      expect(source.text.length).toBeGreaterThan(10);
      expect(source.provenance).toMatch(/read in a public text|from memory|common practice|own contract/);
      expect(applied && words).toBeTruthy();
    }
    expect(new Set(requirements.map(({ id }) => id)).size).toBe(requirements.length);
  });
});

describe('the stimulus marker over the gallery', () => {
  const row = (muscleMv: number) =>
    markerRow(
      muscleMv,
      gallery.map((preset) => markStrip(presetParameters(preset), muscleMv)),
    );

  it('without noise it misses only one of two stimuli given at the same moment', () => {
    const { given, hits, falseMarkers } = row(0);
    const together = gallery
      .map((preset) => markStrip(presetParameters(preset), 0))
      .reduce((sum, one) => sum + one.given - one.hits, 0);
    expect(given).toBeGreaterThan(1000);
    expect(falseMarkers).toBe(0);
    expect(given - hits).toBe(together);
    expect(hits / given).toBeGreaterThan(0.96);
  });

  it('stays right under muscle noise that a reader would still accept, and loses small spikes in more', () => {
    const [some, much] = [row(0.1), row(0.5)];
    expect(some.sensitivityPercent).toBeGreaterThan(96);
    expect(some.positivePredictivePercent).toBeGreaterThan(99);
    expect(much.sensitivityPercent).toBeLessThan(some.sensitivityPercent!);
    expect(much.positivePredictivePercent).toBeGreaterThan(95);
  });
});
