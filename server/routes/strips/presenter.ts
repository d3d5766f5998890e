import { courseGroupIdSchema, type Keeper, type Strip } from '../../../shared/api/strips';
import type { StripRecord } from '../../models/strip-records';
import type { Account } from '../../services/session/account';
import { canDelete, canEdit } from '../../services/strips/access';
import { readKeptParameters } from '../../services/strips/kept-parameters';

function keeperOf(strip: StripRecord, account: Account): Keeper {
  if (strip.owner === null) return 'gallery';
  return strip.owner.id === account.userId ? 'me' : 'department';
}

/** A strip as the API gives it to this account. A group that the course no longer has counts as none. */
export function presentStrip(strip: StripRecord, account: Account): Strip {
  const { id, title, teachingPoint, tags, visibility, owner, version, createdAt, updatedAt, engineVersion } =
    strip;
  const group = courseGroupIdSchema.safeParse(strip.groupId);
  return {
    id,
    title,
    teachingPoint,
    tags,
    group: group.success ? group.data : null,
    visibility,
    keptBy: keeperOf(strip, account),
    owner,
    version,
    engineVersion,
    createdAt,
    updatedAt,
    parameters: readKeptParameters(strip),
    canEdit: canEdit(account, strip),
    canDelete: canDelete(account, strip),
  };
}
