import { Notice } from '../../../components/notice';
import type { ParametersEditor } from '../state/use-parameters';
import { FieldSections } from './field-section';
import { pacingSections } from './sections';

/** Source, mode and timing of the pacemaker. */
export function PacingFields({ editor }: { editor: ParametersEditor }) {
  const { source, magnetApplied } = editor.parameters.pacing;
  return (
    <>
      {source === 'transcutaneous' && (
        <div className="mb-5">
          <Notice kind="amber" title="Confirm capture with a pulse.">
            The artefact can hide a QRS or look like one. Local protocols and licensed practice decide.
          </Notice>
        </div>
      )}
      {source === 'implanted' && magnetApplied && (
        <div className="mb-5">
          <Notice kind="teal" title="A magnet lies on the device.">
            It paces at its magnet rate and senses nothing, so what it would have sensed with is not shown.
            Devices differ.
          </Notice>
        </div>
      )}
      <FieldSections editor={editor} sections={pacingSections} />
    </>
  );
}
