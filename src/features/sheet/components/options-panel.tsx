import { pageSetupSchema, type PageSetup } from '../../../../shared/parameters/page-setup';
import { Checkbox } from '../../../components/checkbox';
import { SelectField } from '../../../components/select-field';
import { actingOptions } from '../state/acting-options';
import { CohortField } from './cohort-field';
import { LayoutTiles } from './layout-tiles';
import { Caption, LeadChoice, OptionGroup, ValueSegments, type ChangeSetup } from './option-groups';
import { TintSwatches } from './tint-swatches';

interface SetupProps {
  setup: PageSetup;
  onChange: ChangeSetup;
}

interface OptionsPanelProps extends SetupProps {
  /** Whether the recorder of a strip looks for stimuli. */
  marked: boolean;
}

const speeds = [
  [25, '25 mm/s'],
  [50, '50 mm/s'],
] as const;
const gains = [
  [5, '5'],
  [10, '10'],
  [20, '20'],
] as const;
const chestGains = [[null, 'As limb'], ...gains] as const;
const leadOrders = [
  ['usual', 'Usual'],
  ['cabrera', 'Cabrera'],
] as const;
const papers = [
  ['a4', 'A4'],
  ['letter', 'Letter'],
] as const;
const orientations = [
  ['landscape', 'Landscape'],
  ['portrait', 'Portrait'],
] as const;
const sheets = [
  { value: 'both', label: 'Question and answer' },
  { value: 'question', label: 'Question only' },
  { value: 'answer', label: 'Answer only' },
  { value: 'plain', label: 'One sheet, neither' },
] as const satisfies { value: PageSetup['sheets']; label: string }[];

const lineLimits = pageSetupSchema.unwrap().shape.answerLines.unwrap();
const lineCounts = Array.from({ length: (lineLimits.maxValue ?? 0) + 1 }, (_, count) => ({
  value: String(count),
  label: count === 1 ? '1 line' : `${count} lines`,
}));

function PaperGroups({ setup, onChange }: SetupProps) {
  const acting = actingOptions(setup);
  return (
    <>
      <OptionGroup title="Layout">
        <LayoutTiles value={setup.layout} onChange={(layout) => onChange({ layout })} />
        {acting.leads && (
          <LeadChoice several={acting.leads === 'several'} leads={setup.leads} onChange={onChange} />
        )}
        {acting.leadOrder && (
          <>
            <Caption>Limb leads in order</Caption>
            <ValueSegments
              label="Order of the limb leads"
              value={setup.leadOrder}
              options={leadOrders}
              onChange={(leadOrder) => onChange({ leadOrder })}
            />
          </>
        )}
      </OptionGroup>
      <OptionGroup title="Speed, and gain in mm/mV">
        <ValueSegments
          label="Speed"
          value={setup.speedMmPerS}
          options={speeds}
          onChange={(speedMmPerS) => onChange({ speedMmPerS })}
        />
        {acting.limbGain && (
          <ValueSegments
            label="Gain"
            value={setup.gainMmPerMv}
            options={gains}
            onChange={(gainMmPerMv) => onChange({ gainMmPerMv })}
          />
        )}
        {acting.chestGain && (
          <>
            <Caption>Chest leads</Caption>
            <ValueSegments
              label="Gain of the chest leads"
              value={setup.chestGainMmPerMv}
              options={chestGains}
              onChange={(chestGainMmPerMv) => onChange({ chestGainMmPerMv })}
            />
          </>
        )}
      </OptionGroup>
      <OptionGroup title="Grid tint">
        <TintSwatches value={setup.gridTint} onChange={(gridTint) => onChange({ gridTint })} />
      </OptionGroup>
      <OptionGroup title="Paper">
        <ValueSegments
          label="Paper size"
          value={setup.paper}
          options={papers}
          onChange={(paper) => onChange({ paper })}
        />
        <ValueSegments
          label="Orientation"
          value={setup.orientation}
          options={orientations}
          onChange={(orientation) => onChange({ orientation })}
        />
      </OptionGroup>
    </>
  );
}

function QuestionGroup({ setup, onChange }: SetupProps) {
  return (
    <OptionGroup title="On the question sheet">
      <Checkbox
        label="Line for name and date"
        checked={setup.nameLine}
        onChange={(nameLine) => onChange({ nameLine })}
      />
      <div className="flex items-center justify-between gap-3">
        <span className="text-body">For the answer</span>
        <SelectField
          small
          label="Lines for the answer"
          value={String(setup.answerLines)}
          options={lineCounts}
          onChange={(count) => onChange({ answerLines: Number(count) })}
        />
      </div>
    </OptionGroup>
  );
}

const answerParts = [
  ['stimuliNamed', 'Stimuli named'],
  ['intervals', 'Intervals drawn'],
  ['ladder', 'Ladder'],
  ['reading', 'Reading in words'],
] as const;

/** Everything a sheet can be asked for; what changes nothing on the chosen pages is not shown. */
export function OptionsPanel({ setup, marked, onChange }: OptionsPanelProps) {
  const acting = actingOptions(setup);
  return (
    <div className="flex flex-col gap-5">
      <PaperGroups setup={setup} onChange={onChange} />
      <OptionGroup title="Sheets">
        <SelectField
          small
          label="Sheets"
          value={setup.sheets}
          options={sheets}
          onChange={(chosen) => onChange({ sheets: chosen })}
        />
        <CohortField value={setup.cohort} onChange={(cohort) => onChange({ cohort })} />
        {marked && (
          <Checkbox
            label="Stimulus markers"
            checked={setup.stimulusMarkers}
            onChange={(stimulusMarkers) => onChange({ stimulusMarkers })}
          />
        )}
      </OptionGroup>
      {acting.answer && (
        <OptionGroup title="On the answer sheet">
          {answerParts.map(([key, label]) => (
            <Checkbox
              key={key}
              label={label}
              checked={setup[key]}
              onChange={(checked) => onChange({ [key]: checked })}
            />
          ))}
        </OptionGroup>
      )}
      {acting.question && <QuestionGroup setup={setup} onChange={onChange} />}
    </div>
  );
}
