import type { StripParametersInput } from '../parameters/strip-parameters';
import type { CourseGroupId } from './course';
import type { PresetCriterion } from './criterion';

/** A strip that ships with the product. */
export interface GalleryPreset {
  /** Kebab-case, stable: files and links use it. */
  id: string;
  title: string;
  /** What a learner should see, in one or two sentences. */
  teachingPoint: string;
  tags: readonly string[];
  group: CourseGroupId;
  parameters: StripParametersInput;
  /** What makes the strip what its title says, checked on what is rendered. At least two. */
  criteria: readonly PresetCriterion[];
}
