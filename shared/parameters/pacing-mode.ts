/**
 * NBG codes (TM-01 to TM-05, Bernstein et al. 2002): chamber paced, chamber sensed, response; R fourth for rate
 * response; V fifth for two ventricular sites.
 */
export const basicModes = ['AOO', 'AAI', 'VOO', 'VVI', 'VDD', 'DOO', 'DDI', 'DDD'] as const;
export type BasicMode = (typeof basicModes)[number];

export type PacingMode =
  | BasicMode
  | `${BasicMode}R`
  | `${Exclude<BasicMode, 'AOO' | 'AAI'>}OV`
  | `${Exclude<BasicMode, 'AOO' | 'AAI'>}RV`;

/** Every code that a device can be set to, plain ones first. */
export const pacingModeCodes: readonly PacingMode[] = [
  ...basicModes,
  ...basicModes.map((mode) => `${mode}R` as const),
  ...basicModes
    .filter((mode) => mode !== 'AOO' && mode !== 'AAI')
    .flatMap((mode) => [`${mode}OV` as const, `${mode}RV` as const]),
];

/** Modes of temporary pacing. */
export const temporaryModes: readonly PacingMode[] = ['VVI', 'VOO'];

/** The first three letters. */
export function basicMode(mode: PacingMode): BasicMode {
  return mode.slice(0, 3) as BasicMode;
}

/** The fourth letter is R: the sensor may raise the rate. */
export function respondsToSensor(mode: PacingMode): boolean {
  return mode.charAt(3) === 'R';
}

/** The fifth letter is V: two ventricular sites are paced. */
export function pacesBothVentricles(mode: PacingMode): boolean {
  return mode.charAt(4) === 'V';
}

/** What a device does under a magnet, by the first letter of its mode: it paces without sensing (TM-36). */
export const modeUnderMagnet: Readonly<Record<BasicMode, BasicMode>> = {
  AOO: 'AOO',
  AAI: 'AOO',
  VOO: 'VOO',
  VVI: 'VOO',
  VDD: 'VOO',
  DOO: 'DOO',
  DDI: 'DOO',
  DDD: 'DOO',
};

export function pacesAtrium(mode: PacingMode): boolean {
  return mode.charAt(0) !== 'V';
}

export function pacesVentricles(mode: PacingMode): boolean {
  return mode.charAt(0) !== 'A';
}

export function sensesAtrium(mode: PacingMode): boolean {
  return mode.charAt(1) === 'A' || mode.charAt(1) === 'D';
}

export function sensesVentricle(mode: PacingMode): boolean {
  return mode.charAt(1) === 'V' || mode.charAt(1) === 'D';
}
