import { useMutation } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import {
  presetFileName,
  type ExportPresetsInput,
  type ImportResult,
} from '../../../../shared/api/preset-files';
import { requestPresetFile } from '../../../api/preset-files';
import { useToast } from '../../../components/toast';
import { download } from '../../../lib/download';
import { paths } from '../../../lib/paths';

function resultWords({ added, replaced, notReplaceable }: ImportResult): string {
  const parts = [
    ...(added.length > 0 ? [`${added.length} added`] : []),
    ...(replaced.length > 0 ? [`${replaced.length} replaced`] : []),
    ...(notReplaceable.length > 0 ? [`${notReplaceable.length} could not be replaced`] : []),
  ];
  return `Presets imported: ${parts.join(', ')}`;
}

/** Saving strips as a preset file, and saying what an import did, with the way to it. */
export function usePresetFiles() {
  const toast = useToast();
  const navigate = useNavigate();
  const saving = useMutation({
    mutationFn: (request: ExportPresetsInput) => requestPresetFile(request),
    onSuccess: (bytes) => download(presetFileName, 'application/json', bytes),
    onError: (error) => toast(`The presets were not saved. ${error.message}`),
  });
  const announce = (result: ImportResult): void => {
    const touched = [...result.added, ...result.replaced];
    const [only] = touched;
    const target = touched.length === 1 ? paths.strip(only.id) : paths.latestStrips();
    toast(resultWords(result), {
      label: touched.length === 1 ? 'Open it' : 'Show them',
      onClick: () => void navigate(target),
    });
  };
  return { save: saving.mutate, saving: saving.isPending, announce };
}
