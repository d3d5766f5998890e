import type { StripRecording } from '../../shared/engine/render';
import type { StripParameters } from '../../shared/parameters/strip-parameters';

/** Strips to render together; they come back together, in the same order. */
export interface RenderJob {
  id: number;
  strips: StripParameters[];
}

export type RenderAnswer =
  { id: number; ok: true; recordings: StripRecording[] } | { id: number; ok: false; message: string };
