import { useEffect, useMemo, useRef, useState } from 'react';
import type { StripRecording } from '../../../../shared/engine/render';
import type { Bandwidth } from '../../../../shared/parameters/recorder';
import type { StripParameters } from '../../../../shared/parameters/strip-parameters';
import { createStripRenderer, type StripRenderer } from '../../../workers/strip-renderer';

/** What the editor draws: the strip as recorded, at the electrodes, and through another bandwidth. */
export interface Preview {
  recorded: StripRecording;
  electrodes: StripRecording | null;
  compared: StripRecording | null;
}

export type PreviewState =
  | { kind: 'waiting' }
  | { kind: 'ready'; preview: Preview }
  | { kind: 'failed'; message: string; preview: Preview | null };

/** Rate that every named bandwidth can be recorded at. */
const compareRateHz = 500;

function withBandwidth(parameters: StripParameters, bandwidth: Bandwidth): StripParameters {
  const sampleRateHz = Math.max(compareRateHz, parameters.recorder.sampleRateHz) as 500 | 1000 | 2000;
  return { ...parameters, recorder: { ...parameters.recorder, bandwidth, sampleRateHz } };
}

export interface PreviewWish {
  electrodes: boolean;
  compare: Exclude<Bandwidth, object> | null;
}

/**
 * The newest parameters as a preview. Rendering goes on in a worker; while it does, the last preview stays, and of the
 * changes that came meanwhile only the newest is rendered.
 */
export function usePreview(
  parameters: StripParameters,
  { electrodes, compare }: PreviewWish,
): { state: PreviewState; retry: () => void } {
  const renderer = useRef<StripRenderer | null>(null);
  const [state, setState] = useState<PreviewState>({ kind: 'waiting' });
  const [attempt, setAttempt] = useState(0);

  useEffect(() => {
    const made = createStripRenderer();
    renderer.current = made;
    return () => {
      renderer.current = null;
      made.close();
    };
  }, [attempt]);

  const strips = useMemo(() => {
    const wanted = [parameters];
    if (electrodes) wanted.push(withBandwidth(parameters, 'unfiltered'));
    if (compare) wanted.push(withBandwidth(parameters, compare));
    return wanted;
  }, [parameters, electrodes, compare]);

  useEffect(() => {
    renderer.current?.render(strips, (result) => {
      if (!result.ok) {
        setState((last) => ({
          kind: 'failed',
          message: result.message,
          preview: last.kind === 'waiting' ? null : last.preview,
        }));
        return;
      }
      const [recorded, ...others] = result.recordings;
      setState({
        kind: 'ready',
        preview: {
          recorded,
          electrodes: electrodes ? others[0] : null,
          compared: compare ? others[others.length - 1] : null,
        },
      });
    });
  }, [strips, electrodes, compare, attempt]);

  return { state, retry: () => setAttempt((count) => count + 1) };
}
