import { notAllowed, notFound } from '../../errors';
import type { StripRecord } from '../../models/strip-records';
import type { Account } from '../session/account';

/**
 * Who may do what with a strip. A shipped preset is for all to see and nobody to change. A private strip is its
 * owner's alone, also from administrators. A department's strip is shared work: its educators, technicians and
 * administrators see and edit it (saves are checked for staleness), but only its owner or an administrator may
 * delete it or change who sees it, since that takes it away from the others.
 */
export function canSee(account: Account, strip: StripRecord): boolean {
  if (strip.owner === null || strip.owner.id === account.userId) return true;
  return strip.visibility === 'department' && strip.departmentId === account.departmentId;
}

export function canEdit(account: Account, strip: StripRecord): boolean {
  return strip.owner !== null && canSee(account, strip);
}

export function canDelete(account: Account, strip: StripRecord): boolean {
  if (!canEdit(account, strip)) return false;
  return strip.owner?.id === account.userId || account.role === 'administrator';
}

/** The strip, if it is there and may be seen; otherwise `notFound`, which does not tell the two apart. */
export function seen(account: Account, strip: StripRecord | undefined): StripRecord {
  if (!strip || strip.deletedAt !== null || !canSee(account, strip)) throw notFound('strip');
  return strip;
}

export function mustEdit(account: Account, strip: StripRecord): void {
  if (canEdit(account, strip)) return;
  throw notAllowed('Strips of the gallery cannot be changed. Duplicate this one and change the copy.');
}

export function mustDelete(account: Account, strip: StripRecord): void {
  mustEdit(account, strip);
  if (canDelete(account, strip)) return;
  throw notAllowed('Only the owner of this strip or an administrator may delete it or change who sees it.');
}
