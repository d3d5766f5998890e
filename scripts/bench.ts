// `npm run bench`: figures measured in one run, as ratios where a reference exists. `-- --json` prints them as JSON.
import { spawnSync } from 'node:child_process';
import { exportLines, measureExports } from './bench/exports';
import { measurePreview } from './bench/preview';
import { measureHour, measureStrip } from './bench/strip';

const strip12Lead10s = measureStrip();
const hourStreamed = measureHour();
const exports = await measureExports();
spawnSync('node', ['scripts/start.mjs', '--build-only'], { stdio: 'ignore' });
const preview = await measurePreview();
const figures = { strip12Lead10s, hourStreamed, exports, ...(preview ? { preview } : {}) };

function ratioWords(): string {
  const { scipyMedianMs, ratio } = strip12Lead10s;
  if (scipyMedianMs === null || ratio === null) return 'SciPy is not installed here, so there is no ratio';
  return `SciPy sosfilt on the same eight leads ${scipyMedianMs.toFixed(2)} ms, ratio ${ratio.toFixed(2)}`;
}

function previewWords(): string {
  if (!preview) return 'preview: no Chromium here';
  const { leads3, leads12 } = preview;
  return `preview from key to frame: 3 leads ${leads3.p50Ms.toFixed(1)} ms (p95 ${leads3.p95Ms.toFixed(1)}), 12 leads ${leads12.p50Ms.toFixed(1)} ms (p95 ${leads12.p95Ms.toFixed(1)})`;
}

if (process.argv.includes('--json')) {
  process.stdout.write(`${JSON.stringify(figures)}\n`);
} else {
  process.stdout.write(
    [
      `10 s, twelve leads, diagnostic: ${strip12Lead10s.medianMs.toFixed(2)} ms without pre-roll; ${ratioWords()}`,
      `pre-roll of 30 s: ${strip12Lead10s.preRollMs.toFixed(2)} ms more per strip`,
      `one hour of a difficult DDD patient streamed: ${hourStreamed.timesRealTime.toFixed(0)} × real time; resident memory at most ${hourStreamed.peakFirstQuarterMb.toFixed(0)} MB in its first quarter, ${hourStreamed.peakLastQuarterMb.toFixed(0)} MB in its last`,
      ...exportLines(exports),
      previewWords(),
      '',
    ].join('\n'),
  );
}
