import { describe, expect, it } from 'vitest';
import { InvalidInputError } from '../../../shared/errors';
import { renderStrip, type StripRecording } from '../../../shared/engine/render';
import { courseGroups } from '../../../shared/gallery/course';
import { gallery, galleryPreset, presetParameters } from '../../../shared/gallery/gallery';
import { judgeCriterion, measureStrip } from '../../../shared/gallery/measure-strip';
import { sources } from '../../../shared/gallery/sources';
import type { Reading } from '../../../shared/engine/reading/reading';

const recordings = new Map<string, StripRecording>();
function recordingOf(id: string): StripRecording {
  const known = recordings.get(id);
  if (known) return known;
  const recording = renderStrip(presetParameters(galleryPreset(id)));
  recordings.set(id, recording);
  return recording;
}
const readingOf = (id: string): Reading => recordingOf(id).reading;

describe('gallery', () => {
  it('has at least sixty presets, some in every group of the course', () => {
    expect(gallery.length).toBeGreaterThanOrEqual(60);
    for (const { id } of courseGroups) {
      expect(gallery.filter((preset) => preset.group === id).length).toBeGreaterThanOrEqual(5);
    }
  });

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

// What defines each preset is data that stands beside it, with its source; it is checked on what was rendered.
describe('each preset meets what defines it', () => {
  it.each(gallery.map((preset) => [preset.id, preset] as const))('%s', (id, preset) => {
    expect(preset.criteria.length).toBeGreaterThan(1);
    const recording = recordingOf(id);
    for (const criterion of preset.criteria) {
      expect(Object.values(sources)).toContain(criterion.source);
      const { value, met } = judgeCriterion(recording, criterion);
      expect(met, `${criterion.measure} is ${value}, wanted ${criterion.min} to ${criterion.max}`).toBe(true);
    }
  });

  it('and none of them would pass as plain sinus rhythm', () => {
    const sinus = recordingOf('sinus-rhythm');
    // Silence of the device is what these two teach: their own strip has no stimulus either.
    const silent = ['sinus-rhythm', 'dual-chamber-inhibited', 'demand-pacing-inhibited'];
    for (const { id, criteria } of gallery) {
      if (silent.includes(id)) continue;
      expect(
        criteria.some((criterion) => !judgeCriterion(sinus, criterion).met),
        id,
      ).toBe(true);
    }
  });
});

describe('presets beside each other', () => {
  it('conduction system pacing is narrower than from the apex', () => {
    const apexMs = readingOf('ventricular-pacing-apex').qrsDurationMs ?? 0;
    expect(readingOf('his-bundle-pacing').qrsDurationMs).toBeLessThan(apexMs - 40);
    expect(readingOf('left-bundle-area-pacing').qrsDurationMs).toBeLessThan(apexMs - 40);
  });

  it('two ventricles together are narrower than either alone', () => {
    const together = readingOf('two-ventricles-together').qrsDurationMs ?? Infinity;
    expect(together).toBeLessThan(readingOf('left-ventricle-alone').qrsDurationMs ?? 0);
    expect(together).toBeLessThan(readingOf('ventricular-pacing-apex').qrsDurationMs ?? 0);
  });

  it('a monitor keeps less of a spike than a diagnostic recorder, and a unipolar spike is much larger', () => {
    const spike = (id: string): number => measureStrip(recordingOf(id), 'spike.II') ?? 0;
    expect(spike('ventricular-pacing-apex')).toBeGreaterThan(2 * spike('apex-in-monitor-bandwidth'));
    expect(spike('unipolar-spike')).toBeGreaterThan(5 * spike('ventricular-pacing-apex'));
    expect(spike('apex-at-the-electrodes')).toBeGreaterThan(4 * spike('ventricular-pacing-apex'));
  });

  it('an asystole with spikes is called so', () => {
    const { findings, beats } = readingOf('spikes-over-asystole');
    expect(beats.every((beat) => beat.origin === 'none')).toBe(true);
    expect(findings.map((finding) => finding.id)).toContain('asystole');
  });

  it('safety pacing answers the crosstalk that otherwise leaves asystole', () => {
    expect(readingOf('crosstalk-inhibition').ventricularRateBpm).toBeNull();
    expect(readingOf('safety-pacing').capture.rightVentricle).toBe('all');
  });
});
