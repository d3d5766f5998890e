import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { conditionalPaths, choiceApplies, parameterApplies } from '../../../shared/parameters/applies';
import { fieldMeta, schemaAt } from '../../../shared/parameters/allowed';
import { withValueAt } from '../../../shared/parameters/assign-path';
import { readStripParameters } from '../../../shared/parameters/parse';
import {
  stripParametersSchema,
  type StripParameters,
  type StripParametersInput,
} from '../../../shared/parameters/strip-parameters';
import { arbitraryRhythm } from '../../support/arbitrary-strips';
import { buildStrip, eventsOf } from '../../support/strips';

/** Some other legal value of a field. */
function anotherValue(path: string, current: unknown): unknown {
  const meta = fieldMeta(schemaAt(stripParametersSchema, path.split('.'))!)!;
  if (meta.kind === 'flag') return current !== true;
  if (meta.kind === 'choice') return Object.keys(meta.options).find((option) => option !== current);
  if (meta.kind === 'number') return current === meta.min ? meta.max : meta.min;
  throw new Error(`${path} is text`);
}

const at = (parameters: StripParameters, path: string): unknown =>
  path.split('.').reduce<unknown>((value, key) => (value as Record<string, unknown>)[key], parameters);

// Where a lead lies also says when a wave counts as having come through: for a P wave from below, and for the
// refractory period under chest pads (timing cycles, sections 3 and 8).
const describesPatient = (path: string): boolean =>
  path === 'pacing.atrialLead.site' || path === 'pacing.rightVentricularLead.site';

const plain = conditionalPaths.filter(
  (path) =>
    !path.includes('*') &&
    path !== 'pacing.faults' &&
    !path.startsWith('disturbance.') &&
    // Injury changes the shape of a beat, never an event.
    !path.startsWith('patient.injury.'),
);

describe('what does not apply', () => {
  it('changes no event', () => {
    const tried = new Set<string>();
    fc.assert(
      fc.property(arbitraryRhythm, (input) => {
        const strip = { ...buildStrip(input), durationS: 6 };
        const before = JSON.stringify(eventsOf(strip));
        for (const path of plain) {
          if (parameterApplies(strip, path) || describesPatient(path)) continue;
          const changed = withValueAt(strip, path.split('.'), anotherValue(path, at(strip, path)));
          const result = readStripParameters(changed);
          if (!result.ok) continue;
          tried.add(path);
          const after = JSON.stringify(eventsOf(result.parameters));
          if (after !== before) throw new Error(`${path} acts, although it does not apply`);
        }
      }),
      { numRuns: 40, seed: 11 },
    );
    // The search reached every condition but those that no random patient fulfils.
    expect(plain.filter((path) => !tried.has(path) && !describesPatient(path))).toEqual([]);
  });
});

describe('what applies', () => {
  const applies = (input: StripParametersInput, path: string): boolean =>
    parameterApplies(buildStrip(input), path);

  it.each<[string, StripParametersInput, string, boolean]>([
    [
      'no atrial lead in VVI',
      { pacing: { source: 'implanted', mode: 'VVI' } },
      'pacing.atrialLead.site',
      false,
    ],
    [
      'an atrial lead that only senses in VDD',
      { pacing: { source: 'implanted', mode: 'VDD' } },
      'pacing.atrialLead.signalMv',
      true,
    ],
    [
      'no atrial output in VDD',
      { pacing: { source: 'implanted', mode: 'VDD' } },
      'pacing.atrialLead.amplitudeV',
      false,
    ],
    ['no PVARP in VVI', { pacing: { source: 'implanted', mode: 'VVI' } }, 'pacing.pvarpMs', false],
    [
      'no PVARP under a magnet',
      { pacing: { source: 'implanted', magnetApplied: true } },
      'pacing.pvarpMs',
      false,
    ],
    [
      'no left lead without the fifth letter',
      { pacing: { source: 'implanted' } },
      'pacing.leftVentricularLead.site',
      false,
    ],
    [
      'a left lead with it',
      { pacing: { source: 'implanted', mode: 'DDDOV' } },
      'pacing.leftVentricularLead.site',
      true,
    ],
    [
      'volts for no temporary lead',
      { pacing: { source: 'transvenous' } },
      'pacing.rightVentricularLead.amplitudeV',
      false,
    ],
    ['milliamperes for it', { pacing: { source: 'transvenous' } }, 'pacing.transvenous.outputMa', true],
    ['no coupling without premature beats', {}, 'patient.prematureCouplingMs', false],
    [
      'an interval of false senses for oversensing only',
      { pacing: { source: 'implanted', faults: [{}] } },
      'pacing.faults.0.intervalMs',
      false,
    ],
    ['the title, always', {}, 'title', true],
  ])('%s', (_, input, path, expected) => {
    expect(applies(input, path)).toBe(expected);
  });

  it('offers only modes and chambers that go with the source, the mode and the kind of fault', () => {
    const temporary = buildStrip({ pacing: { source: 'transcutaneous', faults: [{}] } });
    expect(choiceApplies(temporary, 'pacing.mode', 'DDD')).toBe(false);
    expect(choiceApplies(temporary, 'pacing.mode', 'VOO')).toBe(true);
    expect(choiceApplies(temporary, 'pacing.faults.0.chamber', 'atrium')).toBe(false);
    const both = buildStrip({
      pacing: { source: 'implanted', mode: 'DDDOV', faults: [{ kind: 'undersensing' }] },
    });
    expect(choiceApplies(both, 'pacing.ventricularChambers', 'right')).toBe(false);
    expect(choiceApplies(both, 'pacing.faults.0.chamber', 'leftVentricle')).toBe(false);
    expect(choiceApplies(both, 'pacing.faults.0.chamber', 'atrium')).toBe(true);
  });
});
