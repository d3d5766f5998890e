import type { BeatReading } from '../../../../shared/engine/reading/beat-reading';
import { Button } from '../../../components/button';
import { beatWords } from './beat-words';

interface BeatStepperProps {
  beats: readonly BeatReading[];
  chosenBeats: readonly number[];
  onStep(step: -1 | 1): void;
}

function words(beats: readonly BeatReading[], chosen: readonly number[]): string {
  if (beats.length === 0) return 'No ventricular beat and no ventricular stimulus on this strip.';
  if (chosen.length === 0) return 'Walk the beats: arrow keys on the strip, or these buttons.';
  if (chosen.length > 1) return `${chosen.length} beats chosen.`;
  const beat = beats.find((one) => one.number === chosen[0]);
  return beat ? beatWords(beat) : '';
}

/** One beat after another, in words, under the ladder. */
export function BeatStepper({ beats, chosenBeats, onStep }: BeatStepperProps) {
  const one = chosenBeats.length === 1 ? chosenBeats[0] : null;
  return (
    <div className="flex items-center gap-2.5 px-4 pt-1 pb-2.5 tablet:px-6">
      <Button
        small
        aria-label="Previous beat"
        disabled={beats.length === 0 || one === 1}
        onClick={() => onStep(-1)}
      >
        ‹
      </Button>
      <span className="w-16 shrink-0 text-center font-mono text-caption whitespace-nowrap">
        {one === null ? `– of ${beats.length}` : `${one} of ${beats.length}`}
      </span>
      <Button
        small
        aria-label="Next beat"
        disabled={beats.length === 0 || one === beats.length}
        onClick={() => onStep(1)}
      >
        ›
      </Button>
      <p role="status" aria-label="Chosen beat" className="min-w-0 text-dense text-ink-2">
        {words(beats, chosenBeats)}
      </p>
    </div>
  );
}
