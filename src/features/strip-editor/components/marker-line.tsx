import { compareMarkers } from '../../../../shared/engine/recorder/stimulus-detector';
import type { StripRecording } from '../../../../shared/engine/render';
import { timeToPx, type ScreenScale } from '../../../lib/canvas/scale';

/** How the markers compare with the stimuli that were given. */
export function markerWords({ events, stimulusMarkersS }: StripRecording): string | null {
  if (!stimulusMarkersS) return null;
  const given = events.flatMap((event) => (event.type === 'stimulus' ? [event.timeS] : []));
  const { hits, falseMarkers } = compareMarkers(stimulusMarkersS, given);
  const wrong = falseMarkers === 0 ? 'no marker is false' : `${falseMarkers} false`;
  return `Stimulus marker: ${hits} of ${given.length} stimuli found, ${wrong}.`;
}

interface MarkerLineProps {
  recording: StripRecording;
  scale: ScreenScale;
}

/** Where stimuli were found in the signal, as strokes on a line of their own under the trace. */
export function MarkerLine({ recording, scale }: MarkerLineProps) {
  const { stimulusMarkersS } = recording;
  if (!stimulusMarkersS) return null;
  return (
    <div role="img" aria-label={markerWords(recording) ?? ''} className="relative h-5 border-b border-edge">
      <span className="absolute left-2 text-caption leading-5 text-ink-2">Marked</span>
      {stimulusMarkersS.map((timeS) => (
        <span
          key={timeS}
          className="absolute top-1 bottom-0 w-0.5 -translate-x-1/2 bg-ink"
          style={{ left: timeToPx(scale, timeS) }}
        />
      ))}
    </div>
  );
}
