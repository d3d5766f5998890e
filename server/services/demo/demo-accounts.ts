import type { DemoResponse } from '../../../shared/api/demo';
import type { Database } from '../../models/database';
import { demoDepartments, demoOrganisation, demoPeople } from './demo-people';

/** Sign-ins of the demonstration, for those of its people who are still there as demonstration accounts. */
export async function demoAccounts(database: Database): Promise<DemoResponse> {
  const users = await database.users.findAll({ where: { isDemo: 1 } });
  const present = new Set(users.map((user) => user.id));
  const accounts = demoPeople
    .filter((person) => present.has(person.id))
    .map(({ name, role, email, password, departmentId }) => ({
      name,
      role,
      email,
      password,
      department: demoDepartments.find((one) => one.id === departmentId)?.name ?? '',
    }));
  return { organisation: accounts.length > 0 ? demoOrganisation : null, accounts };
}
