import type { LeadName } from '../../shared/parameters/sheet';
import type { StripParameters } from '../../shared/parameters/strip-parameters';
import type { BenchResult } from '../../shared/recorder-bench/bench-result';
import type { BenchSetting } from '../../shared/recorder-bench/bench-setting';
import type { Conformance } from '../../shared/recorder-bench/conformance';
import type { MarkerRow } from '../../shared/recorder-bench/marker-figures';
import type { Responses } from '../../shared/recorder-bench/responses';
import type { TestSignalId } from '../../shared/recorder-bench/test-signals';

/** What the bench can be asked, and what it answers. */
export interface BenchQuestions {
  strip: {
    ask: { parameters: StripParameters; settings: BenchSetting[]; lead: LeadName };
    answer: BenchResult;
  };
  signal: { ask: { id: TestSignalId; settings: BenchSetting[] }; answer: BenchResult };
  responses: { ask: BenchSetting; answer: Responses };
  conformance: { ask: BenchSetting[]; answer: Conformance };
  /** Figures of every lesson, by id. */
  lessons: { ask: null; answer: Record<string, string> };
  /** The marker over the whole gallery, under this much muscle noise in mV. */
  marker: { ask: number; answer: MarkerRow };
}
export type BenchQuestion = keyof BenchQuestions;

export type BenchJob = {
  [Kind in BenchQuestion]: { id: number; kind: Kind; ask: BenchQuestions[Kind]['ask'] };
}[BenchQuestion];

export type BenchAnswer =
  { id: number; ok: true; answer: unknown } | { id: number; ok: false; message: string };
