import { thresholdV } from '../../../../shared/engine/rhythm/capture';
import type { PacingLead } from '../../../../shared/parameters/strip-parameters';

/** Plot in SVG units; pulse width on a log scale from 0.05 to 2 ms. */
const size = { width: 320, height: 180, left: 34, bottom: 28, top: 10, right: 10 };
const widths = { min: 0.05, max: 2 };
const widthTicks = [0.1, 0.2, 0.4, 1, 2];

function xOf(widthMs: number): number {
  const share = Math.log(widthMs / widths.min) / Math.log(widths.max / widths.min);
  return size.left + share * (size.width - size.left - size.right);
}

/** Volts against pulse width: above the curve a stimulus captures rested muscle, below it does not. */
export function StrengthDuration({ lead }: { lead: PacingLead }) {
  const topV = Math.max(2, Math.ceil(1.3 * Math.max(lead.amplitudeV, lead.captureThresholdV)));
  const yOf = (volts: number): number =>
    size.top + (1 - Math.min(topV, volts) / topV) * (size.height - size.top - size.bottom);
  const steps = Array.from({ length: 41 }, (_, i) => widths.min * (widths.max / widths.min) ** (i / 40));
  const curve = steps.map(
    (width) => `${xOf(width).toFixed(1)},${yOf(thresholdV(lead.captureThresholdV, width)).toFixed(1)}`,
  );
  const threshold = thresholdV(lead.captureThresholdV, lead.pulseWidthMs);
  const margin = lead.amplitudeV - threshold;
  const words = `${lead.amplitudeV.toFixed(2)} V at ${lead.pulseWidthMs} ms is ${Math.abs(margin).toFixed(2)} V ${margin >= 0 ? 'above' : 'below'} the threshold: it ${margin >= 0 ? 'captures' : 'does not capture'}.`;
  return (
    <figure className="min-w-0">
      <figcaption className="flex justify-between text-dense">
        <span className="font-medium">Strength and duration</span>
        <span className="text-ink-3">volts against ms</span>
      </figcaption>
      <svg
        viewBox={`0 0 ${size.width} ${size.height}`}
        role="img"
        aria-label={words}
        className="mt-1 w-full max-w-md"
      >
        <polygon
          points={`${curve.join(' ')} ${xOf(widths.max)},${size.top} ${xOf(widths.min)},${size.top}`}
          className="fill-teal-tint"
        />
        {[0, topV / 2, topV].map((volts) => (
          <g key={volts}>
            <line
              x1={size.left}
              x2={size.width - size.right}
              y1={yOf(volts)}
              y2={yOf(volts)}
              className="stroke-rule"
            />
            <text
              x={size.left - 6}
              y={yOf(volts) + 4}
              textAnchor="end"
              className="fill-ink-2 font-mono text-[12px]"
            >
              {volts}
            </text>
          </g>
        ))}
        {widthTicks.map((width) => (
          <text
            key={width}
            x={xOf(width)}
            y={size.height - 8}
            textAnchor="middle"
            className="fill-ink-2 font-mono text-[12px]"
          >
            {width}
          </text>
        ))}
        <polyline points={curve.join(' ')} fill="none" strokeWidth={1.8} className="stroke-ink" />
        <line
          x1={xOf(lead.pulseWidthMs)}
          x2={xOf(lead.pulseWidthMs)}
          y1={yOf(lead.amplitudeV)}
          y2={yOf(0)}
          strokeDasharray="2 3"
          className="stroke-copper"
        />
        <circle
          cx={xOf(lead.pulseWidthMs)}
          cy={yOf(lead.amplitudeV)}
          r={5}
          strokeWidth={2}
          className={margin >= 0 ? 'fill-copper stroke-copper' : 'fill-sheet stroke-copper'}
        />
      </svg>
      <p className="text-dense text-ink-2">{words}</p>
    </figure>
  );
}
