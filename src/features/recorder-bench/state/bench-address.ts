import { gallery } from '../../../../shared/gallery/gallery';
import { leadNames, type LeadName } from '../../../../shared/parameters/sheet';
import type { BenchSetting } from '../../../../shared/recorder-bench/bench-setting';
import { builtInSettings } from '../../../../shared/recorder-bench/built-in-settings';
import { lessons, type Lesson } from '../../../../shared/recorder-bench/lessons';
import { testSignalIds, type TestSignalId } from '../../../../shared/recorder-bench/test-signals';
import { readSettingCode, settingCode } from './setting-code';

export type BenchView = 'traces' | 'difference';

/** What stands on the bench. */
export type BenchSource =
  | { kind: 'preset'; id: string }
  | { kind: 'strip'; id: string }
  | { kind: 'signal'; id: TestSignalId }
  | { kind: 'lesson'; id: string };

/** The whole bench, as the address bar keeps it: a reload or a link shows the same. */
export interface BenchState {
  source: BenchSource;
  settings: BenchSetting[];
  lead: LeadName;
  view: BenchView;
  /** Number of the beat that is measured; null: the first whole one. */
  beat: number | null;
  marker: boolean;
  /** mm/mV; null: the greatest usual one that fits. */
  gain: number | null;
}

/** Gains one can ask for, mm/mV; what is higher than its row is cut. */
export const chosenGains = [1, 5, 10, 20, 100] as const;

export const fewestSettings = 2;
export const mostSettings = 4;
const usualSource: BenchSource = { kind: 'preset', id: 'av-sequential-pacing' };
const usualSettings = [builtInSettings.monitor, builtInSettings.slowWave, builtInSettings.diagnostic];

function readSource(text: string | null): BenchSource {
  const [kind, id] = text?.split('.') ?? [];
  if (!id) return usualSource;
  if (kind === 'signal') {
    return testSignalIds.some((one) => one === id) ? { kind, id: id as TestSignalId } : usualSource;
  }
  if (kind === 'lesson') return lessons.some((one) => one.id === id) ? { kind, id } : usualSource;
  if (kind === 'preset') return gallery.some((one) => one.id === id) ? { kind, id } : usualSource;
  return kind === 'strip' ? { kind, id } : usualSource;
}

/** The lesson that is open. */
export function lessonOf({ source }: Pick<BenchState, 'source'>): Lesson | null {
  return source.kind === 'lesson' ? (lessons.find(({ id }) => id === source.id) ?? null) : null;
}

/** Reads the address; what cannot be read counts as not given. */
export function readBenchState(search: URLSearchParams): BenchState {
  const source = readSource(search.get('source'));
  const lesson = lessonOf({ source });
  const settings = search.getAll('setting').flatMap((code) => readSettingCode(code) ?? []);
  const enough = settings.length >= fewestSettings && settings.length <= mostSettings;
  const lead = leadNames.find((name) => name === search.get('lead'));
  const view = (['traces', 'difference'] as const).find((one) => one === search.get('view'));
  const beat = Number(search.get('beat'));
  return {
    source,
    settings: enough ? settings : [...(lesson?.settings ?? usualSettings)],
    lead: lead ?? lesson?.lead ?? 'II',
    view: view ?? lesson?.view ?? 'traces',
    beat: Number.isInteger(beat) && beat > 0 ? beat : null,
    marker: search.get('marker') === 'on',
    gain: chosenGains.find((one) => String(one) === search.get('gain')) ?? null,
  };
}

/** The address of a bench. */
export function writeBenchState(state: BenchState): URLSearchParams {
  const search = new URLSearchParams();
  search.set('source', `${state.source.kind}.${state.source.id}`);
  for (const setting of state.settings) search.append('setting', settingCode(setting));
  search.set('lead', state.lead);
  search.set('view', state.view);
  if (state.beat !== null) search.set('beat', String(state.beat));
  if (state.marker) search.set('marker', 'on');
  if (state.gain !== null) search.set('gain', String(state.gain));
  return search;
}

/** Whether the same strip stands there with the same settings: then Back has nothing to bring back. */
export function sameBench(one: BenchState, other: BenchState): boolean {
  const codes = (state: BenchState): string => state.settings.map(settingCode).join();
  const place = ({ source, lead }: BenchState): string => `${source.kind}.${source.id}.${lead}`;
  return codes(one) === codes(other) && place(one) === place(other);
}

/** The bench as a lesson sets it up. */
export function lessonState(lesson: Lesson): BenchState {
  return {
    source: { kind: 'lesson', id: lesson.id },
    settings: [...lesson.settings],
    lead: lesson.lead,
    view: lesson.view,
    beat: null,
    marker: false,
    gain: null,
  };
}
