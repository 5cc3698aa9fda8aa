import { resolve } from 'node:path';
import type { Page } from '@playwright/test';
import { build } from 'vite';
import type { Drawing } from '#shared/circuit/drawing';

const OUT = resolve('test-results/bench-bare');
const ADDRESS = 'http://bare.example/';

/** Builds the page of the library by itself as the product is built, into a folder that is never served. */
export async function buildBarePage(): Promise<void> {
  await build({
    root: resolve('e2e/bench/bare'),
    base: './',
    configFile: false,
    logLevel: 'warn',
    build: { outDir: OUT, emptyOutDir: true },
  });
}

/** Opens it with as many nodes and edges as a drawing has parts and wires, at their places. */
export async function openBarePage(page: Page, { parts, wires }: Drawing): Promise<void> {
  const nodes = parts.map(({ id, place: { x, y } }) => ({ id, position: { x, y }, data: { label: id } }));
  const edges = wires.map(({ id, from, to }) => ({ id, source: from.part, target: to.part, type: 'step' }));
  await page.route(`${ADDRESS}**`, (route) => {
    const { pathname } = new URL(route.request().url());
    if (pathname === '/bare.json') return route.fulfill({ json: { nodes, edges } });
    return route.fulfill({ path: resolve(OUT, pathname === '/' ? 'index.html' : `.${pathname}`) });
  });
  await page.goto(ADDRESS);
  await page
    .locator('.react-flow__node')
    .nth(parts.length - 1)
    .waitFor();
}
