import { createStripSchema } from '../../../shared/api/strips';
import type { Database } from '../../models/database';
import { contentColumns, writeTags } from '../../models/strip-records';
import { hashPassword } from '../session/passwords';
import { demoDepartments, demoOrganisation, demoPeople } from './demo-people';
import { demoStrips } from './demo-strips';

/**
 * Fills a database that holds no people with the invented college: departments, one sign-in per role, a few
 * strips. Does nothing, and says false, when there is anybody in it already.
 */
export async function seedDemo(database: Database, now: Date): Promise<boolean> {
  if ((await database.users.count()) > 0) return false;
  const at = now.toISOString();
  const people = await Promise.all(
    demoPeople.map(async ({ password, ...person }) => ({
      ...person,
      passwordHash: await hashPassword(password),
      isDemo: 1,
      createdAt: at,
    })),
  );
  return database.write(async (transaction) => {
    if ((await database.users.count({ transaction })) > 0) return false;
    const departments = demoDepartments.map((one) => ({ ...one, organisation: demoOrganisation }));
    await database.departments.bulkCreate(departments, { transaction });
    await database.users.bulkCreate(people, { transaction });
    for (const { id, ownerId, ...input } of demoStrips) {
      const { group, parameters, ...content } = createStripSchema.parse(input);
      const departmentId = people.find((person) => person.id === ownerId)?.departmentId ?? null;
      const complete = { ...content, groupId: group, parameters: { ...parameters, title: content.title } };
      await database.strips.create(
        { id, ownerId, departmentId, ...contentColumns(complete), version: 1, createdAt: at, updatedAt: at },
        { transaction },
      );
      await writeTags(database, id, content.tags, transaction);
    }
    return true;
  });
}
