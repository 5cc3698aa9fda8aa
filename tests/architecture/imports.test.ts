import { readdirSync, readFileSync } from 'node:fs';
import { dirname, join, posix } from 'node:path';
import { parseSync } from 'vite';
import { expect, test } from 'vitest';
import { HOMES, NOT_IN_SHARED, ROOMS, SHARED_MAY_IMPORT } from './rooms';

type Source = { path: string; text: string; imports: string[] };

const SOURCES: readonly Source[] = ['shared', 'src', 'server'].flatMap((room) =>
  readdirSync(room, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && /\.tsx?$/.test(entry.name))
    .map((entry) => join(entry.parentPath, entry.name))
    .map((path) => {
      const text = readFileSync(path, 'utf8');
      return { path, text, imports: importsOf(path, text) };
    }),
);

/** Every module named by an import, an export from, or a dynamic import; types too. */
function importsOf(path: string, text: string): string[] {
  const { module, errors } = parseSync(path, text);
  expect(errors, path).toEqual([]);
  const named = [...module.staticImports.map((found) => found.moduleRequest.value)];
  for (const { entries } of module.staticExports) {
    for (const entry of entries) if (entry.moduleRequest) named.push(entry.moduleRequest.value);
  }
  for (const { moduleRequest } of module.dynamicImports) {
    named.push(text.slice(moduleRequest.start, moduleRequest.end).replace(/^['"`]|['"`]$/g, ''));
  }
  return named;
}

/** Path in the project of an import, or undefined for a package. */
function target(from: string, specifier: string): string | undefined {
  if (specifier.startsWith('#shared/')) return specifier.slice(1);
  return specifier.startsWith('.') ? posix.join(dirname(from), specifier) : undefined;
}

function within(path: string, room: string): boolean {
  return path === room || path.startsWith(`${room}/`) || `${path}.ts` === room;
}

function roomOf(path: string): string | undefined {
  return Object.keys(ROOMS)
    .filter((room) => within(path, room))
    .sort((a, b) => b.length - a.length)[0];
}

test('every source file stands in a room', () => {
  expect(SOURCES.length).toBeGreaterThan(50);
  expect(SOURCES.filter(({ path }) => roomOf(path) === undefined).map(({ path }) => path)).toEqual([]);
});

test('rooms import only the rooms they may', () => {
  const wrong: string[] = [];
  for (const { path, imports } of SOURCES) {
    const room = roomOf(path);
    if (room === undefined) continue;
    for (const specifier of imports) {
      const to = target(path, specifier);
      if (to === undefined || within(to, room)) continue;
      if (!(ROOMS[room] ?? []).some((allowed) => within(to, allowed))) wrong.push(`${path} imports ${to}`);
    }
  }
  expect(wrong).toEqual([]);
});

test('a feature imports no other feature', () => {
  const feature = (path: string) => /^src\/features\/([^/]+)/.exec(path)?.[1];
  const wrong = SOURCES.flatMap(({ path, imports }) =>
    imports
      .map((specifier) => target(path, specifier))
      .filter((to) => to !== undefined && feature(path) && feature(to) && feature(to) !== feature(path))
      .map((to) => `${path} imports ${to}`),
  );
  expect(wrong).toEqual([]);
});

test('a library is used only where it is at home', () => {
  const wrong: string[] = [];
  for (const { path, imports } of SOURCES) {
    for (const specifier of imports) {
      if (target(path, specifier) !== undefined) continue;
      const library = specifier
        .split('/')
        .slice(0, specifier.startsWith('@') ? 2 : 1)
        .join('/');
      const homes = HOMES[library];
      if (homes && !homes.some((home) => within(path, home))) wrong.push(`${path} imports ${library}`);
      if (path.startsWith('shared/') && !SHARED_MAY_IMPORT.includes(library)) wrong.push(`${path} imports ${library}`);
    }
  }
  expect(wrong).toEqual([]);
});

test('shared code knows no clock, no chance and no machine', () => {
  const wrong = SOURCES.filter(({ path }) => path.startsWith('shared/')).flatMap(({ path, text }) => {
    const code = text.replace(/\/\*[\s\S]*?\*\/|\/\/.*$/gm, '');
    return NOT_IN_SHARED.filter((name) => code.includes(name)).map((name) => `${path} uses ${name}`);
  });
  expect(wrong).toEqual([]);
});

test('no import goes round in a circle', () => {
  const byPath = new Map(SOURCES.map((source) => [source.path.replace(/\.tsx?$/, ''), source]));
  const done = new Set<string>();
  const circles: string[] = [];
  const visit = (name: string, trail: readonly string[]) => {
    if (trail.includes(name)) circles.push([...trail.slice(trail.indexOf(name)), name].join(' → '));
    if (trail.includes(name) || done.has(name)) return;
    const source = byPath.get(name);
    for (const specifier of source?.imports ?? []) {
      const to = source && target(source.path, specifier);
      if (to !== undefined && byPath.has(to)) visit(to, [...trail, name]);
    }
    done.add(name);
  };
  for (const name of byPath.keys()) visit(name, []);
  expect(circles).toEqual([]);
});

test('files are named in kebab case, hold one idea in at most 300 lines, and are no barrels', () => {
  const named = /^[a-z0-9]+(-[a-z0-9]+)*(\.worker|\.css)?\.tsx?$/;
  const wrong = SOURCES.flatMap(({ path, text }) => {
    const name = posix.basename(path);
    const faults: string[] = [];
    if (!named.test(name)) faults.push(`${path} is not in kebab case`);
    if (text.split('\n').length > 301) faults.push(`${path} has more than 300 lines`);
    if (/^index\.tsx?$/.test(name) && path !== 'server/index.ts') faults.push(`${path} is a barrel`);
    return faults;
  });
  expect(wrong).toEqual([]);
});
