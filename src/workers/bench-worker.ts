import { z } from 'zod';
import { gallery, presetParameters } from '../../shared/gallery/gallery';
import { benchSignal, benchStrip } from '../../shared/recorder-bench/bench-result';
import { measureConformance } from '../../shared/recorder-bench/conformance';
import { lessons, measureLesson } from '../../shared/recorder-bench/lessons';
import { markerRow, markStrip } from '../../shared/recorder-bench/marker-figures';
import { measureResponses } from '../../shared/recorder-bench/responses';
import type { BenchAnswer, BenchJob } from './bench-protocol';

function work(job: BenchJob): unknown {
  switch (job.kind) {
    case 'strip':
      return benchStrip(job.ask.parameters, job.ask.settings, job.ask.lead);
    case 'signal':
      return benchSignal(job.ask.id, job.ask.settings);
    case 'responses':
      return measureResponses(job.ask);
    case 'conformance':
      return measureConformance(job.ask);
    case 'lessons':
      return Object.fromEntries(lessons.map((lesson) => [lesson.id, measureLesson(lesson).figure]));
    case 'marker':
      return markerRow(
        job.ask,
        gallery.map((preset) => markStrip(presetParameters(preset), job.ask)),
      );
  }
}

function answer(job: BenchJob): BenchAnswer {
  try {
    return { id: job.id, ok: true, answer: work(job) };
  } catch (error) {
    return { id: job.id, ok: false, message: error instanceof Error ? error.message : 'unknown' };
  }
}

// zod must not compile with `new Function` under our content security policy.
z.config({ jitless: true });

self.addEventListener('message', ({ data }: MessageEvent<BenchJob>) => self.postMessage(answer(data)));
