/** Where the criteria that define presets come from, in the words that stand beside each. */
export const sources = {
  practice: 'common practice, no source',
  apexWidth:
    'Kawakami et al., PACE, doi 10.1111/pace.12047; Alhous et al. 2011, Europace 13:1738 (abstracts read)',
  apexPattern: 'pacing textbooks (from memory)',
  outflowPattern: 'pacing textbooks (from memory)',
  hisGuide: 'pocket guideline on conduction system pacing, table 3 (read)',
  leftBundle: 'Front Cardiovasc Med 2022, doi 10.3389/fcvm.2022.885201 (abstract read)',
  bundleBlock: 'Surawicz et al. 2009, AHA/ACCF/HRS recommendations, part III (summary read)',
  normal:
    'Surawicz et al. 2009, AHA/ACCF/HRS recommendations, part III (summary read); concordance study, table 1',
  biventricular: 'ECG patterns in biventricular pacing, 181 patients (read in a public text)',
  leftVentricle:
    'usefulness of the 12-lead ECG in follow-up of resynchronization, part I (read in a public text)',
  nbg: 'Bernstein et al. 2002, the revised NBG code (read in a public text)',
  timing: 'Bernstein and Parsonnet 1995 (legend read); ventricular-based timing',
  upperRate: 'Pacing Clin Electrophysiol 1985;8:197 (abstract read)',
  loop: 'worked example: cycle = max(upper rate interval, retrograde conduction + sensed AV delay)',
  magnet: 'device manuals (read in a public text)',
  strength: 'strength–duration law; output at twice the threshold (read in a public text)',
  safetyPace: 'device dictionary: 110 ms (read in a public text)',
  block: 'AV block types, textbook (read in a public text)',
  fibrillation: 'RR intervals in atrial fibrillation (read in a public text)',
  sgarbossa: 'Sgarbossa et al. 1996; Smith et al. 2012; Meyers et al. 2015 (read in a public text)',
  native: 'Fourth Universal Definition of Myocardial Infarction (from memory)',
  bandwidth:
    'area rule: what a first pass through a 40 or 150 Hz limit leaves of a short pulse (worked examples)',
  electrodes: 'electrode exchange identities, two teaching texts (read in a public text)',
  chest: 'transcutaneous pacing texts (read in a public text)',
} as const;
export type SourceText = (typeof sources)[keyof typeof sources];
