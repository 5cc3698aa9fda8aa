/**
 * Which room may import which. A room is a folder (or a file) by its path; the longest match counts, and a file that
 * matches none fails. `self` is always allowed. Rooms are named with the folders they may import.
 */
export const ROOMS: Readonly<Record<string, readonly string[]>> = {
  'shared/units': [],
  'shared/linalg': [],
  'shared/geometry': ['shared/units'],
  'shared/circuit': ['shared/units', 'shared/geometry'],
  'shared/device': ['shared/units', 'shared/circuit'],
  'shared/solver': ['shared/units', 'shared/linalg', 'shared/circuit', 'shared/device'],
  'shared/analyses': ['shared/units', 'shared/linalg', 'shared/circuit', 'shared/device', 'shared/solver'],
  'shared/access': [],
  'shared/api': ['shared/access', 'shared/circuit', 'shared/analyses'],
  'shared/starters': ['shared/units', 'shared/geometry', 'shared/circuit'],
  'shared/doc': ['shared/units', 'shared/geometry', 'shared/circuit', 'shared/access'],

  'src/formats': ['shared'],
  'src/keys': ['shared'],
  'src/ui': ['src/formats', 'src/keys', 'shared/units'],
  'src/api': ['shared/api', 'shared/access'],
  'src/live': ['shared'],
  'src/workers': ['shared'],
  'src/features': ['src/live', 'src/workers', 'src/ui', 'src/api', 'src/keys', 'src/formats', 'shared'],
  'src/pages': ['src/features', 'src/live', 'src/workers', 'src/ui', 'src/api', 'src/keys', 'src/formats', 'shared'],
  'src/app': ['src/pages', 'src/features', 'src/ui', 'src/api', 'src/formats', 'shared'],

  'server/index.ts': ['server/start.ts', 'server/config.ts'],
  'server/start.ts': [
    'server/app.ts',
    'server/config.ts',
    'server/db',
    'server/demo',
    'server/sync',
    'server/solving',
    'server/services',
    'server/http',
    'server/auth',
    'shared',
  ],
  'server/app.ts': [
    'server/config.ts',
    'server/routes',
    'server/services',
    'server/sync',
    'server/http',
    'server/auth',
    'server/db',
    'shared',
  ],
  'server/config.ts': ['shared'],
  'server/routes': ['server/services', 'server/http', 'server/auth', 'shared'],
  'server/services': ['server/db', 'server/sync', 'server/solving', 'server/auth', 'server/config.ts', 'shared'],
  'server/sync': ['shared'],
  'server/solving': ['shared'],
  'server/auth': ['server/db', 'shared'],
  'server/http': ['server/auth', 'shared'],
  'server/db': ['shared'],
  'server/demo': ['server/services', 'server/db', 'server/auth', 'server/config.ts', 'shared'],
  'server/cli': ['shared'],
};

/** The only rooms in which a library is at home; a library that is not listed may be used anywhere. */
export const HOMES: Readonly<Record<string, readonly string[]>> = {
  reactflow: ['src/features/canvas'],
  uplot: ['src/features/slip'],
  yjs: ['shared/doc', 'src/live', 'server/sync'],
  'y-websocket': ['src/live'],
  'y-protocols': ['src/live', 'server/sync'],
  'drizzle-orm': ['server/db'],
  'better-sqlite3': ['server/db'],
  express: ['server/app.ts', 'server/http', 'server/routes'],
  ws: ['server/sync'],
  comlink: ['src/workers'],
};

/** All that the pure room may import from outside. */
export const SHARED_MAY_IMPORT: readonly string[] = ['zod', 'yjs', 'lib0'];

/** Names that would make `shared/` depend on a clock, on chance or on a machine. */
export const NOT_IN_SHARED: readonly string[] = [
  'Date.now',
  'new Date()',
  'Math.random',
  'process.env',
  'process.argv',
  'globalThis',
  'window.',
  'document.',
  'fetch(',
];
