import { choiceApplies } from '../../../../shared/parameters/applies';
import type { Fault } from '../../../../shared/parameters/faults';
import { Button } from '../../../components/button';
import type { ParametersEditor } from '../state/use-parameters';
import { ParameterField } from './parameter-field';

interface FaultProps {
  editor: ParametersEditor;
  index: number;
}

const path = 'pacing.faults';
/** Most faults a strip can have (the schema's limit). */
const mostFaults = 20;
/** A new fault begins here where the strip is long enough, so that before and after can be compared, s. */
const usualStartS = 4;

function newFault(durationS: number): Fault {
  return {
    kind: 'failureToCapture',
    chamber: 'rightVentricle',
    proportion: 1,
    fromS: durationS > usualStartS ? usualStartS : 0,
    toS: null,
    intervalMs: 200,
  };
}

function FaultRow({ editor, index }: FaultProps) {
  const { parameters } = editor;
  const { faults, mode } = parameters.pacing;
  const fault = faults[index];
  const at = (key: keyof Fault): string => `${path}.${index}.${key}`;
  const strikes = choiceApplies(parameters, at('chamber'), fault.chamber);
  return (
    <li className="border-t border-rule py-4 first:border-t-0">
      <div className="mb-3 flex items-center justify-between gap-3">
        <h3 className="text-dense font-semibold text-ink-2">{`Fault ${index + 1}`}</h3>
        <Button
          small
          kind="quiet"
          onClick={() =>
            editor.set(
              path,
              faults.filter((_, i) => i !== index),
            )
          }
        >
          {`Remove fault ${index + 1}`}
        </Button>
      </div>
      {!strikes && (
        <p className="mb-3 text-dense text-amber-ink">
          {`With the mode ${mode} this fault strikes nothing: choose another chamber.`}
        </p>
      )}
      <div className="grid grid-cols-[minmax(0,1fr)] gap-x-9 gap-y-5 tablet:grid-cols-2 wide:grid-cols-3">
        <ParameterField editor={editor} path={at('kind')} />
        <ParameterField editor={editor} path={at('chamber')} />
        <ParameterField editor={editor} path={at('proportion')} />
        <ParameterField editor={editor} path={at('fromS')} max={parameters.durationS} />
        <ParameterField
          editor={editor}
          path={at('toS')}
          max={Math.max(parameters.durationS, fault.toS ?? 0)}
        />
        <ParameterField editor={editor} path={at('intervalMs')} />
      </div>
    </li>
  );
}

/** Faults of the system, each over its stretch of the strip. */
export function FaultFields({ editor }: { editor: ParametersEditor }) {
  const { durationS, pacing } = editor.parameters;
  const { faults } = pacing;
  return (
    <div className="pt-4">
      {faults.length === 0 && (
        <p className="mb-4 max-w-prose text-body text-ink-2">
          No fault is set: capture and sensing follow from outputs, thresholds, signals and sensitivities. A
          fault strikes whatever those are, over a stretch of the strip, always or now and then.
        </p>
      )}
      <ul>
        {faults.map((_, index) => (
          <FaultRow key={index} editor={editor} index={index} />
        ))}
      </ul>
      <Button
        disabled={faults.length >= mostFaults}
        onClick={() => editor.set(path, [...faults, newFault(durationS)])}
      >
        Add a fault
      </Button>
    </div>
  );
}
