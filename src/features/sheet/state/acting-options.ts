import { isChestLead, pageRows } from '../../../../shared/paper/pages/page-rows';
import type { PageSetup } from '../../../../shared/parameters/page-setup';

/** Which options change anything on the pages of a setup; the others are not shown. */
export interface ActingOptions {
  /** Leads to choose: one, several, or the layout has its own. */
  leads: 'one' | 'several' | null;
  leadOrder: boolean;
  limbGain: boolean;
  chestGain: boolean;
  question: boolean;
  answer: boolean;
}

function labels(setup: PageSetup, leadOrder: PageSetup['leadOrder']): string {
  return pageRows({ ...setup, leadOrder })
    .flat()
    .map(({ label }) => label)
    .join();
}

/** See `ActingOptions`. */
export function actingOptions(setup: PageSetup): ActingOptions {
  const leads = pageRows(setup)
    .flat()
    .map(({ lead }) => lead);
  return {
    leads: setup.layout === 'single' ? 'one' : setup.layout === 'stacked' ? 'several' : null,
    leadOrder: labels(setup, 'usual') !== labels(setup, 'cabrera'),
    limbGain: setup.chestGainMmPerMv === null || leads.some((lead) => !isChestLead(lead)),
    chestGain: leads.some(isChestLead),
    question: setup.sheets === 'question' || setup.sheets === 'both',
    answer: setup.sheets === 'answer' || setup.sheets === 'both',
  };
}
