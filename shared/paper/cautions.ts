/** Stands on every sheet and in the metadata of every picture. */
export const syntheticCaution = 'Synthetic teaching strip, not a patient recording';

/** Stands under it. */
export const educationCaution =
  'For education only: not for diagnosis, monitoring, device programming or treatment.';
