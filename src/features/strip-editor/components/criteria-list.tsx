import type { Criterion, CriterionId } from '../../../../shared/engine/reading/criteria';
import { BeatChip } from '../../../components/chip';
import { beatRanges, rangeWords } from './beat-ranges';

const names: Record<CriterionId, string> = {
  'sgarbossa.concordantElevation': 'Concordant ST elevation',
  'sgarbossa.concordantDepression': 'ST depression in V1–V3',
  'sgarbossa.discordantElevation': 'Discordant ST elevation',
  'sgarbossa.points': 'Sgarbossa points',
  'modified.ratio': 'ST/S ratio',
  'modified.rule': 'Modified rule',
  'barcelona.concordant': 'Concordant deviation, any lead',
  'barcelona.discordantSmall': 'Discordant deviation in a small QRS',
  'barcelona.rule': 'Barcelona rule',
  'native.stElevation': 'Native ST elevation, two leads',
};
/** Rules that are positive when one of their parts is, and have no figure of their own. */
const rules: readonly CriterionId[] = ['modified.rule', 'barcelona.rule'];

function figureWords({ id, value, limit, unit }: Criterion): string {
  if (rules.includes(id)) return 'one part is enough';
  const shown = (number: number): string => number.toFixed(unit === 'points' ? 0 : 2).replace('-', '−');
  const units = unit === 'mV' ? ' mV' : '';
  const sign = limit < 0 ? '≤' : '≥';
  return `${value === null ? 'no lead to judge' : `${shown(value)}${units}`}, limit ${sign} ${shown(limit)}${units}`;
}

interface CriteriaListProps {
  criteria: readonly Criterion[];
  onChooseBeats(beats: readonly number[]): void;
}

/** Criteria of acute injury with figure, limit, leads and source; met ones first seen by their word. */
export function CriteriaList({ criteria, onChooseBeats }: CriteriaListProps) {
  const met = criteria.filter((one) => one.met).length;
  return (
    <details className="border-t border-rule px-4 py-2.5">
      <summary className="cursor-pointer text-dense font-medium">
        {`Infarct criteria, ${met === 0 ? 'none met' : `${met} met`}`}
      </summary>
      <p className="mt-1.5 text-caption text-ink-3">
        Criteria support a suspicion; not meeting them rules nothing out. Local practice decides.
      </p>
      <ul className="mt-2">
        {criteria.map((criterion) => (
          <li key={criterion.id} className="border-t border-rule py-2">
            <p className="flex flex-wrap items-baseline justify-between gap-x-3">
              <span className="text-dense font-medium">{names[criterion.id]}</span>
              <span
                className={
                  criterion.met ? 'text-dense font-semibold text-amber-ink' : 'text-dense text-ink-2'
                }
              >
                {criterion.met ? 'met' : 'not met'}
              </span>
            </p>
            <p className="font-mono text-caption text-ink-2">{figureWords(criterion)}</p>
            {criterion.met && (
              <p className="mt-1 flex flex-wrap items-center gap-1.5 text-caption text-ink-2">
                {criterion.leads.join(', ')}
                <BeatChip
                  label={`Beats ${beatRanges(criterion.beats).map(rangeWords).join(', ')}`}
                  chosen={false}
                  onClick={() => onChooseBeats(criterion.beats)}
                >
                  {`${criterion.beats.length} beats`}
                </BeatChip>
              </p>
            )}
            <p className="text-caption text-ink-3">{criterion.source}</p>
          </li>
        ))}
      </ul>
    </details>
  );
}
