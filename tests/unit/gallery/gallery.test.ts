import { describe, expect, it } from 'vitest';
import { InvalidInputError } from '../../../shared/errors';
import { renderStrip } from '../../../shared/engine/render';
import { courseGroups } from '../../../shared/gallery/course';
import { gallery, galleryPreset, presetParameters } from '../../../shared/gallery/gallery';
import type { Reading } from '../../../shared/engine/reading/reading';

const readings = new Map<string, Reading>();
function readingOf(id: string): Reading {
  const known = readings.get(id);
  if (known) return known;
  const { reading } = renderStrip(presetParameters(galleryPreset(id)));
  readings.set(id, reading);
  return reading;
}

describe('gallery', () => {
  it('has unique kebab-case ids, texts, tags and a place in the course', () => {
    expect(new Set(gallery.map((preset) => preset.id)).size).toBe(gallery.length);
    for (const preset of gallery) {
      expect(preset.id).toMatch(/^[a-z0-9]+(-[a-z0-9]+)*$/);
      expect(preset.title.length).toBeGreaterThan(4);
      expect(preset.teachingPoint.length).toBeGreaterThan(40);
      expect(preset.tags.length).toBeGreaterThan(1);
      expect(courseGroups.map((group) => group.id)).toContain(preset.group);
    }
  });

  it('stands in the order of the course', () => {
    const order = gallery.map((preset) => courseGroups.findIndex((group) => group.id === preset.group));
    expect(order).toEqual([...order].sort((a, b) => a - b));
  });

  it('names what there is when asked for what there is not', () => {
    expect(() => galleryPreset('nothing')).toThrow(InvalidInputError);
    expect(() => galleryPreset('nothing')).toThrow(/atrial-pacing/);
  });
});

// What defines each preset, checked on what was rendered and not on its parameters. Widths and axes: the sources
// named in tests/fixtures/heart-model-checks.json.
describe('each preset shows its teaching point', () => {
  it('atrial pacing: narrow conducted beats behind atrial stimuli', () => {
    const reading = readingOf('atrial-pacing');
    expect(reading).toMatchObject({
      pacedChambers: ['atrium'],
      capture: { atrium: 'all' },
      dominantOrigin: 'conducted',
    });
    expect(reading.qrsDurationMs).toBeLessThan(110);
    expect(reading.ventricularRateBpm).toBeCloseTo(70, 0);
  });

  it.each([
    ['ventricular-pacing-apex', 150, 190, -90, -60],
    ['ventricular-pacing-outflow-tract', 125, 170, 60, 110],
    ['ventricular-pacing-septum', 120, 165, -60, 60],
  ])('%s: wide, discordant, with its axis', (id, narrowest, widest, leftmost, rightmost) => {
    const reading = readingOf(id);
    expect(reading).toMatchObject({ pacedChambers: ['rightVentricle'], capture: { rightVentricle: 'all' } });
    expect(reading.qrsDurationMs).toBeGreaterThan(narrowest - 5);
    expect(reading.qrsDurationMs).toBeLessThan(widest);
    expect(reading.frontalAxisDeg).toBeGreaterThan(leftmost);
    expect(reading.frontalAxisDeg).toBeLessThan(rightmost);
    expect(Object.values(reading.qrsTRelation ?? {})).not.toContain('concordant');
  });

  it('His and left bundle area pacing: narrower than from the apex', () => {
    expect(readingOf('his-bundle-pacing').qrsDurationMs).toBeLessThan(110);
    const his = readingOf('his-bundle-pacing');
    // Selective: an isoelectric moment of 35 to 45 ms between spike and QRS.
    expect((his.stimulusToQrsEndMs ?? 0) - (his.qrsDurationMs ?? 0)).toBeGreaterThan(30);
    const apexMs = readingOf('ventricular-pacing-apex').qrsDurationMs ?? 0;
    expect(readingOf('left-bundle-area-pacing').qrsDurationMs).toBeLessThan(apexMs - 40);
  });

  it('AV sequential: both chambers, 180 ms apart', () => {
    expect(readingOf('av-sequential-pacing')).toMatchObject({
      pacedChambers: ['atrium', 'rightVentricle'],
      avIntervalMs: 180,
      capture: { atrium: 'all', rightVentricle: 'all' },
    });
  });

  it('two ventricles: 40 ms apart, or together, and narrower than either alone', () => {
    expect(readingOf('two-ventricles-right-first').interventricularIntervalMs).toBe(40);
    const together = readingOf('two-ventricles-together');
    expect(together.interventricularIntervalMs).toBe(0);
    expect(together.qrsDurationMs).toBeLessThan(readingOf('left-ventricle-alone').qrsDurationMs ?? 0);
    expect(together.qrsDurationMs).toBeLessThan(readingOf('ventricular-pacing-apex').qrsDurationMs ?? 0);
  });

  it('left ventricle alone: right axis, left lead only', () => {
    const reading = readingOf('left-ventricle-alone');
    expect(reading.pacedChambers).toEqual(['leftVentricle']);
    expect(Math.abs(reading.frontalAxisDeg ?? 0)).toBeGreaterThan(90);
  });

  it('spikes over asystole: three chambers stimulated, none captured, no QRS', () => {
    const reading = readingOf('spikes-over-asystole');
    expect(reading.capture).toEqual({ atrium: 'none', rightVentricle: 'none', leftVentricle: 'none' });
    expect(reading.beats.every((beat) => beat.origin === 'none')).toBe(true);
    expect(reading.findings.map((finding) => finding.id)).toContain('asystole');
  });

  it('capture lost: stimuli alone and junctional escapes', () => {
    const reading = readingOf('capture-lost-junctional-escape');
    expect(reading.capture.rightVentricle).toBe('none');
    expect(reading.dominantOrigin).toBe('junctionalEscape');
    const lost = reading.beats.filter((beat) => beat.origin === 'none');
    expect(lost.every((beat) => beat.reasons.includes('belowThreshold'))).toBe(true);
    expect(lost.length).toBeGreaterThan(3);
  });

  it('demand pacing inhibited: no stimulus', () => {
    expect(readingOf('demand-pacing-inhibited')).toMatchObject({ pacedChambers: [], pacedSharePercent: 0 });
  });

  it('monitor against diagnostic: same events, a smaller spike; unipolar: a much larger one', () => {
    const spike = (id: string): number => {
      const { events, leads, sampleRateHz } = renderStrip(presetParameters(galleryPreset(id)));
      const stimulus = events.find((event) => event.type === 'stimulus' && event.timeS > 0.2);
      const at = Math.round((stimulus?.timeS ?? 0) * sampleRateHz);
      const around = leads.II.subarray(at - 3, at + 4);
      return Math.max(...around) - Math.min(...around);
    };
    expect(spike('ventricular-pacing-apex')).toBeGreaterThan(2 * spike('apex-in-monitor-bandwidth'));
    expect(spike('unipolar-spike')).toBeGreaterThan(5 * spike('ventricular-pacing-apex'));
  });
});
