import { beatData } from './beat-data';

/** SVG units are millimetres at 25 mm/s and 15 mm/mV, so that one beat fills the page. */
const mmPerS = 25;
const mmPerMv = 15;
const size = { width: 75, height: 62, baseline: 27 };
const paperEnd = 50;
const ladder = { atria: 52.5, av: 55.5, ventricles: 58.5 };

const xOf = (timeS: number): number => timeS * mmPerS;
const yOf = (mv: number): number => size.baseline - mv * mmPerMv;

const path = beatData.samples
  .map(
    (steps, i) =>
      `${i === 0 ? 'M' : 'L'}${xOf(i / beatData.sampleRateHz).toFixed(2)} ${yOf(steps * beatData.stepMv).toFixed(2)}`,
  )
  .join('');

/** Value of the trace at a time, mV. */
function traceMv(timeS: number): number {
  return (beatData.samples[Math.round(timeS * beatData.sampleRateHz)] ?? 0) * beatData.stepMv;
}

interface NoteProps {
  x: number;
  y: number;
  toX: number;
  toY: number;
  title: string;
  text: string;
  copper?: boolean;
}

function Note({ x, y, toX, toY, title, text, copper }: NoteProps) {
  const colour = copper ? 'fill-copper-dark' : 'fill-ink';
  const width = Math.max(title.length * 0.66, text.length * 0.56) + 1;
  // The line leaves from the side of the label that faces its end.
  const fromX = toX > x + width ? x + width - 0.5 : Math.max(x, toX);
  const fromY = toY > y ? y + 2.2 : y - 1.4;
  return (
    <g>
      <line
        x1={fromX}
        y1={fromY}
        x2={toX}
        y2={toY}
        strokeWidth={0.09}
        className={copper ? 'stroke-copper-dark' : 'stroke-ink'}
      />
      <circle cx={toX} cy={toY} r={0.26} className={colour} />
      <rect x={x - 0.5} y={y - 1.4} width={width} height={3.6} fill="#fffbf8" />
      <text x={x} y={y} className={`${colour} text-[1.15px] font-semibold`}>
        {title}
      </text>
      <text x={x} y={y + 1.5} className="fill-ink-2 text-[1px]">
        {text}
      </text>
    </g>
  );
}

const atrial = beatData.stimuli.filter((stimulus) => stimulus.chamber === 'atrium');
const ventricular = beatData.stimuli.filter((stimulus) => stimulus.chamber !== 'atrium');
/** The pair that is explained: the second of each, so that its QRS and T are on the picture. */
const explained = {
  atrial: atrial[1],
  ventricular: ventricular.find((one) => one.timeS > atrial[1].timeS) ?? ventricular[1],
};

/** A large paced beat, drawn by the engine, with its parts named. */
export function AnnotatedBeat() {
  const a = explained.atrial;
  const v = explained.ventricular;
  const words = `Lead ${beatData.lead}: a small atrial stimulus and its P wave, ${beatData.avMs} ms later a larger ventricular stimulus, a wide QRS of ${beatData.qrsMs} ms and a T wave that points the other way.`;
  return (
    <svg
      viewBox={`0 0 ${size.width} ${size.height}`}
      preserveAspectRatio="xMidYMid slice"
      role="img"
      aria-label={words}
      className="h-full w-full"
    >
      <defs>
        <pattern id="mm" width="1" height="1" patternUnits="userSpaceOnUse">
          <path d="M1 0V1H0" fill="none" stroke="#f8e8e2" strokeWidth="0.08" />
        </pattern>
        <pattern id="mm5" width="5" height="5" patternUnits="userSpaceOnUse">
          <rect width="5" height="5" fill="url(#mm)" />
          <path d="M5 0V5H0" fill="none" stroke="#efc9bf" strokeWidth="0.16" />
        </pattern>
      </defs>
      <rect x="-60" y="-60" width="200" height="110" fill="#fffbf8" />
      <rect x="-60" y="-60" width="200" height="110" fill="url(#mm5)" />
      <rect x="-60" y={paperEnd} width="200" height="60" fill="#faf7f1" />
      <line x1="-60" x2="140" y1={paperEnd} y2={paperEnd} stroke="#867b68" strokeWidth="0.12" />
      {beatData.stimuli.map((stimulus) => (
        <line
          key={stimulus.timeS}
          x1={xOf(stimulus.timeS)}
          x2={xOf(stimulus.timeS)}
          y1={yOf(0)}
          y2={yOf(stimulus.heightMv)}
          strokeWidth={0.22}
          className="stroke-copper"
        />
      ))}
      <path d={path} fill="none" strokeWidth={0.26} strokeLinejoin="round" className="stroke-ink" />
      <path
        d={`M${xOf(a.timeS)} 22.4v1.2m0-.6H${xOf(v.timeS)}m0-.6v1.2`}
        fill="none"
        strokeWidth={0.1}
        className="stroke-ink"
      />
      <text x={xOf((a.timeS + v.timeS) / 2)} y={21.6} textAnchor="middle" className="fill-ink text-[1.05px]">
        AV {beatData.avMs} ms
      </text>
      <Note
        copper
        x={xOf(a.timeS) - 12}
        y={34}
        toX={xOf(a.timeS)}
        toY={yOf(a.heightMv)}
        title="Atrial stimulus"
        text="small, bipolar"
      />
      <Note
        x={xOf(a.timeS) - 9}
        y={20}
        toX={xOf(a.timeS + 0.07)}
        toY={yOf(traceMv(a.timeS + 0.07))}
        title="P wave"
        text="it captures"
      />
      <Note
        copper
        x={xOf(v.timeS) - 16}
        y={45}
        toX={xOf(v.timeS)}
        toY={yOf(v.heightMv)}
        title="Ventricular stimulus"
        text="larger"
      />
      <Note
        x={xOf(v.timeS) + 13}
        y={14}
        toX={xOf(v.timeS + 0.41)}
        toY={yOf(traceMv(v.timeS + 0.41))}
        title="T points the other way"
        text="discordance"
      />
      <Note
        x={xOf(v.timeS) + 7}
        y={44}
        toX={xOf(v.timeS + 0.1)}
        toY={yOf(traceMv(v.timeS + 0.1))}
        title="Wide QRS"
        text={`${beatData.qrsMs} ms`}
      />
      {Object.values(ladder).map((y) => (
        <line key={y} x1="-60" x2="140" y1={y} y2={y} stroke="#cbc0ac" strokeWidth="0.1" />
      ))}
      {atrial.map(({ timeS }) => (
        <path
          key={timeS}
          d={`M${xOf(timeS)} ${ladder.atria - 1.4}v1.4`}
          strokeWidth={0.4}
          className="stroke-copper"
        />
      ))}
      {ventricular.map(({ timeS }) => (
        <path
          key={timeS}
          d={`M${xOf(timeS)} ${ladder.ventricles + 1.4}v-1.4`}
          strokeWidth={0.4}
          className="stroke-copper"
        />
      ))}
    </svg>
  );
}
