import { atLeast, atMost, exactly, within } from '../criterion';
import type { GalleryPreset } from '../gallery-preset';
import { sources } from '../sources';
import { silentHeart } from './patients';

const group = 'infarct-in-paced-rhythm';
const paced = { source: 'implanted', mode: 'VVI', lowerRateBpm: 75 } as const;
const twelve = { layout: '3x4+1' } as const;

export const infarctInPacedRhythm: readonly GalleryPreset[] = [
  {
    id: 'paced-without-infarct',
    title: 'Paced, no infarct',
    teachingPoint:
      'ST and T stand against the QRS in every lead, in proportion to its size: expected discordance. Learn it first; everything else is told against it.',
    tags: ['discordance', 'VVI', 'apex'],
    group,
    parameters: { patient: silentHeart, pacing: paced, sheet: twelve },
    criteria: [
      exactly('criteria.modified', 0, sources.sgarbossa),
      within('st.V2', 0, 0.4, sources.bundleBlock),
      exactly('share.discordant', 1, sources.bundleBlock),
    ],
  },
  {
    id: 'paced-anterior-infarct',
    title: 'Paced, anterior injury',
    teachingPoint:
      'ST in V3 and V4 rises out of proportion to the S wave in front of it: more than a quarter. The modified criteria are met.',
    tags: ['infarct', 'anterior', 'VVI', 'modified criteria'],
    group,
    parameters: {
      patient: { ...silentHeart, injury: { territory: 'anterior', stElevationMv: 0.45 } },
      pacing: paced,
      sheet: twelve,
    },
    criteria: [
      exactly('criteria.modified', 1, sources.sgarbossa),
      atLeast('st.V3', 0.4, sources.sgarbossa),
      atMost('net.V3', -0.3, sources.apexPattern),
    ],
  },
  {
    id: 'paced-inferior-infarct',
    title: 'Paced, inferior injury',
    teachingPoint:
      'The inferior leads are negative and their ST stands far too high for so small an S wave: the ratio gives it away, not the millimetres.',
    tags: ['infarct', 'inferior', 'VVI', 'modified criteria'],
    group,
    parameters: {
      patient: { ...silentHeart, injury: { territory: 'inferior', stElevationMv: 0.35 } },
      pacing: paced,
      sheet: twelve,
    },
    criteria: [
      exactly('criteria.modified', 1, sources.sgarbossa),
      atLeast('st.III', 0.25, sources.sgarbossa),
      atLeast('st.aVF', 0.25, sources.sgarbossa),
    ],
  },
  {
    id: 'paced-posterior-infarct',
    title: 'Paced, posterior injury',
    teachingPoint:
      'V1 to V3 are negative and their ST sinks with them: depression in the direction of the QRS is never expected in paced rhythm.',
    tags: ['infarct', 'posterior', 'VVI', 'concordance'],
    group,
    parameters: {
      patient: { ...silentHeart, injury: { territory: 'posterior', stElevationMv: 0.4 } },
      pacing: paced,
      sheet: twelve,
    },
    criteria: [
      exactly('criteria.modified', 1, sources.sgarbossa),
      atMost('st.V2', -0.1, sources.sgarbossa),
      atMost('net.V2', -0.3, sources.apexPattern),
    ],
  },
  {
    id: 'paced-lateral-infarct',
    title: 'Paced, lateral injury',
    teachingPoint:
      'I and aVL are positive, and their ST rises with them by a millimetre and more: concordant elevation, the strongest sign.',
    tags: ['infarct', 'lateral', 'VVI', 'concordance'],
    group,
    parameters: {
      patient: { ...silentHeart, injury: { territory: 'lateral', stElevationMv: 0.4 } },
      pacing: paced,
      sheet: twelve,
    },
    criteria: [
      exactly('criteria.modified', 1, sources.sgarbossa),
      atLeast('st.aVL', 0.1, sources.sgarbossa),
      atLeast('net.aVL', 0.1, sources.apexPattern),
    ],
  },
  {
    id: 'paced-infarct-missed',
    title: 'Paced, injury that no criterion finds',
    teachingPoint:
      'The same anterior injury, smaller: it is there, and not one criterion is met. Criteria support a suspicion; they never end one.',
    tags: ['infarct', 'anterior', 'VVI', 'limits of criteria'],
    group,
    parameters: {
      patient: { ...silentHeart, injury: { territory: 'anterior', stElevationMv: 0.1 } },
      pacing: paced,
      sheet: twelve,
    },
    criteria: [
      exactly('criteria.modified', 0, sources.sgarbossa),
      within('st.V3', 0.15, 0.5, sources.sgarbossa),
    ],
  },
  {
    id: 'native-inferior-infarct',
    title: 'Inferior injury, own beats',
    teachingPoint:
      'The same heart without pacing: ST elevation in II, III and aVF, depression in aVL. In narrow beats the millimetres count.',
    tags: ['infarct', 'inferior', 'native', 'narrow QRS'],
    group,
    parameters: {
      patient: { atrialRateBpm: 78, injury: { territory: 'inferior', stElevationMv: 0.3 } },
      sheet: twelve,
    },
    criteria: [
      exactly('criteria.native', 1, sources.native),
      atLeast('st.III', 0.1, sources.native),
      atMost('st.aVL', -0.05, sources.native),
      exactly('stimuli.rightVentricle', 0, sources.practice),
    ],
  },
  {
    id: 'bundle-block-anterior-infarct',
    title: 'Anterior injury in left bundle branch block',
    teachingPoint:
      'Not paced, but as wide and as discordant: the same criteria serve, lead by lead, against the S wave.',
    tags: ['infarct', 'anterior', 'left bundle branch block', 'modified criteria'],
    group,
    parameters: {
      patient: { bundleBranchBlock: 'left', injury: { territory: 'anterior', stElevationMv: 0.5 } },
      sheet: twelve,
    },
    criteria: [
      exactly('criteria.modified', 1, sources.sgarbossa),
      atLeast('ms.qrs', 120, sources.bundleBlock),
      atLeast('st.V3', 0.3, sources.sgarbossa),
    ],
  },
];
