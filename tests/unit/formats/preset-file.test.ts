import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { InvalidInputError, problemLine, type Problem } from '../../../shared/errors';
import {
  mostPresetsInFile,
  NewerFileError,
  presetFileVersion,
  readPresetFile,
  writePresetFile,
} from '../../../shared/formats/preset-file';

interface Filed {
  format: unknown;
  fileVersion: unknown;
  strips: Record<string, unknown>[];
}

/** A frozen file, fresh for each test (origin: tests/fixtures/README.md). */
function frozen(version: number): Filed {
  return JSON.parse(readFileSync(`tests/fixtures/preset-file-${version}.json`, 'utf8')) as Filed;
}

function problemsOf(input: unknown): readonly Problem[] {
  try {
    readPresetFile(input);
  } catch (error) {
    if (error instanceof InvalidInputError) return error.problems;
    throw error;
  }
  return [];
}

/** A version-2 file whose second preset is changed. */
function withSecond(change: Record<string, unknown>): Filed {
  const file = frozen(2);
  file.strips[1] = { ...file.strips[1], ...change };
  return file;
}

describe('older files', () => {
  it('of version 1 come upgraded, and say what was filled in', () => {
    const before = frozen(1);
    const file = readPresetFile(before);
    expect(file.fileVersion).toBe(1);
    expect(file.upgrades).toHaveLength(1);
    expect(file.upgrades[0]).toContain('recognised by their content');
    expect(file.strips.map(({ title }) => title)).toEqual(before.strips.map(({ title }) => title));
    for (const [index, strip] of file.strips.entries()) {
      expect(strip).toMatchObject({ presetId: null, engineVersion: '2.0.0', group: null });
      // Parameters that came later are filled in with their defaults.
      expect(strip.parameters).toMatchObject(before.strips[index].parameters as object);
    }
  });

  it('leave a file of the current version as it is, read and written again without a change', () => {
    const text = readFileSync(`tests/fixtures/preset-file-${presetFileVersion}.json`, 'utf8');
    const file = readPresetFile(JSON.parse(text));
    expect(file).toMatchObject({ fileVersion: 2, upgrades: [] });
    expect(file.strips.map(({ presetId, group }) => [presetId, group])).toEqual([
      ['av-sequential-pacing', 'two-chambers'],
      ['tarn-valley-unipolar-ward-story', 'recognise-the-chamber'],
      ['tarn-valley-failing-output-draft', 'capture'],
    ]);
    // Parameters that came later are written with their defaults.
    expect(JSON.parse(writePresetFile(file.strips))).toMatchObject(JSON.parse(text) as object);
  });

  it('of version 1 and 2 hold the same presets once upgraded, but for what version 1 never held', () => {
    const [one, two] = [1, 2].map((version) => readPresetFile(frozen(version)).strips);
    expect(one).toHaveLength(3);
    const common = (strips: typeof one) =>
      strips.map(({ title, teachingPoint, tags, parameters }) => ({
        title,
        teachingPoint,
        tags,
        parameters,
      }));
    expect(common(one)).toEqual(common(two));
  });

  it('of version 1 with a key of a later version are refused, not guessed at', () => {
    const file = frozen(1);
    file.strips[0].presetId = 'av-sequential-pacing';
    const [problem] = problemsOf(file);
    expect(problemLine(problem)).toBe(
      'strip 1, “AV sequential pacing”: presetId: the key with value "av-sequential-pacing" is not allowed; ' +
        'allowed: an object with the keys title, teachingPoint, tags, parameters',
    );
  });
});

describe('newer files', () => {
  it.each([3, 4, 900])('of version %i are refused in a sentence', (fileVersion) => {
    const newer = { format: 'paceloom-presets', fileVersion, strips: [{ anything: 1 }], more: true };
    expect(() => readPresetFile(newer)).toThrow(NewerFileError);
    expect(() => readPresetFile(newer)).toThrow(
      `This file was written by a newer version of the product (file version ${fileVersion}; this one reads up to 2).`,
    );
  });
});

