import { Slider } from 'radix-ui';

export interface RulerProps {
  label: string;
  value: number;
  min: number;
  max: number;
  step: number;
  usual?: readonly [number, number];
  /** A related limit: a dotted copper line across the ruler. */
  markerAt?: number;
  describedBy?: string;
  onChange(value: number): void;
  onCommit(): void;
}

const tickCount = 10;

function shareOf(value: number, min: number, max: number): number {
  return Math.max(0, Math.min(1, (value - min) / (max - min)));
}

const percent = (share: number): string => `${(100 * share).toFixed(2)}%`;

/** A slider that is a ruler: hairline, ticks, the usual range as a band, a ring as knob. */
export function Ruler({
  label,
  value,
  min,
  max,
  step,
  usual,
  markerAt,
  describedBy,
  onChange,
  onCommit,
}: RulerProps) {
  const at = (one: number): string => percent(shareOf(one, min, max));
  return (
    <Slider.Root
      value={[value]}
      min={min}
      max={max}
      step={step}
      onValueChange={([next]) => onChange(next)}
      onValueCommit={onCommit}
      className="relative flex h-5 touch-none items-center select-none pointer-coarse:h-11"
    >
      <Slider.Track className="relative h-full grow">
        {usual && (
          <span
            aria-hidden="true"
            className="absolute top-1/2 h-[5px] -translate-y-1/2 bg-usual"
            style={{ left: at(usual[0]), right: percent(1 - shareOf(usual[1], min, max)) }}
          />
        )}
        <span aria-hidden="true" className="absolute inset-x-0 top-1/2 h-px bg-edge" />
        {Array.from({ length: tickCount + 1 }, (_, i) => (
          <span
            key={i}
            aria-hidden="true"
            className={`absolute top-1/2 w-px bg-edge ${i % 5 === 0 ? 'h-2' : 'h-1'}`}
            style={{ left: percent(i / tickCount) }}
          />
        ))}
        {markerAt !== undefined && (
          <span
            aria-hidden="true"
            className="absolute top-0 h-full border-l-2 border-dotted border-copper"
            style={{ left: at(markerAt) }}
          />
        )}
      </Slider.Track>
      <Slider.Thumb
        aria-label={label}
        aria-describedby={describedBy}
        className="block size-[15px] rounded-full border-[2.5px] border-teal bg-sheet"
      />
    </Slider.Root>
  );
}
