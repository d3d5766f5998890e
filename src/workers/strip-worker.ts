import { z } from 'zod';
import { renderStrip, type StripRecording } from '../../shared/engine/render';
import type { RenderAnswer, RenderJob } from './protocol';

/** Buffers that can be handed over instead of copied. */
function buffersOf(recordings: readonly StripRecording[]): ArrayBuffer[] {
  return recordings.flatMap(({ leads }) => Object.values(leads).map((lead) => lead.buffer as ArrayBuffer));
}

function answer({ id, strips }: RenderJob): RenderAnswer {
  try {
    return { id, ok: true, recordings: strips.map(renderStrip) };
  } catch (error) {
    return { id, ok: false, message: error instanceof Error ? error.message : 'unknown' };
  }
}

// zod must not compile with `new Function` under our content security policy.
z.config({ jitless: true });

self.addEventListener('message', ({ data }: MessageEvent<RenderJob>) => {
  const message = answer(data);
  self.postMessage(message, { transfer: message.ok ? buffersOf(message.recordings) : [] });
});