describe('what is wrong with a file', () => {
  const whole: [string, unknown, string, string][] = [
    ['no object', [], '(root)', 'an object with the keys format, fileVersion, strips'],
    ['null', null, '(root)', 'an object with the keys format, fileVersion, strips'],
    ['another format', { ...frozen(2), format: 'something' }, 'format', 'paceloom-presets'],
    ['no version', { ...frozen(2), fileVersion: undefined }, 'fileVersion', '1 to 2'],
    ['version 0', { ...frozen(2), fileVersion: 0 }, 'fileVersion', '1 to 2'],
    ['version 1.5', { ...frozen(2), fileVersion: 1.5 }, 'fileVersion', '1 to 2'],
    ['strips no list', { ...frozen(2), strips: {} }, 'strips', 'a list of 1 to 500 presets'],
    ['no preset', { ...frozen(2), strips: [] }, 'strips', '1 to 500 presets in a file'],
    ['an unknown key', { ...frozen(2), owner: 'x' }, 'owner', 'an object with the keys format'],
  ];
  it.each(whole)('%s is named with what is allowed', (_, input, path, allowed) => {
    const problems = problemsOf(input);
    expect(problems.map((one) => one.path)).toContain(path);
    expect(problems.find((one) => one.path === path)?.allowed).toContain(allowed);
  });

  it('501 presets are one too many', () => {
    const strips = Array.from({ length: mostPresetsInFile + 1 }, (_, i) => ({
      ...frozen(2).strips[0],
      presetId: `preset-${i}`,
    }));
    expect(problemsOf({ ...frozen(2), strips })).toEqual([
      { path: 'strips', value: '501 presets', allowed: '1 to 500 presets in a file' },
    ]);
    expect(problemsOf({ ...frozen(2), strips: strips.slice(1) })).toEqual([]);
  });

  const second = 'strip 2, “The old unipolar system”';
  const singles: [string, Record<string, unknown>, Problem][] = [
    [
      'a rate out of range',
      { parameters: { pacing: { lowerRateBpm: 900 } } },
      { item: second, path: 'parameters.pacing.lowerRateBpm', value: '900', allowed: '20 to 200 /min' },
    ],
    [
      'an unknown parameter',
      { parameters: { pacing: { speed: 3 } } },
      {
        item: second,
        path: 'parameters.pacing.speed',
        value: 'the key with value 3',
        allowed: expect.stringContaining('an object with the keys source, mode') as string,
      },
    ],
    [
      'a title too long',
      { title: 'x'.repeat(121) },
      {
        item: `strip 2, “${'x'.repeat(60)}…”`,
        path: 'title',
        value: `"${'x'.repeat(59)}…`,
        allowed: 'text of at most 120 characters',
      },
    ],
    [
      'no title',
      { title: '  ' },
      { item: 'strip 2', path: 'title', value: '"  "', allowed: '1 to 120 characters' },
    ],
    [
      'thirteen tags',
      { tags: Array.from({ length: 13 }, (_, i) => `t${i}`) },
      { item: second, path: 'tags', value: expect.any(String) as string, allowed: 'at most 12 tags' },
    ],
    [
      'a newer parameter schema',
      { parameters: { schemaVersion: 2 } },
      { item: second, path: 'parameters.schemaVersion', value: '2', allowed: '1' },
    ],
    [
      'an id that is none',
      { presetId: '../etc' },
      {
        item: second,
        path: 'presetId',
        value: '"../etc"',
        allowed: 'small letters, digits and single hyphens, at most 64 characters',
      },
    ],
    [
      'an id twice',
      { presetId: 'av-sequential-pacing' },
      { item: second, path: 'presetId', value: '"av-sequential-pacing"', allowed: 'each id once in a file' },
    ],
  ];
  it.each(singles)('%s is named with its preset, field, value and allowed range', (_, change, expected) => {
    expect(problemsOf(withSecond(change))).toEqual([expected]);
  });

  it('is told of every preset at once', () => {
    const file = withSecond({ title: '' });
    file.strips[2] = { ...file.strips[2], visibility: 'private' };
    expect(problemsOf(file).map(({ item, path }) => [item, path])).toEqual([
      ['strip 2', 'title'],
      ['strip 3, “Assessment draft: output just short”', 'visibility'],
    ]);
  });
});
