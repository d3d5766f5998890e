import { InvalidInputError } from '../errors';
import { parseStripParameters } from '../parameters/parse';
import type { StripParameters } from '../parameters/strip-parameters';
import type { GalleryPreset } from './gallery-preset';
import { capture } from './presets/capture';
import { infarctInPacedRhythm } from './presets/infarct-in-paced-rhythm';
import { recogniseTheChamber } from './presets/recognise-the-chamber';
import { sensing } from './presets/sensing';
import { temporaryPacing } from './presets/temporary-pacing';
import { trapsAndArtefacts } from './presets/traps-and-artefacts';
import { twoChambers } from './presets/two-chambers';
import { twoVentricles } from './presets/two-ventricles';
import { upperRate } from './presets/upper-rate';

/** Every preset that ships, in the order of the course. */
export const gallery: readonly GalleryPreset[] = [
  ...recogniseTheChamber,
  ...twoChambers,
  ...twoVentricles,
  ...capture,
  ...sensing,
  ...upperRate,
  ...temporaryPacing,
  ...infarctInPacedRhythm,
  ...trapsAndArtefacts,
];

/** The preset with this id; throws `InvalidInputError` listing the ids there are. */
export function galleryPreset(id: string): GalleryPreset {
  const preset = gallery.find((one) => one.id === id);
  if (preset) return preset;
  throw new InvalidInputError([
    {
      path: 'preset',
      value: JSON.stringify(id),
      allowed: `one of ${gallery.map((one) => one.id).join(', ')}`,
    },
  ]);
}

/** A preset's full parameters, under its own title and teaching point. */
export function presetParameters(preset: GalleryPreset): StripParameters {
  return parseStripParameters(presetInput(preset));
}

/** A preset's parameters as given, with its title and teaching point filled in. */
export function presetInput(preset: GalleryPreset): GalleryPreset['parameters'] {
  return { title: preset.title, notes: preset.teachingPoint, ...preset.parameters };
}
