import { useState } from 'react';
import { leadNames } from '../../../shared/parameters/sheet';
import type { StripParameters } from '../../../shared/parameters/strip-parameters';
import { usualBeat, type MeasuredBeat } from '../../../shared/recorder-bench/beat-measures';
import { longestOnBenchS, type BenchResult } from '../../../shared/recorder-bench/bench-result';
import { settingWords } from '../../../shared/recorder-bench/bench-setting';
import { builtInSettings } from '../../../shared/recorder-bench/built-in-settings';
import { testSignals } from '../../../shared/recorder-bench/test-signals';
import { Button } from '../../components/button';
import { Notice } from '../../components/notice';
import { Segments } from '../../components/segments';
import { SelectField } from '../../components/select-field';
import { tabletQuery, useMediaQuery } from '../../lib/use-media-query';
import { BenchTraces } from './components/bench-traces';
import { LessonList } from './components/lesson-list';
import { MarkerPanel } from './components/marker-panel';
import { MeasuresTable } from './components/measures-table';
import { ReportMenu } from './components/report-menu';
import { ResponseFigures } from './components/response-figures';
import { SettingsRow } from './components/settings-row';
import { SourceChooser } from './components/source-chooser';
import { StandardsTable } from './components/standards-table';
import {
  chosenGains,
  fewestSettings,
  lessonOf,
  lessonState,
  mostSettings,
  type BenchState,
} from './state/bench-address';
import { settingCode } from './state/setting-code';
import {
  useBenches,
  useConformance,
  useLessonFigures,
  useMarkerRows,
  useResponses,
  useTraces,
} from './state/use-bench';

export interface RecorderBenchProps {
  state: BenchState;
  onChange(state: BenchState): void;
  /** The strip on the bench; null for a test signal, or while it is fetched. */
  parameters: StripParameters | null;
  /** Its title. */
  title: string;
  strips: readonly { id: string; title: string }[];
}

const views = [
  { value: 'traces', label: 'Traces' },
  { value: 'difference', label: 'Difference' },
] as const;
const leadOptions = leadNames.map((lead) => ({ value: lead, label: `Lead ${lead}` }));

const gainOptions = [
  { value: 'fits', label: 'Gain that fits' },
  ...chosenGains.map((gain) => ({ value: String(gain), label: `${gain} mm/mV` })),
];

/** The beat that is measured: the chosen one, otherwise the usual. */
function chosenBeat(result: BenchResult | undefined, number: number | null): MeasuredBeat | null {
  const beats = result?.beats ?? [];
  return beats.find((beat) => beat.number === number) ?? usualBeat(beats);
}

/** Names for charts and tables; the same name twice gets its band. */
function namesOf(state: BenchState): string[] {
  const words = state.settings.map(settingWords);
  return words.map(({ name, band }) =>
    words.filter((one) => one.name === name).length > 1 ? `${name}, ${band}` : name,
  );
}

/** A setting that is not there yet. */
function nextSetting(state: BenchState) {
  const taken = new Set(state.settings.map(settingCode));
  return Object.values(builtInSettings).find((one) => !taken.has(settingCode(one))) ?? builtInSettings.custom;
}

