import type { Role } from '#shared/access/roles';

/** The people who build the buoy's hydrophone preamplifier, one of each role. */
export const DEMO_TEAM = 'Buoy preamplifier';
export const DEMO_PEOPLE: readonly { name: string; email: string; role: Role }[] = [
  { name: 'Ines Rautio', email: 'ines@buoy.example', role: 'owner' },
  { name: 'Samir Kade', email: 'samir@buoy.example', role: 'designer' },
  { name: 'Tove Bakken', email: 'tove@buoy.example', role: 'reviewer' },
  { name: 'Runa Leclerc', email: 'runa@buoy.example', role: 'viewer' },
];
