import { atLeast, atMost, exactly, within } from '../criterion';
import type { GalleryPreset } from '../gallery-preset';
import { sources } from '../sources';
import { completeBlock, silentHeart } from './patients';

const group = 'recognise-the-chamber';

export const recogniseTheChamber: readonly GalleryPreset[] = [
  {
    id: 'sinus-rhythm',
    title: 'Sinus rhythm, no pacemaker',
    teachingPoint:
      'The strip to compare with: P wave, PR interval, narrow QRS, upright T. No spike stands before anything.',
    tags: ['native', 'sinus rhythm', 'narrow QRS'],
    group,
    parameters: { patient: { atrialRateBpm: 68 } },
    criteria: [
      exactly('stimuli.rightVentricle', 0, sources.practice),
      within('ms.qrs', 70, 110, sources.normal),
      within('ms.pr', 120, 200, sources.normal),
      within('deg.axis', -30, 90, sources.bundleBlock),
      atLeast('t.II', 0.1, sources.normal),
    ],
  },
  {
    id: 'atrial-pacing',
    title: 'Atrial pacing',
    teachingPoint:
      'A small spike before every P wave, then a PR interval and the patient’s own narrow QRS: the atrium is paced, the ventricles are conducted.',
    tags: ['atrial', 'AAI', 'narrow QRS'],
    group,
    parameters: {
      patient: { atrialRateBpm: 48 },
      pacing: { source: 'implanted', mode: 'AAI', lowerRateBpm: 70 },
    },
    criteria: [
      exactly('captured.atrium', 1, sources.nbg),
      exactly('stimuli.rightVentricle', 0, sources.nbg),
      within('ms.qrs', 70, 110, sources.normal),
      within('rate.ventricular', 69.5, 70.5, sources.practice),
    ],
  },
  {
    id: 'atrial-pacing-lateral-wall',
    title: 'Atrial pacing, lateral wall',
    teachingPoint:
      'The P wave follows the spike as before, but its shape is another one: where the atrial lead sits decides how the atria are crossed.',
    tags: ['atrial', 'AAI', 'P wave shape'],
    group,
    parameters: {
      patient: { atrialRateBpm: 48 },
      pacing: { source: 'implanted', mode: 'AAI', lowerRateBpm: 75, atrialLead: { site: 'lateral' } },
      waveform: { pAmplitudeMv: 0.2 },
    },
    criteria: [
      exactly('captured.atrium', 1, sources.nbg),
      exactly('stimuli.rightVentricle', 0, sources.nbg),
      within('rate.ventricular', 74.5, 75.5, sources.practice),
    ],
  },
  {
    id: 'ventricular-pacing-apex',
    title: 'Ventricular pacing, apex',
    teachingPoint:
      'A spike, then a wide QRS, negative in V1 and in II, III and aVF, with every T wave pointing the other way: the right ventricular apex is paced.',
    tags: ['ventricular', 'VVI', 'apex', 'discordance'],
    group,
    parameters: {
      patient: silentHeart,
      pacing: { source: 'implanted', mode: 'VVI', lowerRateBpm: 70 },
    },
    criteria: [
      exactly('captured.rightVentricle', 1, sources.nbg),
      within('ms.qrs', 145, 190, sources.apexWidth),
      within('deg.axis', -90, -60, sources.apexPattern),
      atMost('net.V1', -0.5, sources.apexPattern),
      atMost('net.II', -0.3, sources.apexPattern),
      atMost('net.aVF', -0.3, sources.apexPattern),
      exactly('share.discordant', 1, sources.bundleBlock),
    ],
  },
  {
    id: 'ventricular-pacing-outflow-tract',
    title: 'Ventricular pacing, outflow tract',
    teachingPoint:
      'Still wide and negative in V1, but upright in II, III and aVF: activation runs downwards from the right ventricular outflow tract.',
    tags: ['ventricular', 'VVI', 'outflow tract', 'axis'],
    group,
    parameters: {
      patient: silentHeart,
      pacing: {
        source: 'implanted',
        mode: 'VVI',
        lowerRateBpm: 70,
        rightVentricularLead: { site: 'outflow' },
      },
    },
    criteria: [
      exactly('captured.rightVentricle', 1, sources.nbg),
      within('ms.qrs', 120, 170, sources.apexWidth),
      atLeast('net.II', 0.5, sources.outflowPattern),
      atLeast('net.III', 0.5, sources.outflowPattern),
      atLeast('net.aVF', 0.5, sources.outflowPattern),
      atMost('net.V1', -0.3, sources.outflowPattern),
    ],
  },
  {
    id: 'ventricular-pacing-septum',
    title: 'Ventricular pacing, septum',
    teachingPoint:
      'From the septum the QRS is narrower than from the apex and turns upright by V4: both ventricles are reached sooner.',
    tags: ['ventricular', 'VVI', 'septum'],
    group,
    parameters: {
      patient: silentHeart,
      pacing: {
        source: 'implanted',
        mode: 'VVI',
        lowerRateBpm: 70,
        rightVentricularLead: { site: 'septum' },
      },
    },
    criteria: [
      exactly('captured.rightVentricle', 1, sources.nbg),
      within('ms.qrs', 120, 165, sources.apexWidth),
      within('deg.axis', -60, 60, sources.apexPattern),
      atMost('net.V1', -0.4, sources.apexPattern),
      atLeast('net.V4', 0, sources.apexPattern),
    ],
  },
  {
    id: 'his-bundle-pacing',
    title: 'His bundle pacing, selective',
    teachingPoint:
      'The spike stands an isoelectric moment before a QRS that looks like the patient’s own: the His bundle is captured alone.',
    tags: ['ventricular', 'conduction system', 'His', 'narrow QRS'],
    group,
    parameters: {
      patient: { atrialRateBpm: 75, avConduction: 'complete' },
      pacing: {
        source: 'implanted',
        mode: 'DDD',
        sensedAvDelayMs: 110,
        hisCapture: 'selective',
        rightVentricularLead: { site: 'his', captureThresholdV: 1.2 },
      },
    },
    criteria: [
      exactly('captured.rightVentricle', 1, sources.hisGuide),
      within('ms.qrs', 70, 110, sources.hisGuide),
      within('ms.stimulusToQrs', 30, 50, sources.hisGuide),
    ],
  },
  {
    id: 'his-bundle-pacing-nonselective',
    title: 'His bundle pacing, nonselective',
    teachingPoint:
      'No gap after the spike: septal muscle is captured too and slurs the start, but the rest of the QRS runs through the bundles and stays fairly narrow.',
    tags: ['ventricular', 'conduction system', 'His'],
    group,
    parameters: {
      patient: { atrialRateBpm: 75, avConduction: 'complete' },
      pacing: {
        source: 'implanted',
        mode: 'DDD',
        sensedAvDelayMs: 110,
        rightVentricularLead: { site: 'his', captureThresholdV: 1.2 },
      },
    },
    criteria: [
      exactly('captured.rightVentricle', 1, sources.hisGuide),
      within('ms.qrs', 95, 130, sources.hisGuide),
      atMost('ms.stimulusToQrs', 15, sources.hisGuide),
    ],
  },
  {
    id: 'left-bundle-area-pacing',
    title: 'Left bundle area pacing',
    teachingPoint:
      'A spike, a fairly narrow QRS and a late r in V1: the left ventricle goes first through its own bundle, the right follows.',
    tags: ['ventricular', 'conduction system', 'left bundle area'],
    group,
    parameters: {
      patient: { atrialRateBpm: 75, avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'DDD', rightVentricularLead: { site: 'leftBundle' } },
    },
    criteria: [
      exactly('captured.rightVentricle', 1, sources.leftBundle),
      within('ms.qrs', 90, 132, sources.leftBundle),
      atLeast('r.V1', 0.1, sources.leftBundle),
    ],
  },
  {
    id: 'left-bundle-branch-block',
    title: 'Left bundle branch block, not paced',
    teachingPoint:
      'Wide, negative in V1, T against the QRS, like pacing from the right ventricle. But a P wave leads every beat at a steady PR, and no spike is there.',
    tags: ['native', 'left bundle branch block', 'wide QRS', 'look-alike'],
    group,
    parameters: { patient: { atrialRateBpm: 70, bundleBranchBlock: 'left' } },
    criteria: [
      exactly('stimuli.rightVentricle', 0, sources.practice),
      atLeast('ms.qrs', 120, sources.bundleBlock),
      atMost('net.V1', -0.5, sources.bundleBlock),
      atLeast('net.V6', 0.3, sources.bundleBlock),
      atMost('t.V6', -0.05, sources.bundleBlock),
      within('ms.pr', 120, 200, sources.normal),
    ],
  },
  {
    id: 'right-bundle-branch-block',
    title: 'Right bundle branch block, not paced',
    teachingPoint:
      'Wide with a second, taller R in V1 and a broad S in I and V6: the right ventricle is reached late. No spike, and conduction from the atria.',
    tags: ['native', 'right bundle branch block', 'wide QRS', 'look-alike'],
    group,
    parameters: { patient: { atrialRateBpm: 70, bundleBranchBlock: 'right' } },
    criteria: [
      exactly('stimuli.rightVentricle', 0, sources.practice),
      atLeast('ms.qrs', 120, sources.bundleBlock),
      atLeast('r.V1', 0.3, sources.bundleBlock),
      atMost('s.V6', -0.2, sources.bundleBlock),
    ],
  },
  {
    id: 'ventricular-escape',
    title: 'Ventricular escape, not paced',
    teachingPoint:
      'Slow, wide beats that ignore the P waves, without a single spike: the ventricles save themselves. This patient needs the pacemaker of the next strip.',
    tags: ['native', 'complete block', 'escape', 'look-alike'],
    group,
    parameters: {
      patient: { ...completeBlock, escapeSite: 'ventricular', escapeRateBpm: 34 },
    },
    criteria: [
      exactly('stimuli.rightVentricle', 0, sources.practice),
      atLeast('beats.ventricularEscape', 4, sources.block),
      exactly('beats.conducted', 0, sources.block),
      within('rate.ventricular', 30, 40, sources.practice),
      atLeast('ms.qrs', 120, sources.practice),
    ],
  },
];
