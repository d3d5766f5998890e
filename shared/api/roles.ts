import { z } from 'zod';

/** What a person may do; each has one. */
export const roles = ['educator', 'technician', 'learner', 'administrator'] as const;
export const roleSchema = z.enum(roles);
export type Role = z.infer<typeof roleSchema>;

/** Roles as they stand on a page. */
export const roleNames: Readonly<Record<Role, string>> = {
  educator: 'Educator',
  technician: 'Simulation technician',
  learner: 'Learner',
  administrator: 'Administrator',
};
