import { useState } from 'react';
import { parameterApplies } from '../../../../shared/parameters/applies';
import { chestThresholdMa, thresholdV } from '../../../../shared/engine/rhythm/capture';
import type { StripParameters } from '../../../../shared/parameters/strip-parameters';
import { Tabs } from '../../../components/tabs';
import type { ParameterPath } from '../state/parameter-paths';
import type { ParametersEditor } from '../state/use-parameters';
import { FaultFields } from './fault-fields';
import { ParameterField } from './parameter-field';
import { chestPaths, leadPaths, temporaryLeadPaths } from './sections';
import { StrengthDuration } from './strength-duration';

interface GroupProps {
  editor: ParametersEditor;
}

type LeadKey = 'rightVentricularLead' | 'atrialLead' | 'leftVentricularLead';
type TabKey = LeadKey | 'temporaryLead' | 'chestPads' | 'faults';

const leadNames: Record<LeadKey, string> = {
  rightVentricularLead: 'Right ventricle',
  atrialLead: 'Right atrium',
  leftVentricularLead: 'Left ventricle',
};
const leadKeys = Object.keys(leadNames) as LeadKey[];

const hasLead = (parameters: StripParameters, key: LeadKey): boolean =>
  parameterApplies(parameters, `pacing.${key}.site`);

function faultsLabel(count: number): string {
  return count === 0 ? 'Faults' : `Faults, ${count} set`;
}

function tabsOf(parameters: StripParameters): { value: TabKey; label: string }[] {
  const { source, faults } = parameters.pacing;
  const last = { value: 'faults', label: faultsLabel(faults.length) } as const;
  if (source === 'transvenous') return [{ value: 'temporaryLead', label: 'Temporary lead' }, last];
  if (source === 'transcutaneous') return [{ value: 'chestPads', label: 'Chest pads' }, last];
  const leads = leadKeys.map((key) => ({
    value: key,
    label: hasLead(parameters, key) ? leadNames[key] : `${leadNames[key]}, no lead`,
  }));
  return [...leads, last];
}

interface Marker {
  value: number;
  label: string;
}

/** Limits that belong on a field's ruler. */
function markersOf(parameters: StripParameters): Record<ParameterPath, Marker> {
  const { pacing } = parameters;
  const { transvenous, transcutaneous } = pacing;
  const markers: Record<ParameterPath, Marker> = {
    'pacing.transvenous.outputMa': {
      value: transvenous.captureThresholdMa,
      label: 'Dotted: capture threshold.',
    },
    'pacing.transvenous.sensitivityMv': {
      value: pacing.rightVentricularLead.signalMv,
      label: 'Dotted: the signal at this lead.',
    },
    'pacing.transcutaneous.currentMa': {
      value: chestThresholdMa(transcutaneous.captureThresholdMa, transcutaneous.pulseWidthMs),
      label: 'Dotted: capture threshold at this pulse width.',
    },
  };
  for (const key of leadKeys) {
    const lead = pacing[key];
    markers[`pacing.${key}.amplitudeV`] = {
      value: thresholdV(lead.captureThresholdV, lead.pulseWidthMs),
      label: 'Dotted: capture threshold at this pulse width.',
    };
    markers[`pacing.${key}.sensitivityMv`] = {
      value: lead.signalMv,
      label: 'Dotted: the signal at this lead.',
    };
  }
  return markers;
}

function Fields({ editor, paths }: GroupProps & { paths: readonly ParameterPath[] }) {
  const markers = markersOf(editor.parameters);
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] content-start gap-x-9 gap-y-5 tablet:grid-cols-2">
      {paths.map((path) => (
        <ParameterField key={path} editor={editor} path={path} marker={markers[path]} />
      ))}
    </div>
  );
}

function PermanentLead({ editor, lead }: GroupProps & { lead: LeadKey }) {
  const { parameters } = editor;
  if (!hasLead(parameters, lead)) {
    return (
      <p className="pt-4 text-body text-ink-2">
        {`With the mode ${parameters.pacing.mode} there is no lead here that paces or senses. Another mode, under Pacing, brings one.`}
      </p>
    );
  }
  const paces = parameterApplies(parameters, `pacing.${lead}.amplitudeV`);
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-9 pt-4 wide:grid-cols-[2fr_1fr]">
      <Fields editor={editor} paths={leadPaths(lead)} />
      {paces && <StrengthDuration lead={parameters.pacing[lead]} />}
    </div>
  );
}

function TabPage({ editor, tab }: GroupProps & { tab: TabKey }) {
  switch (tab) {
    case 'faults':
      return <FaultFields editor={editor} />;
    case 'temporaryLead':
      return (
        <div className="pt-4">
          <Fields editor={editor} paths={temporaryLeadPaths} />
        </div>
      );
    case 'chestPads':
      return (
        <div className="pt-4">
          <Fields editor={editor} paths={chestPaths} />
        </div>
      );
    default:
      return <PermanentLead editor={editor} lead={tab} />;
  }
}

/** What the chosen source of pacing is connected with, how strongly it stimulates, and what fails in it. */
export function LeadFields({ editor }: GroupProps) {
  const [wanted, setWanted] = useState<TabKey>('rightVentricularLead');
  if (editor.parameters.pacing.source === 'none') {
    return (
      <p className="text-body text-ink-2">
        There is no pacemaker on this strip. Choose a source under Pacing.
      </p>
    );
  }
  const tabs = tabsOf(editor.parameters);
  const tab = tabs.find(({ value }) => value === wanted)?.value ?? tabs[0].value;
  return (
    <Tabs accent="copper" label="Leads" value={tab} options={tabs} onChange={setWanted}>
      <TabPage editor={editor} tab={tab} />
    </Tabs>
  );
}
