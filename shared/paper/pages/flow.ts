import type { DrawingItem } from '../drawing';
import type { PlacedSystem } from './sheet-document';

/** Something that stands on a page as a whole, whole millimetres high. */
export interface FlowItem {
  heightMm: number;
  /** Free paper above it, unless it is the first of its page, mm. */
  gapMm: number;
  /** Notes that it will bring, at their longest; none when absent. */
  expects?: readonly string[];
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
    if (page && flowHeightMm([...page, item]) <= roomMm) page.push(item);
    else pages.push([item]);
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
