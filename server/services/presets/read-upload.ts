import { InvalidInputError } from '../../../shared/errors';
import { deepestJson, nestsTooDeep } from '../../../shared/formats/json-depth';
import { NewerFileError, readPresetFile, type PresetFile } from '../../../shared/formats/preset-file';
import { newerFile, presetFileRefused } from '../../errors';

/** A byte order mark at the start is passed over. */
function parsedJson(bytes: Uint8Array): unknown {
  const refuse = (value: string, allowed: string): never => {
    throw new InvalidInputError([{ path: 'file', value, allowed }]);
  };
  if (nestsTooDeep(bytes)) return refuse('nested lists or objects', `${deepestJson} levels`);
  try {
    const text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
    return JSON.parse(text) as unknown;
  } catch (error) {
    const words = error instanceof SyntaxError ? `no JSON (${error.message})` : 'bytes that are not text';
    return refuse(words, 'a preset file: JSON in UTF-8');
  }
}

/** The presets of an uploaded file. Throws `newerFile`, and `invalidInput` with every problem. */
export function readPresetUpload(bytes: Uint8Array): PresetFile {
  try {
    return readPresetFile(parsedJson(bytes));
  } catch (error) {
    if (error instanceof NewerFileError) throw newerFile(error.message);
    if (error instanceof InvalidInputError) throw presetFileRefused(error.problems);
    throw error;
  }
}
