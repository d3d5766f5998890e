import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import {
  importAnalysisSchema,
  presetFileLimitMb,
  type ImportAnalysis,
  type ImportResult,
} from '../../../../shared/api/preset-files';
import { mostPresetsInFile } from '../../../../shared/formats/preset-file';
import { ApiError } from '../../../api/http';
import { importPresetFile, lookAtPresetFile } from '../../../api/preset-files';
import { stripKeys } from '../../../api/strips';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { FileDrop } from '../../../components/file-drop';
import { Notice } from '../../../components/notice';
import { ImportAnalysisView } from './import-analysis';
import { planOf, planWords, type ImportChoices } from './import-plan';
import { ImportProblems } from './import-problems';

/** The safe choice comes first. */
const noChoices: ImportChoices = { all: 'skip', single: {} };

interface LookedAt {
  file: File;
  analysis: ImportAnalysis;
  choices: ImportChoices;
  /** The library changed after the first look. */
  stale: boolean;
}

function useImport(onDone: (result: ImportResult) => void) {
  const queryClient = useQueryClient();
  const [lookedAt, setLookedAt] = useState<LookedAt | null>(null);
  const looking = useMutation({
    mutationFn: lookAtPresetFile,
    onSuccess: (analysis, file) => setLookedAt({ file, analysis, choices: noChoices, stale: false }),
  });
  const importing = useMutation({
    mutationFn: ({ file, analysis, choices }: LookedAt) =>
      importPresetFile(file, {
        token: analysis.token,
        choice: choices.all,
        exceptions: Object.entries(choices.single).map(([number, choice]) => ({
          number: Number(number),
          choice,
        })),
      }),
    onSuccess: async (result) => {
      await queryClient.invalidateQueries({ queryKey: stripKeys.all });
      onDone(result);
    },
    onError: (error, from) => {
      if (!(error instanceof ApiError) || error.id !== 'staleImport') return;
      const fresh = importAnalysisSchema.safeParse(error.details.analysis);
      if (fresh.success) setLookedAt({ ...from, analysis: fresh.data, choices: noChoices, stale: true });
    },
  });
  const restart = (): void => {
    setLookedAt(null);
    looking.reset();
    importing.reset();
  };
  const failure = looking.error ?? (lookedAt?.stale ? null : importing.error);
  return { lookedAt, setLookedAt, looking, importing, restart, failure };
}

interface ImportDialogProps {
  onDone(result: ImportResult): void;
  onClose(): void;
}

/** From a file to strips: choose it, look at what it would do, decide, import. */
export function ImportDialog({ onDone, onClose }: ImportDialogProps) {
  const { lookedAt, setLookedAt, looking, importing, restart, failure } = useImport(onDone);
  const plan = lookedAt && planOf(lookedAt.analysis, lookedAt.choices);
  const changes = plan !== null && plan.adds + plan.replaces > 0;
  return (
    <Dialog
      open
      title="Import presets"
      description={
        lookedAt || failure
          ? undefined
          : 'Presets travel with their titles, teaching points, tags and parameters. Those that are new become yours, and only you see them until you share them.'
      }
      onClose={onClose}
    >
      {failure && (
        <div className="mt-3">
          <ImportProblems error={failure} />
        </div>
      )}
      {!lookedAt && !failure && (
        <div className="mt-4">
          <FileDrop
            text={`Drop a preset file here: .json, at most ${mostPresetsInFile} presets and ${presetFileLimitMb}\u00a0MB.`}
            accept=".json,application/json"
            label="Choose a file"
            busy={looking.isPending ? 'Reading the file …' : undefined}
            onFile={(file) => looking.mutate(file)}
          />
        </div>
      )}
      {lookedAt && !failure && (
        <>
          {lookedAt.stale && (
            <div className="mt-3">
              <Notice kind="amber" title="The library changed meanwhile.">
                Nothing was imported. This is how it stands now.
              </Notice>
            </div>
          )}
          <ImportAnalysisView
            analysis={lookedAt.analysis}
            choices={lookedAt.choices}
            onChange={(choices) => setLookedAt({ ...lookedAt, choices })}
          />
          {plan && (
            <p role="status" className="mt-3 text-dense text-ink-2">
              {planWords(plan)}
            </p>
          )}
        </>
      )}
      <div className="mt-5 flex flex-wrap justify-end gap-2.5">
        <Button onClick={onClose}>Cancel</Button>
        {failure && <Button onClick={restart}>Choose another file</Button>}
        {lookedAt && !failure && (
          <Button
            kind="primary"
            disabled={!changes || importing.isPending}
            onClick={() => importing.mutate(lookedAt)}
          >
            {importing.isPending ? 'Importing …' : 'Import'}
          </Button>
        )}
      </div>
    </Dialog>
  );
}
