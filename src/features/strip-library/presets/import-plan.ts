import type { ImportAnalysis, ImportChoice, LookedAtPreset } from '../../../../shared/api/preset-files';

/** What is chosen for all presets that are here already, and for single ones by their number. */
export interface ImportChoices {
  all: ImportChoice;
  single: Readonly<Record<number, ImportChoice>>;
}

export interface ImportPlan {
  adds: number;
  replaces: number;
  leaves: number;
  /** Of those left: asked to be replaced, but not the person's to change. */
  refused: number;
}

export function choiceFor({ number }: LookedAtPreset, { all, single }: ImportChoices): ImportChoice {
  return single[number] ?? all;
}

/** What an import with these choices would do. */
export function planOf({ presets }: ImportAnalysis, choices: ImportChoices): ImportPlan {
  const plan: ImportPlan = { adds: 0, replaces: 0, leaves: 0, refused: 0 };
  for (const preset of presets) {
    const choice = choiceFor(preset, choices);
    const { match } = preset;
    if (match === null || choice === 'keepBoth') plan.adds++;
    else if (choice === 'replace' && preset.status === 'changed' && match.replaceable) plan.replaces++;
    else {
      plan.leaves++;
      if (choice === 'replace' && preset.status === 'changed') plan.refused++;
    }
  }
  return plan;
}

const counted = (count: number, one: string, many: string): string => `${count} ${count === 1 ? one : many}`;

/** How many presets are new and how many are here. */
export function analysisWords({ presets }: ImportAnalysis): string {
  const known = presets.filter(({ match }) => match !== null).length;
  const parts = [`${presets.length - known} new`, `${known} here already`];
  return `${counted(presets.length, 'preset', 'presets')}: ${parts.join(', ')}.`;
}

/** What will happen, in a sentence. */
export function planWords({ adds, replaces, leaves, refused }: ImportPlan): string {
  if (adds + replaces === 0) return 'Nothing would change.';
  const parts = [
    ...(adds > 0 ? [`adds ${counted(adds, 'strip', 'strips')} of your own`] : []),
    ...(replaces > 0 ? [`replaces ${replaces}`] : []),
    ...(leaves > 0 ? [`leaves ${leaves} as ${leaves === 1 ? 'it is' : 'they are'}`] : []),
  ];
  const shipped =
    refused > 0
      ? ` ${refused} of them ${refused === 1 ? 'ships' : 'ship'} with the product and cannot be replaced.`
      : '';
  return `This ${parts.join(', ')}.${shipped}`;
}

/** What a preset of the file is to this library, in a few words. */
export function presetWords({ status, match }: LookedAtPreset): string {
  if (match === null) return 'New';
  const where = { me: 'yours', department: 'the department’s', gallery: 'in the gallery' }[match.keptBy];
  return status === 'same' ? `Here already, the same (${where})` : `Here with other content (${where})`;
}
