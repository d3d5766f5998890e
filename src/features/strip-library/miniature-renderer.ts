import type { StripRecording } from '../../../shared/engine/render';
import type { StripParameters } from '../../../shared/parameters/strip-parameters';
import { createQueuedRenderer } from '../../workers/strip-renderer';

/** Seconds that a miniature shows. */
export const miniatureS = 6;
const mostKept = 300;

let renderer: ReturnType<typeof createQueuedRenderer> | null = null;
const kept = new Map<string, Promise<StripRecording>>();

/** A strip rendered for a card; each set of parameters once. */
export function renderMiniature(parameters: StripParameters): Promise<StripRecording> {
  const short: StripParameters = { ...parameters, durationS: miniatureS, title: '', notes: '' };
  const key = JSON.stringify(short);
  const known = kept.get(key);
  if (known) return known;
  renderer ??= createQueuedRenderer();
  const made = renderer.render(short);
  kept.set(key, made);
  made.catch(() => kept.delete(key));
  const oldest = kept.keys().next().value;
  if (kept.size > mostKept && oldest !== undefined) kept.delete(oldest);
  return made;
}
