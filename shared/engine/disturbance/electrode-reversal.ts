import type { ElectrodeReversal } from '../../parameters/disturbance';
import { measuredLeads, type MeasuredLead } from '../leads';
import { electrodes, type Electrode } from './electrodes';

type Place = Electrode | 'RL';
type Samples = Record<MeasuredLead, Float64Array>;

/** Where the wire named in a place hangs after an exchange; null without one. */
function exchanged(reversal: ElectrodeReversal): [Place, Place] | null {
  return reversal === 'none' ? null : (reversal.split('-') as [Place, Place]);
}

/** Potential at a place from the leads, with the right arm as zero; the right leg is taken equal to the left (LD-43). */
function potential(place: Place, at: (lead: MeasuredLead) => number): number {
  switch (place) {
    case 'RA':
      return 0;
    case 'LA':
      return at('I');
    case 'LL':
    case 'RL':
      return at('II');
    default:
      return at(place) + (at('I') + at('II')) / 3;
  }
}

/**
 * The eight measured leads with two electrodes on each other's place. Potentials change places before leads are formed,
 * so that limb exchanges move every lead as they do at the bedside (LD-40 to LD-46) and all identities still hold. It is
 * linear, so it may be done after band-limiting.
 */
export function reverseElectrodes(samples: Samples, reversal: ElectrodeReversal): Samples {
  const pair = exchanged(reversal);
  if (!pair) return samples;
  const placeOf = (wire: Place): Place => (wire === pair[0] ? pair[1] : wire === pair[1] ? pair[0] : wire);
  const length = samples.I.length;
  const reversed = Object.fromEntries(
    measuredLeads.map((lead) => [lead, new Float64Array(length)]),
  ) as Samples;
  const wires = Object.fromEntries(electrodes.map((wire) => [wire, 0])) as Record<Electrode, number>;
  for (let i = 0; i < length; i++) {
    for (const wire of electrodes) wires[wire] = potential(placeOf(wire), (lead) => samples[lead][i]);
    const { RA, LA, LL } = wires;
    const terminal = (RA + LA + LL) / 3;
    for (const lead of measuredLeads) {
      reversed[lead][i] = lead === 'I' ? LA - RA : lead === 'II' ? LL - RA : wires[lead] - terminal;
    }
  }
  return reversed;
}
