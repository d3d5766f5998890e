import type { MeasuredBeat } from '../../../../shared/recorder-bench/beat-measures';
import type { BenchResult } from '../../../../shared/recorder-bench/bench-result';
import { largest } from '../../../../shared/recorder-bench/fit';
import { Button } from '../../../components/button';

interface MeasuresTableProps {
  names: readonly string[];
  result: BenchResult;
  beat: MeasuredBeat | null;
  lead: string;
  onBeat(number: number): void;
}

function mv(value: number | null): string {
  if (value === null) return '–';
  return `${value < -0.0049 ? '−' : ''}${Math.abs(value).toFixed(2)} mV`;
}

function changed(value: number | null, from: number | null): string {
  if (value === null || from === null) return '';
  const change = value - from;
  if (Math.abs(change) < 0.005) return 'same';
  return `${change < 0 ? '−' : '+'}${Math.abs(change).toFixed(2)}`;
}

interface Row {
  label: string;
  cells: { value: string; note: string }[];
}

function beatRows(beat: MeasuredBeat): Row[] {
  const [first] = beat.bySetting;
  const rows: Row[] = [];
  if (beat.spike) {
    rows.push({
      label: `Spike, ${mv(beat.spike.electrodesMv)} at the electrodes`,
      cells: beat.bySetting.map(({ spikeMv, spikePercent }) => ({
        value: mv(spikeMv),
        note: spikePercent === null ? '' : `${Math.max(0, spikePercent).toFixed(1)} %`,
      })),
    });
  }
  rows.push({
    label: 'ST level, 80 ms after the QRS',
    cells: beat.bySetting.map(({ stMv }, i) => ({
      value: mv(stMv),
      note: i ? changed(stMv, first.stMv) : '',
    })),
  });
  rows.push({
    label: 'T wave',
    cells: beat.bySetting.map(({ tMv }, i) => ({ value: mv(tMv), note: i ? changed(tMv, first.tMv) : '' })),
  });
  return rows;
}

function signalRows({ traces }: BenchResult): Row[] {
  return [
    {
      label: 'Largest deflection',
      cells: traces.map(({ exactMv }) => ({ value: mv(largest(exactMv)), note: '' })),
    },
    {
      label: 'At the end',
      cells: traces.map(({ exactMv }) => ({ value: mv(exactMv.at(-1) ?? null), note: '' })),
    },
  ];
}

/** What every setting makes of the chosen beat, in figures. */
export function MeasuresTable({ names, result, beat, lead, onBeat }: MeasuresTableProps) {
  const numbers = result.beats.map(({ number }) => number);
  const rows = beat ? beatRows(beat) : signalRows(result);
  const step = (by: number): void => {
    const wanted = (beat?.number ?? 0) + by;
    if (numbers.includes(wanted)) onBeat(wanted);
  };
  return (
    <section aria-label="Measured">
      <div className="flex items-center justify-between gap-3">
        <h2 className="text-section font-semibold">
          {beat ? `Lead ${lead}, beat ${beat.number} of ${numbers.length}` : 'The test signal in figures'}
        </h2>
        {beat && (
          <span className="flex gap-1.5">
            <Button small onClick={() => step(-1)} disabled={!numbers.includes(beat.number - 1)}>
              Previous beat
            </Button>
            <Button small onClick={() => step(1)} disabled={!numbers.includes(beat.number + 1)}>
              Next beat
            </Button>
          </span>
        )}
      </div>
      <div className="mt-2 overflow-x-auto">
        <table className="w-full text-dense">
          <thead>
            <tr className="border-b border-edge text-left text-ink-2">
              <th className="py-1.5 pr-3 font-medium">What is measured</th>
              {names.map((name, i) => (
                <th key={`${i}-${name}`} className="py-1.5 pl-3 text-right font-medium">
                  {name}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map(({ label, cells }) => (
              <tr key={label} className="border-b border-rule align-top">
                <th scope="row" className="py-1.5 pr-3 text-left font-normal">
                  {label}
                </th>
                {cells.slice(0, names.length).map(({ value, note }, i) => (
                  <td key={i} className="py-1.5 pl-3 text-right font-mono whitespace-nowrap">
                    {value}
                    {note && <span className="block text-caption text-ink-3">{note}</span>}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {beat && (
        <p className="mt-1.5 text-caption text-ink-3">
          Changes are against the first setting. A spike’s height is its own share of the trace, found by
          running the stimuli alone through the same recorder.
        </p>
      )}
    </section>
  );
}
