import { createHash } from 'node:crypto';
import { courseGroupIdSchema } from '../../../shared/api/strips';
import type { FiledPreset } from '../../../shared/formats/preset-file';
import type { StripRecord } from '../../models/strip-records';
import { readKeptParameters } from '../strips/kept-parameters';

/** The content of a strip: what is taught, and everything that decides its samples. */
export type PresetContent = Pick<FiledPreset, 'title' | 'teachingPoint' | 'tags' | 'group' | 'parameters'>;

/** The group, if the course has it. */
export function knownGroup(group: string | null): string | null {
  const known = courseGroupIdSchema.safeParse(group);
  return known.success ? known.data : null;
}

/** A saved strip's content; its title is also that of its parameters. */
export function contentOfStrip(strip: StripRecord): PresetContent {
  const { title, teachingPoint, tags, groupId } = strip;
  const parameters = { ...readKeptParameters(strip), title };
  return { title, teachingPoint, tags, group: knownGroup(groupId), parameters };
}

/** JSON whose keys are in order, so that equal content is equal text. */
function sortedJson(value: unknown): string {
  return JSON.stringify(value, (_, one: unknown) => {
    if (typeof one !== 'object' || one === null || Array.isArray(one)) return one;
    return Object.fromEntries(Object.entries(one).sort(([a], [b]) => (a < b ? -1 : 1)));
  });
}

/** SHA-256 of a content; two presets are the same when it is. */
export function contentStamp({ title, teachingPoint, tags, group, parameters }: PresetContent): string {
  const content = { title, teachingPoint, tags, group, parameters };
  return createHash('sha256').update(sortedJson(content)).digest('hex');
}
