import type { DrawingItem } from '../drawing';
import type { PlacedSystem } from './sheet-document';
import type { Spacing } from './spacing';

/** Something that stands on a page as a whole, whole millimetres high. */
export interface FlowItem {
  heightMm: number;
  /** Free paper above it, unless it is the first of its page, mm. */
  gapMm: number;
  /** Never alone at the top of a page: the item before it comes along. */
  keep?: boolean;
  /** Notes that it will bring, at their longest; none when absent. */
  expects?: readonly string[];
  /** The same at another spacing of its rows; absent where there are none. */
  respaced?(spacing: Spacing): FlowItem;
  /** Its drawing from the corner (0, 0) of the content. */
  draw(): { items: DrawingItem[]; system?: PlacedSystem; notes?: string[] };
}

/** Height of items one below the other, mm. */
export function flowHeightMm(items: readonly FlowItem[]): number {
  return items.reduce((sum, item, i) => sum + item.heightMm + (i > 0 ? item.gapMm : 0), 0);
}

/** Notes to keep room for, each once. */
export function expectedNotes(items: readonly FlowItem[]): string[] {
  return [...new Set(items.flatMap((item) => item.expects ?? []))];
}

function filled(items: readonly FlowItem[], roomMm: number): FlowItem[][] {
  const pages: FlowItem[][] = [];
  for (const item of items) {
    const page = pages.at(-1);
    if (page && flowHeightMm([...page, item]) <= roomMm) {
      page.push(item);
      continue;
    }
    const before = item.keep && page && page.length > 1 ? page[page.length - 1] : null;
    const together = before && flowHeightMm([before, item]) <= roomMm;
    if (together) page?.pop();
    pages.push(together ? [before, item] : [item]);
  }
  return pages;
}

/** Steps in which even pages are looked for, mm. */
const stepMm = 5;

/** Items on as few pages as hold them, about evenly filled, so that the last is not nearly empty. */
export function paginate(items: readonly FlowItem[], roomMm: number): FlowItem[][] {
  const { length } = filled(items, roomMm);
  for (let capMm = flowHeightMm(items) / length; capMm < roomMm; capMm += stepMm) {
    const pages = filled(items, capMm);
    if (pages.length === length) return pages;
  }
  return filled(items, roomMm);
}

/** The items of a page at the roomiest of the spacings that fits. */
export function roomiest(
  page: readonly FlowItem[],
  spacings: readonly Spacing[],
  roomMm: number,
): FlowItem[] {
  for (const spacing of spacings) {
    const items = page.map((item) => item.respaced?.(spacing) ?? item);
    if (flowHeightMm(items) <= roomMm) return items;
  }
  return [...page];
}
