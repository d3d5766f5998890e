interface ProgressRuleProps {
  label: string;
  /** 0 to 1. */
  share: number;
}

const ticks = Array.from({ length: 11 }, (_, i) => i / 10);

/** Progress as a ruler: a hairline with ticks, filled from the left. */
export function ProgressRule({ label, share }: ProgressRuleProps) {
  const percent = Math.round(100 * share);
  return (
    <div
      role="progressbar"
      aria-label={label}
      aria-valuemin={0}
      aria-valuemax={100}
      aria-valuenow={percent}
      className="relative h-3 w-full"
    >
      <span aria-hidden="true" className="absolute inset-x-0 top-0 h-[3px] bg-rule" />
      <span
        aria-hidden="true"
        className="absolute top-0 left-0 h-[3px] bg-teal transition-[width] duration-150"
        style={{ width: `${percent}%` }}
      />
      {ticks.map((tick) => (
        <span
          key={tick}
          aria-hidden="true"
          className="absolute top-[3px] h-1.5 w-px bg-edge"
          style={{ left: tick === 1 ? 'calc(100% - 1px)' : `${100 * tick}%` }}
        />
      ))}
    </div>
  );
}
