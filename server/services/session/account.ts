import type { Role } from '../../../shared/api/roles';
import type { Database } from '../../models/database';

/** The person a request acts for. */
export interface Account {
  userId: string;
  name: string;
  email: string;
  role: Role;
  departmentId: string;
  department: string;
  organisation: string;
}

/** A person with their department; null when there is none of that id. */
export async function findAccount(database: Database, userId: string): Promise<Account | null> {
  const user = await database.users.findByPk(userId);
  const department = user && (await database.departments.findByPk(user.departmentId));
  if (!user || !department) return null;
  return {
    userId: user.id,
    name: user.name,
    email: user.email,
    role: user.role,
    departmentId: department.id,
    department: department.name,
    organisation: department.organisation,
  };
}