/** Settings side by side on one strip: traces, figures, standards, lessons. Everything follows the settings. */
export function RecorderBench({ state, onChange, parameters, title, strips }: RecorderBenchProps) {
  const benches = useBenches();
  const isWide = useMediaQuery(tabletQuery);
  const [openSettings, setOpenSettings] = useState(false);
  const [measureMarker, setMeasureMarker] = useState(false);
  const traces = useTraces(benches, state, parameters);
  const responses = useResponses(benches, state.settings);
  const conformance = useConformance(benches, state.settings);
  const figures = useLessonFigures(benches);
  const markerRows = useMarkerRows(benches, measureMarker);

  const result = traces.data;
  const current = result && result.traces.length === state.settings.length ? result : undefined;
  const beat = chosenBeat(current, state.beat);
  const lesson = lessonOf(state);
  const names = namesOf(state);
  const set = (change: Partial<BenchState>): void => onChange({ ...state, ...change });
  const asOpened =
    lesson !== null &&
    state.lead === lesson.lead &&
    state.settings.map(settingCode).join() === lesson.settings.map(settingCode).join();
  const fresh = !traces.isPlaceholderData;
  const lessonWords =
    lesson && asOpened && fresh && current?.strip ? lesson.words(current.strip, current.beats) : null;
  const shortened = parameters !== null && parameters.durationS > longestOnBenchS;

  return (
    <main className="flex min-w-0 flex-col gap-5 px-4 py-4 tablet:px-6">
      <div className="flex flex-wrap items-center gap-x-3 gap-y-2.5">
        <h1 className="text-title font-semibold tracking-[-0.012em]">Recorder bench</h1>
        <SourceChooser
          title={title}
          strips={strips}
          onChoose={(source) => set({ source, beat: null, view: 'traces' })}
        />
        {state.source.kind !== 'signal' && (
          <SelectField
            label="Lead"
            small={false}
            value={state.lead}
            options={leadOptions}
            onChange={(lead) => set({ lead })}
          />
        )}
        <SelectField
          label="Gain"
          value={String(state.gain ?? 'fits')}
          options={gainOptions}
          onChange={(gain) => set({ gain: gain === 'fits' ? null : Number(gain) })}
        />
        <span className="ml-auto flex flex-wrap items-center gap-3 max-tablet:ml-0">
          <Segments
            label="What is drawn"
            value={state.view}
            options={views}
            onChange={(view) => set({ view })}
          />
          <ReportMenu settings={state.settings} conformance={conformance.data ?? null} />
        </span>
      </div>

      <section aria-label="Settings" className="flex flex-col gap-3">
        {!isWide && (
          <div>
            <Button aria-expanded={openSettings} onClick={() => setOpenSettings(!openSettings)}>
              {openSettings ? 'Close the settings' : 'Change the settings'}
            </Button>
          </div>
        )}
        {(isWide || openSettings) && (
          <>
            <SettingsRow
              settings={state.settings}
              fewest={fewestSettings}
              onChange={(settings) => set({ settings })}
            />
            <div className="flex items-center gap-3">
              <Button
                small
                disabled={state.settings.length >= mostSettings}
                onClick={() => set({ settings: [...state.settings, nextSetting(state)] })}
              >
                Add a setting
              </Button>
              <span className="text-caption text-ink-3">
                {state.settings.length} of {mostSettings} shown
              </span>
            </div>
          </>
        )}
      </section>

      {traces.isError && (
        <Notice kind="red" title="The strip could not be recorded.">
          {traces.error.message} The settings are kept in the address; reload the page to try again.
        </Notice>
      )}
      <div className="grid min-w-0 gap-x-8 gap-y-6 wide:grid-cols-[minmax(0,1.35fr)_minmax(0,1fr)]">
        <div className="flex min-w-0 flex-col gap-4">
          {current ? (
            <BenchTraces
              result={current}
              settings={state.settings}
              view={state.view}
              beat={beat}
              marker={state.marker}
              gain={state.gain}
              label={`${title}, ${state.source.kind === 'signal' ? '' : `lead ${state.lead}, `}through ${names.join(', ')}. Arrow keys choose the beat.`}
              onBeat={(number) => set({ beat: number })}
            />
          ) : (
            !traces.isError && (
              <p role="status" className="border-y border-edge bg-sheet px-4 py-16 text-body text-ink-3">
                Recording …
              </p>
            )
          )}
          {state.source.kind === 'signal' && (
            <p className="text-body text-ink-2">{testSignals[state.source.id].help}</p>
          )}
          {shortened && (
            <p className="text-caption text-ink-2">
              The first {longestOnBenchS} s of this strip stand on the bench.
            </p>
          )}
          {current && (
            <MeasuresTable
              names={names}
              result={current}
              beat={beat}
              lead={state.lead}
              onBeat={(number) => set({ beat: number })}
            />
          )}
          <MarkerPanel
            strip={current?.strip ?? null}
            shown={state.marker}
            onShow={(marker) => set({ marker })}
            rows={markerRows}
            wanted={measureMarker}
            onMeasure={() => setMeasureMarker(true)}
          />
        </div>
        <div className="flex min-w-0 flex-col gap-6">
          <ResponseFigures names={names} responses={responses} spectra={current?.spectra ?? []} />
          <LessonList
            figures={figures}
            open={lesson}
            words={lessonWords}
            onOpen={(one) => onChange(lessonState(one))}
          />
        </div>
      </div>
      <section aria-label="Standards" className="min-w-0">
        <h2 className="mb-2 text-section font-semibold">
          Against published standards and what each setting declares
        </h2>
        {conformance.data ? (
          <StandardsTable conformance={conformance.data} />
        ) : (
          <p role="status" className="border-t border-edge py-6 text-body text-ink-3">
            {conformance.isError
              ? 'The table could not be measured. Reload the page to try again.'
              : 'Measuring …'}
          </p>
        )}
        <p className="mt-2 max-w-prose text-caption text-ink-3">
          Measured on a simulated recorder, before the quantiser where the standard tests the analogue part.
          “Not claimed” is not “met”: the setting is not meant for it. Says nothing about any device for
          patients.
        </p>
      </section>
    </main>
  );
}
