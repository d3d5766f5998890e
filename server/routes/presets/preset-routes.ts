import type { Request } from 'express';
import type {
  importAnalysisResponseSchema,
  importResultResponseSchema,
} from '../../../shared/api/preset-files';
import {
  exportPresetsSchema,
  importDecisionSchema,
  presetFileName,
  type ImportDecision,
} from '../../../shared/api/preset-files';
import type { z } from 'zod';
import { invalidInput } from '../../errors';
import { signedInAccount } from '../../middleware/authenticate';
import { bodyOf, parsed } from '../../middleware/validate';
import { exportPresets } from '../../services/presets/export-presets';
import { importPresets } from '../../services/presets/import-presets';
import { lookAtPresets } from '../../services/presets/look-at-presets';
import { readPresetUpload } from '../../services/presets/read-upload';
import type { StripDependencies } from '../../services/strips/keep-strips';
import type { RouteHandlers } from '../register-routes';

/** The field `decision` of an upload; null without one. */
function decisionOf(request: Request): ImportDecision | null {
  const { decision } = (request.body ?? {}) as { decision?: string };
  if (decision === undefined) return null;
  try {
    return parsed(importDecisionSchema, JSON.parse(decision));
  } catch (error) {
    if (!(error instanceof SyntaxError)) throw error;
    throw invalidInput([{ path: 'decision', value: 'text that is not JSON', allowed: 'JSON' }]);
  }
}

/** Presets as files, out of the library and into it. */
export function presetRoutes(
  dependencies: StripDependencies,
): RouteHandlers<'POST /api/strips/export' | 'POST /api/strips/import'> {
  const { database } = dependencies;
  return {
    'POST /api/strips/export': async (request, response) => {
      const wanted = bodyOf(exportPresetsSchema, request);
      const text = await exportPresets(database, signedInAccount(request), wanted);
      response.type('application/json').attachment(presetFileName).send(text);
    },
    'POST /api/strips/import': async (request, response) => {
      const account = signedInAccount(request);
      const decision = decisionOf(request);
      const file = readPresetUpload(request.file?.buffer ?? Buffer.alloc(0));
      if (decision === null) {
        const { analysis } = await lookAtPresets(database, account, file);
        response.json({ analysis } satisfies z.output<typeof importAnalysisResponseSchema>);
      } else {
        const result = await importPresets(dependencies, account, file, decision);
        response.json({ result } satisfies z.output<typeof importResultResponseSchema>);
      }
    },
  };
}
