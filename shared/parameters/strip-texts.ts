import { z } from 'zod';
import { stripParametersSchema } from './strip-parameters';
import { foldText, isPlainText, plainText, plainTextRule, requiredText } from './text';

/** What is kept beside a strip's parameters: the same rules wherever it is typed, sent or read from a file. */

export const mostTags = 12;
export const longestTag = 40;

export const titleSchema = requiredText({
  label: 'Title',
  maxLength: 120,
  help: 'Shown on the sheet and in the library.',
});
export const teachingPointSchema = plainText({
  label: 'Teaching point',
  maxLength: 500,
  help: 'What a learner should see, in one or two sentences.',
});
export const tagSchema = requiredText({ label: 'Tag', maxLength: longestTag, help: 'A word or two.' });
export const tagsSchema = z
  .array(tagSchema)
  .refine((tags) => tags.length <= mostTags, {
    params: { allowed: `at most ${mostTags} tags` },
    message: 'names too many tags',
  })
  .refine((tags) => new Set(tags.map(foldText)).size === tags.length, {
    params: { allowed: 'each tag at most once, whatever its case and accents' },
    message: 'names a tag twice',
  });

/** Parameters of a strip that is kept; its notes may hold no control characters (its title is the strip's). */
export const keptParametersSchema = stripParametersSchema.refine(({ notes }) => isPlainText(notes), {
  path: ['notes'],
  ...plainTextRule,
});
