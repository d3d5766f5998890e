import { describe, expect, it } from 'vitest';
import { activationPattern, type VentricularSource } from '../../../shared/engine/heart/activation-pattern';
import { fascicles } from '../../../shared/engine/heart/heart-model-data';

const right = (
  site: 'apex' | 'septum' | 'outflow' | 'his' | 'leftBundle',
  hisCapture: 'selective' | 'nonselective' = 'nonselective',
  timeMs = 0,
): VentricularSource => ({ kind: 'rightVentricle', site, hisCapture, timeMs });

/** The model's own fascicle delays. */
const native = Object.fromEntries(Object.entries(fascicles).map(([name, { delayMs }]) => [name, delayMs]));

function times(pattern: ReturnType<typeof activationPattern>): Record<string, number> {
  return Object.fromEntries(
    [
      ...pattern.muscle.map(({ site, timeMs }) => [site, timeMs] as const),
      ...pattern.fascicles.map(({ fascicle, timeMs }) => [fascicle, timeMs] as const),
    ].map(([name, time]) => [name, Math.round(time * 1000) / 1000]),
  );
}

function delayed(delayMs: number): Record<string, number> {
  return Object.fromEntries(
    Object.entries(native).map(([name, time]) => [name, Math.round((time + delayMs) * 1000) / 1000]),
  );
}

describe('activation pattern', () => {
  it.each([
    ['apex', 'rvApex'],
    ['septum', 'rvSept'],
    ['outflow', 'rvOt'],
  ] as const)('right ventricular %s is the muscle site %s', (site, model) => {
    expect(times(activationPattern([right(site, 'selective', 12)], 'none'))).toEqual({ [model]: 12 });
  });

  it.each([
    ['lateral', 'lvLat'],
    ['posterolateral', 'lvPostlat'],
    ['anterolateral', 'lvAntlat'],
  ] as const)('left ventricular %s is the muscle site %s', (site, model) => {
    const pattern = activationPattern([{ kind: 'leftVentricle', site, timeMs: 40 }], 'none');
    expect(times(pattern)).toEqual({ [model]: 40 });
  });

  it('conducted and junctional beats start all four fascicles', () => {
    for (const kind of ['conducted', 'junctionalEscape'] as const) {
      expect(times(activationPattern([{ kind, timeMs: 25 }], 'none'))).toEqual(delayed(25));
    }
  });

  it('a ventricular escape starts at the inferior wall', () => {
    expect(times(activationPattern([{ kind: 'ventricularEscape', timeMs: 0 }], 'left'))).toEqual({
      lvInf: 0,
    });
  });

  it('selective His capture conducts 40 ms after the spike, without muscle', () => {
    expect(times(activationPattern([right('his', 'selective')], 'none'))).toEqual(delayed(40));
  });

  it('nonselective His capture adds septal muscle at once', () => {
    expect(times(activationPattern([right('his')], 'none'))).toEqual({ hisSept: 0, ...delayed(35) });
  });

  it('left bundle area pacing reaches the left fascicles 16 ms later and the right bundle at 36.9 ms', () => {
    const { LAF, LSF, LPF } = delayed(16);
    expect(times(activationPattern([right('leftBundle')], 'none'))).toEqual({
      lbb: 0,
      LAF,
      LSF,
      LPF,
      RBB: 36.9,
    });
  });

  it('drops the blocked fascicles of conducted, His and left bundle beats, and of fusion', () => {
    const names = (sources: VentricularSource[], block: 'left' | 'right'): string[] =>
      Object.keys(times(activationPattern(sources, block))).sort();
    expect(names([{ kind: 'conducted', timeMs: 0 }], 'left')).toEqual(['RBB']);
    expect(names([{ kind: 'conducted', timeMs: 0 }], 'right')).toEqual(['LAF', 'LPF', 'LSF']);
    expect(names([right('his')], 'left')).toEqual(['RBB', 'hisSept']);
    expect(names([right('leftBundle')], 'right')).toEqual(['LAF', 'LPF', 'LSF', 'lbb']);
    expect(names([right('apex'), { kind: 'conducted', timeMs: 30 }], 'left')).toEqual(['RBB', 'rvApex']);
  });

  it('keeps a source when the whole left bundle is blocked under a left bundle area lead', () => {
    expect(times(activationPattern([right('leftBundle')], 'left'))).toEqual({ lbb: 0, RBB: 36.9 });
  });
});
