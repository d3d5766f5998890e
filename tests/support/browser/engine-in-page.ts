import { createStripStream, renderStrip, stripLength } from '../../../shared/engine/render';
import { twelveLeads } from '../../../shared/engine/recorder/quantiser';
import { parseStripParameters } from '../../../shared/parameters/parse';

/** Renders in the page: quantised samples, or doubles from before the quantiser. */
export function render(input: unknown, exact: boolean): Record<string, number[]> {
  const parameters = parseStripParameters(input);
  const leads = exact
    ? twelveLeads(createStripStream(parameters).next(stripLength(parameters)).measured)
    : renderStrip(parameters).leads;
  return Object.fromEntries(Object.entries(leads).map(([lead, samples]) => [lead, [...samples]]));
}
