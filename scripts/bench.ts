// `npm run bench`: figures measured in one run, as ratios where a reference exists. `-- --json` prints them as JSON.
import { measureHour, measureStrip } from './bench/strip';

const figures = { strip12Lead10s: measureStrip(), hourStreamed: measureHour() };

if (process.argv.includes('--json')) {
  process.stdout.write(`${JSON.stringify(figures)}\n`);
} else {
  const { strip12Lead10s: strip, hourStreamed: hour } = figures;
  const scipy =
    strip.scipyMedianMs === null || strip.ratio === null
      ? 'SciPy is not installed here, so there is no ratio'
      : `SciPy sosfilt on the same eight leads ${strip.scipyMedianMs.toFixed(2)} ms, ratio ${strip.ratio.toFixed(2)}`;
  process.stdout.write(
    [
      `10 s, twelve leads, diagnostic: ${strip.medianMs.toFixed(2)} ms without pre-roll; ${scipy}`,
      `pre-roll of 30 s: ${strip.preRollMs.toFixed(2)} ms more per strip`,
      `one hour streamed: ${hour.timesRealTime.toFixed(0)} × real time, at most ${hour.peakMb.toFixed(0)} MB`,
      '',
    ].join('\n'),
  );
}
