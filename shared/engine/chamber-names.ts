import type { StimulusChamber } from './events';

/** Where a stimulus is given, as it stands after "in the". */
export const chamberNames: Readonly<Record<StimulusChamber, string>> = {
  atrium: 'atrium',
  rightVentricle: 'right ventricle',
  leftVentricle: 'left ventricle',
  chest: 'chest pads',
};
