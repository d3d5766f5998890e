/** A silent heart without escape, so that nothing but the paced ventricle is on the strip. */
export const silentHeart = { atrialRhythm: 'arrest', avConduction: 'complete' } as const;
/** Sinus P waves that no longer reach the ventricles. */
export const completeBlock = { atrialRateBpm: 72, avConduction: 'complete' } as const;
