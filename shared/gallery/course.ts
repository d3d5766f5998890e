/** The gallery is a course: groups in the order in which they are taught. */
export const courseGroups = [
  { id: 'recognise-the-chamber', title: 'Recognise the chamber' },
  { id: 'two-chambers', title: 'Two chambers' },
  { id: 'two-ventricles', title: 'Two ventricles' },
  { id: 'capture', title: 'Capture' },
  { id: 'sensing', title: 'Sensing' },
  { id: 'upper-rate', title: 'Upper rate' },
  { id: 'temporary-pacing', title: 'Temporary pacing' },
  { id: 'infarct-in-paced-rhythm', title: 'Infarct in paced rhythm' },
  { id: 'traps-and-artefacts', title: 'Traps and artefacts' },
] as const;

export type CourseGroupId = (typeof courseGroups)[number]['id'];
