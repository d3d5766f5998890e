/** Tolerances in physical terms; every one says why it is as large as it is. */

/** Sums in doubles along the pipeline, mV. */
export const doubleRoundingMv = 1e-9;
/** Our filter loop against SciPy's, both in doubles, at 0.05 Hz and 8 kHz, on 10 s of an ECG of a few mV, mV. */
export const scipyRoundingMv = 1e-9;
/** A notch whose width SciPy takes in Hz and fili in octaves, at 8 kHz, on the same ECG, mV; measured 7e-8. */
export const notchWidthMv = 1e-6;
/** Our filter loop against fili's own filter at 0.05 Hz and 8 kHz: fili's form loses 1e-6 there, mV for 1 mV. */
export const filiRoundingMv = 5e-6;
/** A spike against the brute-force path: 1 % of its peak or 5 µV, whichever is greater (engine contract), mV. */
export const spikeToleranceMv = (peakMv: number): number => Math.max(0.01 * peakMv, 0.005);
/** A settled recording may differ this much from one that has run for ever, mV. */
export const settledMv = 0.005;
/** What a dropped recharge may leave, mV: a thousandth of the finest quantiser step. */
export const forgottenMv = 1e-6;
/** The diagnostic limits are inclusive; a least-squares sine over whole periods is this exact, ratio. */
export const sineFit = 1e-4;
/** Filters at 8 kHz bend frequencies a little; −3 dB points and widths are met this well, ratio. */
export const designRatio = 1e-3;
/**
 * Files whose steps are the quantiser's hold every sample exactly; what is left is Float32 in mV (1e-3 µV at 20 mV) and a
 * header field of seven characters, µV.
 */
export const exactFileUv = 0.02;
