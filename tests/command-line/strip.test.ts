import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { unzipSync } from 'fflate';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { decodePng } from '../support/png';

let folder: string;
beforeEach(() => (folder = mkdtempSync(join(tmpdir(), 'paceloom-strip-'))));
afterEach(() => rmSync(folder, { recursive: true, force: true }));

function strip(args: string[], input = '') {
  return spawnSync('npx', ['tsx', 'scripts/strip.ts', ...args], { encoding: 'utf8', input });
}
const out = (): string => join(folder, 'out');
const read = (name: string): string => readFileSync(join(out(), name), 'utf8');

describe('strip command', () => {
  it('writes a preset as samples, truth and sheet', () => {
    const { status, stderr } = strip([
      '--preset',
      'av-sequential-pacing',
      '--out',
      out(),
      '--formats',
      'csv,events,reading,svg,png,pdf',
    ]);
    expect([status, stderr]).toEqual([0, '']);
    expect(readdirSync(out()).sort()).toEqual([
      'events.json',
      'reading.json',
      'strip.csv',
      'strip.pdf',
      'strip.png',
      'strip.svg',
    ]);
    const lines = read('strip.csv').trimEnd().split('\n');
    expect(lines[0]).toBe('time_s,I,II,III,aVR,aVL,aVF,V1,V2,V3,V4,V5,V6');
    expect(lines).toHaveLength(5001);
    expect(Number(lines[1].split(',')[0])).toBe(0);
    const events = JSON.parse(read('events.json')) as { timeS: number; type: string }[];
    expect(events.filter((event) => event.type === 'stimulus').length).toBeGreaterThan(20);
    expect(JSON.parse(read('reading.json'))).toMatchObject({ avIntervalMs: 180 });
    expect(read('strip.svg')).toContain('Synthetic teaching strip, not a patient recording');
    expect(readFileSync(join(out(), 'strip.pdf')).toString('latin1', 0, 8)).toBe('%PDF-1.7');
    expect(decodePng(readFileSync(join(out(), 'strip.png'))).widthPx).toBeGreaterThan(1000);
  });

  it('writes every open format, each under its name, and its warnings to standard error', () => {
    const { status, stderr } = strip(
      ['--in', '-', '--out', out(), '--formats', 'json,edf,wfdb,dicom,aecg,wav'],
      '{"durationS": 2.002, "title": "Été", "recorder": {"sampleRateHz": 2000}}',
    );
    expect(status).toBe(0);
    expect(readdirSync(out()).sort()).toEqual(
      ['atr', 'dat', 'dcm', 'edf', 'hea', 'json', 'wav', 'xml'].map((ending) => `strip.${ending}`),
    );
    const said = stderr.trimEnd().split('\n');
    expect(said).toContain(
      'warning, wav: For isolated, attenuated simulator inputs only; never connect to a person.',
    );
    expect(said.some((line) => line.startsWith('warning, dicom: resampled from 2000 to 1000'))).toBe(true);
    expect(said.some((line) => line.startsWith('warning, edf: the last record is filled'))).toBe(true);
  });

  it('packs the files into one archive with --bundle', () => {
    const { status } = strip(
      ['--in', '-', '--out', out(), '--formats', 'csv,svg,edf', '--bundle'],
      '{"seed": 3}',
    );
    expect(status).toBe(0);
    expect(readdirSync(out())).toEqual(['strip.zip']);
    const names = Object.keys(unzipSync(readFileSync(join(out(), 'strip.zip'))));
    expect(names).toEqual(['strip.csv', 'strip.svg', 'strip.edf', 'manifest.json']);
  });

  it('takes parameters from standard input and changes them', () => {
    const { status } = strip(
      ['--in', '-', '--out', out(), '--set', 'durationS=2', '--set', 'recorder.sampleRateHz=1000'],
      '{"seed": 5}',
    );
    expect(status).toBe(0);
    expect(read('strip.csv').trimEnd().split('\n')).toHaveLength(2001);
    expect(readdirSync(out()).sort()).toEqual(['events.json', 'reading.json', 'strip.csv']);
  });

  it('refuses bad parameters with exit code 2 and one line a problem, and writes nothing', () => {
    const file = join(folder, 'parameters.json');
    writeFileSync(file, '{"patient": {"atrialRateBpm": 900, "nonsense": 1}}');
    const { status, stderr, stdout } = strip(['--in', file, '--out', out()]);
    expect(status).toBe(2);
    expect(stdout).toBe('');
    expect(stderr.trimEnd().split('\n')).toEqual([
      'patient.atrialRateBpm: 900 is not allowed; allowed: 20 to 400 /min',
      expect.stringMatching(/^patient\.nonsense: /),
    ]);
    expect(existsSync(out())).toBe(false);
  });

  it.each([
    [['--in', 'missing.json', '--out', 'x'], '--in: '],
    [['--preset', 'nothing', '--out', 'x'], 'preset: '],
    [['--in', '-', '--out', 'x', '--formats', 'csv,gif'], '--formats: '],
    [['--in', '-', '--preset', 'atrial-pacing', '--out', 'x'], '--in: '],
    [['--in', '-'], '--out: '],
    [['--out', 'x'], '--in: '],
    [['--wrong'], 'command line: '],
    [['--in', '-', '--out', 'x', '--set', 'nothing'], '--set: '],
  ])('refuses %j in words', (args, start) => {
    const { status, stderr } = strip(args, '{}');
    expect(status).toBe(2);
    expect(stderr.startsWith(start)).toBe(true);
    expect(existsSync('x')).toBe(false);
  });

  it('refuses text that is not JSON', () => {
    const { status, stderr } = strip(['--in', '-', '--out', out()], '{"seed": ');
    expect(status).toBe(2);
    expect(stderr).toMatch(/^--in: .*strip parameters as JSON/);
  });
});
