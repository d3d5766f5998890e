import type { PageSetup } from '../../parameters/page-setup';
import type { SheetDocument, SheetMade, SheetSubject } from './sheet-document';

/**
 * Lays strips on pages of the chosen paper at true scale: as many strips to a page as fit, long ones over several pages.
 * Nothing is ever fitted by scaling. Throws RangeError without strips and for a strip that is empty or uneven.
 */
export function layoutSheetPages(
  subjects: readonly SheetSubject[],
  setup: PageSetup,
  made: SheetMade,
): SheetDocument {
  throw new RangeError(`Not laid out yet: ${subjects.length} strips on ${setup.paper}, ${made.madeOn}`);
}
