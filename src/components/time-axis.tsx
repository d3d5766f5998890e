import { timeToPx, type ScreenScale } from '../lib/canvas/scale';

/** Seconds under a trace, on its own time axis. */
export function TimeAxis({ scale, durationS }: { scale: ScreenScale; durationS: number }) {
  const ticks = Array.from({ length: Math.floor(durationS) + 1 }, (_, second) => second);
  return (
    <div className="relative h-6 text-ink-2" aria-hidden="true">
      {ticks.map((second) => (
        <span
          key={second}
          className="absolute top-0 flex -translate-x-1/2 flex-col items-center font-mono text-caption leading-4"
          style={{ left: timeToPx(scale, second) }}
        >
          <span className="h-1.5 w-px bg-edge" />
          {second === durationS ? `${second} s` : second}
        </span>
      ))}
    </div>
  );
}
