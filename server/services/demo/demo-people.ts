import type { Role } from '../../../shared/api/roles';

/** The Tarn Valley Ambulance College does not exist; its people and their passwords are made up. */
export const demoOrganisation = 'Tarn Valley Ambulance College';

export const demoDepartments = [
  { id: 'paramedic-practice', name: 'Paramedic practice' },
  { id: 'acute-nursing', name: 'Acute nursing' },
] as const;

export interface DemoPerson {
  id: string;
  departmentId: (typeof demoDepartments)[number]['id'];
  name: string;
  email: string;
  role: Role;
  password: string;
}

/** One sign-in per role, and an educator of another department, who shows what stays inside one. */
export const demoPeople: readonly DemoPerson[] = [
  {
    id: 'demo-educator',
    departmentId: 'paramedic-practice',
    name: 'Maren Oakhollow',
    email: 'm.oakhollow@tarnvalley.example',
    role: 'educator',
    password: 'heron-lantern-42',
  },
  {
    id: 'demo-technician',
    departmentId: 'paramedic-practice',
    name: 'Tobin Fairwater',
    email: 't.fairwater@tarnvalley.example',
    role: 'technician',
    password: 'copper-bridge-17',
  },
  {
    id: 'demo-learner',
    departmentId: 'paramedic-practice',
    name: 'Isla Brackenridge',
    email: 'i.brackenridge@tarnvalley.example',
    role: 'learner',
    password: 'willow-compass-63',
  },
  {
    id: 'demo-administrator',
    departmentId: 'paramedic-practice',
    name: 'Edda Stonewell',
    email: 'e.stonewell@tarnvalley.example',
    role: 'administrator',
    password: 'granite-harbour-28',
  },
  {
    id: 'demo-nursing-educator',
    departmentId: 'acute-nursing',
    name: 'Rowan Marsh-Ellery',
    email: 'r.marsh-ellery@tarnvalley.example',
    role: 'educator',
    password: 'meadow-signal-95',
  },
];
