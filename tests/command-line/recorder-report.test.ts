import { spawnSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';

function report(...args: string[]) {
  return spawnSync('npx', ['tsx', 'scripts/recorder-report.ts', ...args], { encoding: 'utf8' });
}

interface Row {
  id: string;
  findings: { verdict: string; value: number | null; reason: string | null }[];
}

describe('recorder-report command', () => {
  it('finds that every built-in setting meets what it claims', () => {
    const { status, stdout, stderr } = report();
    expect([status, stderr]).toEqual([0, '']);
    for (const name of ['Monitor', 'Slow-wave', 'Diagnostic', 'Unfiltered']) {
      const counts = new RegExp(`^${name}.*: (\\d+) of (\\d+) claimed requirements met$`, 'mu').exec(stdout);
      expect(counts?.[1]).toBe(counts?.[2]);
      expect(Number(counts?.[1])).toBeGreaterThan(2);
    }
    expect(stdout).not.toContain('FAILED');
  });

  it('exits 1 when a setting fails a requirement that it claims: a notch in the diagnostic band', () => {
    const { status, stdout } = report('--bandwidth', 'diagnostic', '--notch', '50', '--format', 'json');
    expect(status).toBe(1);
    const { rows } = JSON.parse(stdout) as { rows: Row[] };
    const failed = rows.filter(({ findings }) => findings[0].verdict === 'failed');
    expect(failed.length).toBeGreaterThan(0);
    expect(failed.length).toBeLessThan(rows.length / 2);
  });

  it('measures own limits, and marks what they are not meant to meet', () => {
    const { status, stdout } = report(
      '--bandwidth',
      '0.67-100',
      '--bandwidth',
      'monitor',
      '--format',
      'json',
    );
    expect(status).toBe(0);
    const { rows, settings } = JSON.parse(stdout) as { rows: Row[]; settings: { band: string }[] };
    expect(settings.map(({ band }) => band)).toEqual(['0.67–100 Hz', '0.5–40 Hz']);
    const notClaimed = rows
      .flatMap(({ findings }) => findings)
      .filter(({ verdict }) => verdict === 'notClaimed');
    expect(notClaimed.length).toBeGreaterThan(0);
    expect(notClaimed.every(({ reason }) => reason !== null && reason.length > 5)).toBe(true);
  });

  it('writes CSV with a header and a row for each requirement', () => {
    const { status, stdout } = report('--bandwidth', 'monitor', '--format', 'csv');
    expect(status).toBe(0);
    expect(stdout.startsWith('requirement,applied,source,provenance,limit,setting,band,')).toBe(true);
    expect(stdout.split('\r\n').length).toBeGreaterThan(10);
  });

  it.each([
    [['--bandwidth', 'loud'], '--bandwidth', 'loud', 'monitor'],
    [['--bandwidth', '50-150'], 'recorder.bandwidth.lowHz', '50', '0.01 to 10 Hz'],
    [['--notch', '55'], 'recorder.mainsNotchHz', '55', '50'],
    [['--rate', 'many'], '--rate', 'many', '250, 500, 1000 or 2000'],
    [['--resolution', '100'], 'recorder.resolutionUv', '100', '10'],
    [['--format', 'pdf'], '--format', 'pdf', 'text, json, csv'],
    [['--colour'], 'command line', '--colour', '--bandwidth'],
  ])('refuses %j with the field, the value and what is allowed', (args, field, value, allowed) => {
    const { status, stdout, stderr } = report(...args);
    expect([status, stdout]).toEqual([2, '']);
    expect(stderr.trimEnd().split('\n')).toHaveLength(1);
    expect(stderr).toContain(field);
    expect(stderr).toContain(value);
    expect(stderr).toContain(allowed);
  });
});
