import { useEffect, useRef, useState } from 'react';
import type { StripRecording } from '../../../shared/engine/render';
import { gridColours } from '../../../shared/paper/tokens';
import type { LeadName } from '../../../shared/parameters/sheet';
import type { StripParameters } from '../../../shared/parameters/strip-parameters';
import { miniatureS, renderMiniature } from './miniature-renderer';

/** Drawn in a box of 360 × 100 at 25 mm/s and 10 mm/mV, 2.4 units a mm. */
const box = { width: 360, height: 100 };
const unitsPerMm = box.width / (miniatureS * 25);
const unitsPerMv = 10 * unitsPerMm;

function useSeen(): [React.RefObject<HTMLDivElement | null>, boolean] {
  const element = useRef<HTMLDivElement>(null);
  const [seen, setSeen] = useState(false);
  useEffect(() => {
    if (!element.current || seen) return;
    const observer = new IntersectionObserver(
      (entries) => setSeen(entries.some((entry) => entry.isIntersecting)),
      {
        rootMargin: '200px',
      },
    );
    observer.observe(element.current);
    return () => observer.disconnect();
  }, [seen]);
  return [element, seen];
}

/** The baseline moves so that the trace stands in the middle of its box. */
function baselineOf(samples: Float32Array): number {
  let up = 0;
  let down = 0;
  for (const value of samples) {
    up = Math.max(up, value);
    down = Math.min(down, value);
  }
  return box.height / 2 + ((up + down) / 2) * unitsPerMv;
}

function tracePath(recording: StripRecording, lead: LeadName, baseline: number): string {
  const samples = recording.leads[lead];
  const step = box.width / (miniatureS * recording.sampleRateHz);
  let path = '';
  for (let i = 0; i < samples.length; i++) {
    path += `${i === 0 ? 'M' : 'L'}${(i * step).toFixed(1)} ${(baseline - samples[i] * unitsPerMv).toFixed(1)}`;
  }
  return path;
}

function StimulusLine({ recording }: { recording: StripRecording }) {
  return (
    <svg
      viewBox={`0 0 ${box.width} 16`}
      className="block w-full border-t border-rule bg-paper"
      aria-hidden="true"
    >
      {recording.events.map((event, i) => {
        if (event.type !== 'stimulus') return null;
        const x = (event.timeS / miniatureS) * box.width;
        const y = event.chamber === 'atrium' ? 4.5 : 11.5;
        return event.captured ? (
          <line key={i} x1={x} x2={x} y1={y - 2.8} y2={y + 2.8} strokeWidth={1.8} className="stroke-copper" />
        ) : (
          <circle key={i} cx={x} cy={y} r={2.4} fill="none" strokeWidth={1.3} className="stroke-copper" />
        );
      })}
    </svg>
  );
}

/** A strip in small: sand grid without 1 mm lines, trace, and under it the stimulus line. */
export function Miniature({ parameters }: { parameters: StripParameters }) {
  const [element, seen] = useSeen();
  const [recording, setRecording] = useState<StripRecording | null>(null);
  const [failed, setFailed] = useState(false);
  useEffect(() => {
    if (!seen) return;
    let current = true;
    renderMiniature(parameters).then(
      (made) => current && setRecording(made),
      () => current && setFailed(true),
    );
    return () => {
      current = false;
    };
  }, [seen, parameters]);
  const lead = parameters.sheet.leads[0];
  const boxPx = 5 * unitsPerMm;
  const { ground, major } = gridColours.sand;
  return (
    <div ref={element} aria-hidden="true" style={{ backgroundColor: ground }}>
      <svg viewBox={`0 0 ${box.width} ${box.height}`} className="block w-full">
        {Array.from({ length: Math.ceil(box.width / boxPx) }, (_, i) => (
          <line
            key={`x${i}`}
            x1={i * boxPx}
            x2={i * boxPx}
            y1={0}
            y2={box.height}
            stroke={major}
            strokeWidth={0.7}
          />
        ))}
        {Array.from({ length: Math.ceil(box.height / boxPx) }, (_, i) => (
          <line
            key={`y${i}`}
            y1={i * boxPx + 2}
            y2={i * boxPx + 2}
            x1={0}
            x2={box.width}
            stroke={major}
            strokeWidth={0.7}
          />
        ))}
        {recording ? (
          <path
            d={tracePath(recording, lead, baselineOf(recording.leads[lead]))}
            fill="none"
            strokeWidth={1.4}
            strokeLinejoin="round"
            className="stroke-ink"
          />
        ) : (
          <line
            x1={0}
            x2={box.width}
            y1={box.height / 2}
            y2={box.height / 2}
            strokeDasharray="2 4"
            className="stroke-ink-3"
          />
        )}
        <text x={7} y={16} className="fill-ink text-[12px] font-semibold">
          {lead}
        </text>
        {failed && (
          <text x={box.width / 2} y={30} textAnchor="middle" className="fill-ink-2 text-[12px]">
            could not be drawn
          </text>
        )}
      </svg>
      {recording ? (
        <StimulusLine recording={recording} />
      ) : (
        <div className="border-t border-rule" style={{ aspectRatio: `${box.width} / 16` }} />
      )}
    </div>
  );
}
