import type { Finding, Reading } from '../../../../shared/engine/reading/reading';
import { BeatChip } from '../../../components/chip';
import { classNames } from '../../../lib/class-names';
import { beatRanges, rangeWords } from './beat-ranges';
import { CriteriaList } from './criteria-list';

interface ReadingPanelProps {
  reading: Reading;
  chosenBeats: readonly number[];
  hoverBeat: number | null;
  onChooseBeats(beats: readonly number[]): void;
}

function Figure({ value, unit, label }: { value: string; unit?: string; label: string }) {
  return (
    <div>
      <dt className="order-2 text-caption text-ink-3">{label}</dt>
      <dd className="text-lead font-medium">
        {value}
        {unit && <span className="ml-1 text-caption font-normal text-ink-3">{unit}</span>}
      </dd>
    </div>
  );
}

const whole = (value: number | null): string => (value === null ? '–' : String(Math.round(value)));

function capturedWords(reading: Reading): string {
  const stimulated = reading.beats.filter((beat) => beat.stimuli.length > 0);
  const captured = stimulated.filter((beat) => beat.captured === true);
  return stimulated.length === 0 ? '–' : `${captured.length} of ${stimulated.length}`;
}

/** Most chips that stand before a sentence; a finding of every beat says "all". */
const mostChips = 4;

function FindingRow({
  finding,
  reading,
  chosenBeats,
  hoverBeat,
  onChooseBeats,
}: ReadingPanelProps & { finding: Finding }) {
  const all = finding.beats.length === reading.beats.length && finding.beats.length > 1;
  const ranges = beatRanges(finding.beats);
  const isChosen = (beats: readonly number[]): boolean =>
    beats.length > 0 &&
    beats.length === chosenBeats.length &&
    beats.every((beat) => chosenBeats.includes(beat));
  const touched = !all && finding.beats.some((beat) => chosenBeats.includes(beat) || beat === hoverBeat);
  const toggle = (beats: readonly number[]): void => onChooseBeats(isChosen(beats) ? [] : beats);
  return (
    <li className={classNames('flex gap-3 border-t border-rule px-3 py-2.5', touched && 'bg-teal-tint')}>
      <span className="flex w-24 shrink-0 flex-wrap content-start gap-1">
        {all || ranges.length > mostChips ? (
          <BeatChip
            label={all ? 'All beats' : `Beats ${ranges.map(rangeWords).join(', ')}`}
            chosen={isChosen(finding.beats)}
            onClick={() => toggle(finding.beats)}
          >
            {all ? 'all' : `${finding.beats.length} beats`}
          </BeatChip>
        ) : (
          ranges.map((range) => {
            const beats = finding.beats.filter((beat) => beat >= range.from && beat <= range.to);
            return (
              <BeatChip
                key={range.from}
                label={`Beats ${rangeWords(range)}`}
                chosen={beats.every((beat) => chosenBeats.includes(beat))}
                onClick={() => toggle(beats)}
              >
                {rangeWords(range)}
              </BeatChip>
            );
          })
        )}
      </span>
      <span className="text-dense leading-5">{finding.text}</span>
    </li>
  );
}

/** What is true of this strip, derived from its events: figures, then sentences tied to their beats. */
export function ReadingPanel(props: ReadingPanelProps) {
  const { reading } = props;
  return (
    <section aria-label="Reading" className="bg-sheet pb-4">
      <header className="flex items-baseline justify-between px-4 pt-3.5">
        <h2 className="text-section font-semibold">Reading</h2>
        <span className="text-caption text-ink-3">from events and heart vector</span>
      </header>
      <dl className="grid grid-cols-4 gap-3 px-4 py-2.5 [&>div]:flex [&>div]:flex-col">
        <Figure value={whole(reading.ventricularRateBpm)} unit="/min" label="ventricles" />
        <Figure value={whole(reading.atrialRateBpm)} unit="/min" label="atria" />
        <Figure value={capturedWords(reading)} label="beats captured" />
        <Figure value={whole(reading.qrsDurationMs)} unit="ms" label="QRS" />
      </dl>
      <ul aria-live="polite">
        {reading.findings.map((finding) => (
          <FindingRow key={finding.id} finding={finding} {...props} />
        ))}
      </ul>
      {reading.criteria && <CriteriaList criteria={reading.criteria} onChooseBeats={props.onChooseBeats} />}
    </section>
  );
}
