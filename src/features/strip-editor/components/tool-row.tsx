import { actingMode } from '../../../../shared/parameters/applies';
import type { PacingParameters } from '../../../../shared/parameters/strip-parameters';
import { leadNames, type LeadName } from '../../../../shared/parameters/sheet';
import { Popover } from 'radix-ui';
import { Button, buttonClass } from '../../../components/button';
import { Segments } from '../../../components/segments';
import { SelectField } from '../../../components/select-field';
import type { ParametersEditor } from '../state/use-parameters';
import { zoomSteps, type TraceChoice, type ViewState } from '../state/view-state';

interface ToolRowProps {
  editor: ParametersEditor;
  view: ViewState;
  onView(change: Partial<ViewState>): void;
}

const traceOptions = [
  { value: 'electrodes', label: 'At the electrodes' },
  { value: 'recorded', label: 'As recorded' },
  { value: 'both', label: 'Both' },
] as const satisfies { value: TraceChoice; label: string }[];

const compareOptions = [
  { value: 'none', label: 'One bandwidth' },
  { value: 'monitor', label: 'Beside monitor' },
  { value: 'diagnostic', label: 'Beside diagnostic' },
  { value: 'slowWave', label: 'Beside slow-wave' },
  { value: 'unfiltered', label: 'Beside unfiltered' },
] as const;

/** A device without an open ear has no windows to show. */
function sensesAnything(pacing: PacingParameters): boolean {
  return pacing.source !== 'none' && !actingMode(pacing).endsWith('OO');
}

const durations = [6, 10, 30, 60];

function LeadChoice({ editor, view, onView }: ToolRowProps) {
  const { leads } = editor.parameters.sheet;
  const toggle = (lead: LeadName): void => {
    const next = leadNames.filter((one) => (one === lead ? !leads.includes(one) : leads.includes(one)));
    if (next.length > 0) editor.set('sheet.leads', next);
    onView({ twelve: false });
  };
  return (
    <span className="inline-flex items-center gap-2">
      <Segments
        small
        label="Leads"
        value={view.twelve ? 'twelve' : 'chosen'}
        options={[
          { value: 'chosen', label: leads.length > 3 ? `${leads.length} leads` : leads.join(', ') },
          { value: 'twelve', label: 'All twelve' },
        ]}
        onChange={(value) => onView({ twelve: value === 'twelve' })}
      />
      <Popover.Root>
        <Popover.Trigger aria-label="Choose leads" className={buttonClass('plain', true)}>
          Choose
        </Popover.Trigger>
        <Popover.Portal>
          <Popover.Content
            align="start"
            sideOffset={6}
            className="z-50 rounded-dialog border border-rule-strong bg-sheet p-3 shadow-float"
          >
            <fieldset className="grid grid-cols-3 gap-x-5 gap-y-1">
              <legend className="sr-only">Leads shown</legend>
              {leadNames.map((lead) => (
                <label key={lead} className="flex items-center gap-2 py-1 text-body pointer-coarse:py-2.5">
                  <input
                    type="checkbox"
                    className="size-4 accent-teal"
                    checked={leads.includes(lead)}
                    onChange={() => toggle(lead)}
                  />
                  {lead}
                </label>
              ))}
            </fieldset>
          </Popover.Content>
        </Popover.Portal>
      </Popover.Root>
    </span>
  );
}

/** How the strip is looked at: leads, traces, bandwidths, speed, gain, zoom, calipers. */
export function ToolRow({ editor, view, onView }: ToolRowProps) {
  const { sheet, durationS } = editor.parameters;
  const zoomAt = zoomSteps.indexOf(view.zoom as (typeof zoomSteps)[number]);
  const zoomBy = (step: number): void => onView({ zoom: zoomSteps[zoomAt + step] ?? view.zoom });
  return (
    <div
      role="toolbar"
      aria-label="View"
      className="flex items-center gap-x-2 gap-y-2 overflow-x-auto px-4 py-2 tablet:flex-wrap tablet:overflow-x-visible tablet:px-6"
    >
      <LeadChoice editor={editor} view={view} onView={onView} />
      <Segments
        small
        label="Trace"
        value={view.trace}
        options={traceOptions}
        onChange={(trace) => onView({ trace })}
      />
      <SelectField
        small
        label="Second bandwidth"
        value={view.compare ?? 'none'}
        options={compareOptions}
        onChange={(value) => onView({ compare: value === 'none' ? null : value })}
      />
      <Segments
        small
        label="Paper speed"
        value={String(sheet.speedMmPerS)}
        options={[
          { value: '25', label: '25 mm/s' },
          { value: '50', label: '50' },
        ]}
        onChange={(value) => editor.set('sheet.speedMmPerS', Number(value))}
      />
      <Segments
        small
        label="Gain"
        value={String(sheet.gainMmPerMv)}
        options={[
          { value: '5', label: '5' },
          { value: '10', label: '10 mm/mV' },
          { value: '20', label: '20' },
        ]}
        onChange={(value) => editor.set('sheet.gainMmPerMv', Number(value))}
      />
      <SelectField
        small
        label="Duration"
        value={String(durationS)}
        options={[...new Set([...durations, durationS])]
          .sort((a, b) => a - b)
          .map((seconds) => ({ value: String(seconds), label: `${seconds} s` }))}
        onChange={(value) => editor.set('durationS', Number(value))}
      />
      <span className="inline-flex items-center gap-1.5">
        <Button small aria-label="Zoom out" disabled={zoomAt <= 0} onClick={() => zoomBy(-1)}>
          −
        </Button>
        <span className="w-12 text-center font-mono text-caption">{Math.round(100 * view.zoom)} %</span>
        <Button
          small
          aria-label="Zoom in"
          disabled={zoomAt >= zoomSteps.length - 1}
          onClick={() => zoomBy(1)}
        >
          +
        </Button>
      </span>
      <Button
        small
        aria-pressed={view.calipers}
        onClick={() => onView({ calipers: !view.calipers })}
        kind={view.calipers ? 'primary' : 'plain'}
      >
        Calipers
      </Button>
      {sensesAnything(editor.parameters.pacing) && (
        <Button
          small
          aria-pressed={view.windows}
          onClick={() => onView({ windows: !view.windows })}
          kind={view.windows ? 'primary' : 'plain'}
        >
          Sensing windows
        </Button>
      )}
    </div>
  );
}
