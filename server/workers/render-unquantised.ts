import { limbLeadOfIAndII, type MeasuredLead } from '../../shared/engine/leads';
import { createStripStream, renderStrip, type MeasuredSamples } from '../../shared/engine/render';
import type { RenderedStrip } from '../../shared/formats/strip-binary';
import { leadNames, type LeadName } from '../../shared/parameters/sheet';
import type { StripParameters } from '../../shared/parameters/strip-parameters';

function leadOf(measured: MeasuredSamples, lead: LeadName): Float64Array {
  const limb = limbLeadOfIAndII[lead];
  if (!limb) return measured[lead as MeasuredLead];
  const [ofI, ofII] = limb;
  return measured.I.map((value, k) => ofI * value + ofII * measured.II[k]);
}

/** A strip with its samples before the quantiser, in doubles; for showing that two engines agree. */
export function renderUnquantised(parameters: StripParameters): RenderedStrip<Float64Array> {
  const recording = renderStrip(parameters);
  const { measured } = createStripStream(parameters).next(recording.leads.I.length);
  const leads = Object.fromEntries(leadNames.map((lead) => [lead, leadOf(measured, lead)]));
  return { ...recording, leads: leads as Record<LeadName, Float64Array> };
}
