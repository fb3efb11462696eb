/** Every import of the sources runs the one way the design allows, and none in a circle. */

import { expect, test } from 'vitest';
import { filesIn, read } from './files';
import { type Import, importsIn, objectionTo, targetOf } from './imports';

const SOURCES = filesIn('src', /\.(ts|tsx)$/);
const IMPORTS = SOURCES.flatMap((path) => importsIn(path, read(path)));

const one = (from: string, specifier: string, typeOnly = false): Import => ({ from, specifier, typeOnly });

test('the imports of a file are found in every form they may take', () => {
  const text = `/** import 'in-comment'; */
    import type { A } from './a';
    import { b,
      c } from "../b";
    import './c.css';
    export * from './d';
    export { e } from './e';
    const f = await import('./f');
    const w = new Worker(new URL('./worker.ts', import.meta.url));
    // import { g } from './g';
    export const text = 'from';`;
  expect(importsIn('src/core/x.ts', text)).toEqual([
    one('src/core/x.ts', './a', true),
    one('src/core/x.ts', '../b'),
    one('src/core/x.ts', './c.css'),
    one('src/core/x.ts', './d'),
    one('src/core/x.ts', './e'),
    one('src/core/x.ts', './f'),
    one('src/core/x.ts', './worker.ts'),
  ]);
});

test.each([
  ['a later stage from an earlier one', one('src/core/numeric/a.ts', '../sheet/b')],
  ['the driver from a stage', one('src/core/sheet/a.ts', '../solve')],
  ['Node from the core', one('src/core/numeric/a.ts', 'node:fs')],
  ['Node without its prefix from the core', one('src/core/numeric/a.ts', 'fs/promises')],
  ['the window library from the core', one('src/core/report/a.ts', 'preact')],
  ['the command line from the core', one('src/core/solve.ts', '../cli/index')],
  ['the inside of the core from the command line', one('src/cli/index.ts', '../core/solve')],
  ['the window from the main process', one('src/main/index.ts', '../renderer/app')],
  ['the main process from the window', one('src/renderer/app.tsx', '../main/ipc', true)],
  ['the bridge as more than a type', one('src/renderer/app.tsx', '../main/bridge')],
  ['Electron from the window', one('src/renderer/app.tsx', 'electron')],
  ['a folder without a place in the order', one('src/core/elsewhere/a.ts', '../numeric/b')],
])('%s is objected to', (_what, wrong) => {
  expect(objectionTo(wrong)).not.toBeNull();
});

test.each([
  ['an earlier stage', one('src/core/sheet/a.ts', '../mobility/b')],
  ['a neighbour', one('src/core/sheet/a.ts', './b')],
  ['every stage from the driver', one('src/core/solve.ts', './sheet/a')],
  ['the driver from a sweep', one('src/core/explore/a.ts', '../solve')],
  ['the face of the core from the command line', one('src/cli/commands/a.ts', '../../core/index')],
  ['the face of the core by its folder', one('src/cli/a.ts', '../core/index.ts')],
  ['the type of the bridge from the window', one('src/renderer/a.ts', '../main/bridge', true)],
  ['Node from the main process', one('src/main/a.ts', 'node:fs')],
])('%s may be imported', (_what, right) => {
  expect(objectionTo(right)).toBeNull();
});

test('no source imports against the order', () => {
  const objections = IMPORTS.flatMap((each) => {
    const why = objectionTo(each);
    return why === null ? [] : [`${each.from} imports ${each.specifier}: ${why}`];
  });
  expect(SOURCES.length).toBeGreaterThan(20);
  expect(IMPORTS.length).toBeGreaterThan(SOURCES.length);
  expect(objections).toEqual([]);
});

/** A way along imports that ends where it began, or null. */
function circleIn(edges: Map<string, string[]>): string[] | null {
  const done = new Set<string>();
  const visit = (path: string, way: string[]): string[] | null => {
    if (way.includes(path)) return [...way.slice(way.indexOf(path)), path];
    if (done.has(path)) return null;
    for (const next of edges.get(path) ?? []) {
      const circle = visit(next, [...way, path]);
      if (circle) return circle;
    }
    done.add(path);
    return null;
  };
  for (const path of edges.keys()) {
    const circle = visit(path, []);
    if (circle) return circle;
  }
  return null;
}

test('a circle of imports would be seen', () => {
  const edges = new Map([
    ['a', ['b']],
    ['b', ['c', 'd']],
    ['d', ['b']],
  ]);
  expect(circleIn(edges)).toEqual(['b', 'd', 'b']);
});

test('no imports of values or types run in a circle', () => {
  const edges = new Map<string, string[]>();
  for (const each of IMPORTS) {
    const target = targetOf(each);
    if (target === null) continue;
    const from = each.from.replace(/\.(ts|tsx)$/, '');
    edges.set(from, [...(edges.get(from) ?? []), target]);
  }
  expect(circleIn(edges)).toBeNull();
});
