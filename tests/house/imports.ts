/** The rule of who may import what, as a function of one import: null when it is allowed, else why it is not. */

import { posix } from 'node:path';

/** Each folder of the core may import from itself and those before it. */
const CORE_ORDER = [
  'numeric',
  'material',
  'study',
  'profile',
  'carriers',
  'mobility',
  'process',
  'sheet',
  'probe',
  'resistor',
  'explore',
  'report',
];

/** The driver, which the stages after the chain itself may call. */
const ABOVE_THE_CHAIN = ['explore', 'report'];

/** Packages that need a window or Node: the core runs without either. */
const NOT_FOR_CORE =
  /^(node:|electron|preact|@preact\/|plotly|comlink|commander|write-file-atomic|playwright)/;
const BUILT_IN =
  /^(assert|buffer|child_process|crypto|events|fs|http|https|module|net|os|path|process|stream|url|util|v8|vm|worker_threads|zlib)(\/|$)/;
const NOT_FOR_WINDOW = /^(node:|electron)/;

export interface Import {
  from: string;
  specifier: string;
  typeOnly: boolean;
}

/** The imports and re-exports of a file's text, dynamic ones and workers' addresses included. */
export function importsIn(path: string, text: string): Import[] {
  const code = text.replace(/\/\*[\s\S]*?\*\//g, '').replace(/^\s*\/\/.*$/gm, '');
  const found: Import[] = [];
  const add = (specifier: string, typeOnly: boolean) => found.push({ from: path, specifier, typeOnly });
  const statement = /\b(import|export)\s+(type\s+)?(?:[\w*{][^'"`;]*?\bfrom\s*)?['"]([^'"]+)['"]/g;
  for (const [, , type, specifier] of code.matchAll(statement)) add(specifier, type !== undefined);
  for (const [, specifier] of code.matchAll(/\bimport\s*\(\s*['"]([^'"]+)['"]/g)) add(specifier, false);
  for (const [, specifier] of code.matchAll(/\bnew URL\(\s*['"]([^'"]+)['"]\s*,\s*import\.meta/g))
    add(specifier, false);
  return found;
}

/** The project's path an import leads to, without ending; null for a package. */
export function targetOf({ from, specifier }: Import): string | null {
  if (!specifier.startsWith('.')) return null;
  return posix.normalize(posix.join(posix.dirname(from), specifier)).replace(/\.(ts|tsx|js)(\?\w+)?$/, '');
}

const areaOf = (path: string) => path.split('/')[1];
const coreFolderOf = (path: string) => (path.split('/').length > 3 ? path.split('/')[2] : null);

function withinCore(from: string, target: string): string | null {
  const own = coreFolderOf(from);
  const other = coreFolderOf(target);
  // The driver, the face and the result's shape stand above the folders and may use them all.
  if (own === null) return null;
  if (other === null)
    return ABOVE_THE_CHAIN.includes(own) && target !== 'src/core/index'
      ? null
      : 'a stage must not know the driver above it';
  if (!CORE_ORDER.includes(own)) return `the folder ${own} has no place in the order`;
  if (!CORE_ORDER.includes(other)) return `the folder ${other} has no place in the order`;
  return CORE_ORDER.indexOf(other) <= CORE_ORDER.indexOf(own) ? null : `${other} comes after ${own}`;
}

export function objectionTo(one: Import): string | null {
  const area = areaOf(one.from);
  const target = targetOf(one);
  if (target === null) {
    if (area === 'core' && (NOT_FOR_CORE.test(one.specifier) || BUILT_IN.test(one.specifier)))
      return 'the core runs without Node and without a window';
    if (area === 'renderer' && (NOT_FOR_WINDOW.test(one.specifier) || BUILT_IN.test(one.specifier)))
      return 'the window has neither Node nor Electron';
    return null;
  }
  if (!target.startsWith('src/'))
    return area === 'core' && !(one.from === 'src/core/version.ts' && target === 'package.json')
      ? 'the core imports nothing outside src/core, but for its version'
      : null;
  const other = areaOf(target);
  if (other === area) return area === 'core' ? withinCore(one.from, target) : null;
  if (area === 'core') return `the core must not know ${other}`;
  if (other === 'core') return target === 'src/core/index' ? null : 'only core/index is public';
  if (area === 'renderer' && target === 'src/main/bridge')
    return one.typeOnly ? null : 'the window takes the bridge only as a type';
  return `${area} must not know ${other}`;
}
