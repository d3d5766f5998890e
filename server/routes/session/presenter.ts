import type { SessionResponse } from '../../../shared/api/session';
import type { Account } from '../../services/session/account';

export function presentSession(account: Account): SessionResponse {
  const { userId, name, email, role, department, organisation } = account;
  return { user: { id: userId, name, email, role, department, organisation } };
}
