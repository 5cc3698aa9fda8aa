import type { Role } from '#shared/access/roles';

/** The people who build the buoy's hydrophone preamplifier, one of each role. */
export const DEMO_TEAM = 'Buoy preamplifier';
export const DEMO_PEOPLE: readonly { name: string; email: string; role: Role }[] = [
  { name: 'Ines Rautio', email: 'ines@buoy.example', role: 'owner' },
  { name: 'Samir Kade', email: 'samir@buoy.example', role: 'designer' },
  { name: 'Tove Bakken', email: 'tove@buoy.example', role: 'reviewer' },
  { name: 'Runa Leclerc', email: 'runa@buoy.example', role: 'viewer' },
];

export const DEMO_SHEETS: readonly { name: string; starter: string }[] = [
  { name: 'Hydrophone input pair', starter: 'differential-pair' },
  { name: 'Bias mirror for the input pair', starter: 'mirror' },
  { name: 'First gain stage', starter: 'four-resistor-stage' },
];
