import { z } from 'zod';
import type { Problem } from '../errors';
import { problemsOf } from '../parameters/parse';

/** A preset of a file as some version wrote it; values are judged only once it is in the current layout. */
type Layout = Record<string, unknown>;

/** A step from one version of the file to the next. Frozen once released: files of its version do not change any more. */
interface Upgrade {
  /** What a preset of that version holds; other keys are refused. */
  keys: z.ZodType<Layout>;
  upgrade(strip: Layout): Layout;
  /** What it fills in, in a sentence for people. */
  words: string;
}

/** Files of version 1 were written by this engine alone. */
const engineOfVersion1 = '2.0.0';

const from1: Upgrade = {
  keys: z.strictObject({
    title: z.unknown(),
    teachingPoint: z.unknown(),
    tags: z.unknown(),
    parameters: z.unknown(),
  }),
  upgrade: (strip) => ({ presetId: null, engineVersion: engineOfVersion1, group: null, ...strip }),
  words: `File version 1 names no id, engine or place in the course: presets are recognised by their content, count as saved with engine ${engineOfVersion1} and stand outside the course.`,
};

/** Step by the version it starts from. */
const upgrades: Readonly<Record<number, Upgrade>> = { 1: from1 };

export type UpgradeResult = { ok: true; strip: unknown } | { ok: false; problems: Problem[] };

/** Versions from `version` on that have to be left behind to reach `target`. */
function versionsBetween(version: number, target: number): number[] {
  return Array.from({ length: Math.max(0, target - version) }, (_, i) => version + i);
}

/** A preset brought from a file's version to `target`, one step after another; or what it may not hold. */
export function upgradePreset(strip: unknown, version: number, target: number): UpgradeResult {
  let current = strip;
  for (const from of versionsBetween(version, target)) {
    const { keys, upgrade } = upgrades[from];
    const layout = keys.safeParse(current);
    if (!layout.success) return { ok: false, problems: problemsOf(keys, current, layout.error) };
    current = upgrade(layout.data);
  }
  return { ok: true, strip: current };
}

/** What upgrading from a version fills in, a sentence for each step. */
export function upgradeWords(version: number, target: number): string[] {
  return versionsBetween(version, target).map((from) => upgrades[from].words);
}
