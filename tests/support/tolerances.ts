/** Tolerances in physical terms; every one says why it is as large as it is. */

/** Sums in doubles along the pipeline, mV. */
export const doubleRoundingMv = 1e-9;
/** The block form against fili's own filter at 0.05 Hz and 8 kHz: fili's form loses 1e-6 there, mV for 1 mV. */
export const filiRoundingMv = 5e-6;
/** A spike against the brute-force path: 1 % of its peak or 5 µV, whichever is greater (engine contract), mV. */
export const spikeToleranceMv = (peakMv: number): number => Math.max(0.01 * peakMv, 0.005);
/** A settled recording may differ this much from one that has run for ever, mV. */
export const settledMv = 0.005;
/** The diagnostic limits are inclusive; a least-squares sine over whole periods is this exact, ratio. */
export const sineFit = 1e-4;
