import { choiceField, numberField, section } from './fields';

const territories = {
  none: 'None',
  anterior: 'Anterior',
  inferior: 'Inferior',
  lateral: 'Lateral',
  posterior: 'Posterior',
} as const;
export type InjuryTerritory = keyof typeof territories;

/** An acute transmural injury: muscle that lost part of its plateau. */
export const injurySchema = section({
  territory: choiceField(territories, 'none', {
    label: 'Injured territory',
    help: 'Where muscle is acutely injured. The criteria in the reading support a suspicion, they rule nothing out: local practice decides.',
  }),
  stElevationMv: numberField(0, {
    label: 'Native ST deviation',
    unit: 'mV',
    min: 0,
    max: 0.5,
    usual: [0.1, 0.3],
    help: 'Greatest ST deviation of a normally conducted beat, 20 ms after J; what a paced beat shows follows from it.',
  }),
});
