import type { PageSetup } from '../../parameters/page-setup';
import type { LeadName } from '../../parameters/sheet';
import { leadRows } from '../layout';
import type { PaperGainMmPerMv } from '../paper-scale';

/** A lead as a page draws it. */
export interface LeadCell {
  lead: LeadName;
  label: string;
  inverted: boolean;
  gainMmPerMv: PaperGainMmPerMv;
}

/** Limb leads in their usual order, and round the frontal plane (LD-31), where aVR is drawn inverted. */
const usualLimb: readonly LeadName[] = ['I', 'II', 'III', 'aVR', 'aVL', 'aVF'];
const cabreraLimb: readonly LeadName[] = ['aVL', 'I', 'aVR', 'II', 'aVF', 'III'];
const invertedInCabrera: LeadName = 'aVR';
const minus = '−';

type Choice = Pick<PageSetup, 'layout' | 'leads' | 'leadOrder' | 'gainMmPerMv' | 'chestGainMmPerMv'>;

export function isChestLead(lead: LeadName): boolean {
  return lead.startsWith('V');
}

/** Limb leads of a list in Cabrera's order, at the places where the list has limb leads. */
function inCabreraOrder(leads: readonly LeadName[]): LeadName[] {
  const limb = cabreraLimb.filter((lead) => leads.includes(lead));
  return leads.map((lead) => (isChestLead(lead) ? lead : (limb.shift() ?? lead)));
}

function orderedRows(choice: Choice): (readonly LeadName[])[] {
  const rows = leadRows(choice);
  if (choice.leadOrder === 'usual' || choice.layout === 'single') return rows;
  if (choice.layout === 'stacked') return inCabreraOrder(choice.leads).map((lead) => [lead]);
  // A row of one lead under rows of four is a rhythm lead, which keeps its place.
  const shared = rows.some((row) => row.length > 1);
  const swapped = (lead: LeadName): LeadName =>
    isChestLead(lead) ? lead : cabreraLimb[usualLimb.indexOf(lead)];
  return rows.map((row) => (shared && row.length === 1 ? row : row.map(swapped)));
}

/** The rows of a page from top to bottom, each with its leads from left to right. */
export function pageRows(choice: Choice): LeadCell[][] {
  const { leadOrder, gainMmPerMv, chestGainMmPerMv } = choice;
  return orderedRows(choice).map((row) =>
    row.map((lead) => {
      const inverted = leadOrder === 'cabrera' && lead === invertedInCabrera;
      return {
        lead,
        label: inverted ? `${minus}${lead}` : lead,
        inverted,
        gainMmPerMv: isChestLead(lead) ? (chestGainMmPerMv ?? gainMmPerMv) : gainMmPerMv,
      };
    }),
  );
}

/** Gains as a recorder prints them: `10 mm/mV`, or `10 mm/mV limb, 5 mm/mV chest` where both are drawn. */
export function gainLabel(rows: readonly (readonly LeadCell[])[]): string {
  const cells = rows.flat();
  const gains = [...new Set(cells.map((cell) => cell.gainMmPerMv))];
  if (gains.length === 1) return `${gains[0]} mm/mV`;
  const gainOf = (chest: boolean): number | undefined =>
    cells.find((cell) => isChestLead(cell.lead) === chest)?.gainMmPerMv;
  return `${gainOf(false)} mm/mV limb, ${gainOf(true)} mm/mV chest`;
}
