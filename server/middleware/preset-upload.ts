import type { RequestHandler } from 'express';
import multer, { MulterError } from 'multer';
import { presetFileLimitMb } from '../../shared/api/preset-files';
import { AppError, invalidInput, tooLarge } from '../errors';

const bytesPerMb = 1_000_000;
/** A decision about 500 presets takes about 20 kB. */
const longestDecision = 100_000;

const isJsonName = (name: string): boolean => name.toLowerCase().endsWith('.json');

const upload = multer({
  storage: multer.memoryStorage(),
  limits: {
    fileSize: presetFileLimitMb * bytesPerMb,
    files: 1,
    fields: 1,
    fieldSize: longestDecision,
    parts: 3,
  },
  fileFilter: (_request, file, done) => {
    if (isJsonName(file.originalname)) return done(null, true);
    done(
      invalidInput([
        { path: 'file', value: JSON.stringify(file.originalname), allowed: 'a preset file, ending in .json' },
      ]),
    );
  },
}).single('file');

const oneFile = 'one preset file in the field file, and at most one field decision';

function refusal(error: unknown): AppError {
  if (error instanceof AppError) return error;
  if (error instanceof MulterError && error.code === 'LIMIT_FILE_SIZE') {
    return tooLarge(`The file is larger than ${presetFileLimitMb} MB, the most a preset file may have.`);
  }
  const value = error instanceof MulterError ? error.message : 'a malformed upload';
  return invalidInput([{ path: '(root)', value, allowed: oneFile }]);
}

/** Reads an uploaded preset file into memory; anything else is refused in words. */
export const presetUpload: RequestHandler = (request, response, next) => {
  upload(request, response, (error: unknown) => {
    if (error) next(refusal(error));
    else if (request.file) next();
    else next(invalidInput([{ path: 'file', value: 'missing', allowed: `multipart/form-data: ${oneFile}` }]));
  });
};
