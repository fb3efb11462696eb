/** What must not be left in files others read: notes to oneself, and traces of the machine it was written on. */

import { expect, test } from 'vitest';
import { filesIn, read } from './files';

// Built from parts, so that this file does not contain what it looks for.
const LEFT_OVERS: [string, RegExp][] = [
  [
    'a note to do it later',
    new RegExp(
      `\\b(${['TO', 'FIX', 'XX', 'HA'].map((a, i) => a + ['DO', 'ME', 'X', 'CK'][i]).join('|')})\\b`,
    ),
  ],
  ['a silenced type check', new RegExp(`@ts-${'ig'}nore|@ts-${'no'}check`)],
  [
    'the host of a package registry',
    new RegExp(`registry\\.[a-z]+js\\.org|registry\\.yarn${'pkg'}|pypi\\.org`),
  ],
  [
    'an absolute path of one machine',
    new RegExp(`(^|[\\s'"\`(=:])/(${'wo'}rk|${'ho'}me|${'ro'}ot|${'Use'}rs)/\\w`, 'm'),
  ],
  ['a path on a Windows disk', new RegExp(`\\b[A-Z]:\\\\${'Use'}rs`)],
];

const READ_BY_OTHERS = [
  ...['src', 'tests', 'scripts', 'docs', 'bench', 'demo-profiles', '.ci'].flatMap((folder) =>
    filesIn(folder, /\.(ts|tsx|mjs|cjs|css|html|md|json|csv|txt)$|run$/),
  ),
  ...filesIn('.', /^[^/]+\.(md|ts|json)$/).filter((path) => !path.includes('/')),
];

test.each(LEFT_OVERS)('no file contains %s', (_what, pattern) => {
  const found = READ_BY_OTHERS.filter((path) => pattern.test(read(path)));
  expect(READ_BY_OTHERS.length).toBeGreaterThan(50);
  expect(found).toEqual([]);
});

test('each left-over would be seen', () => {
  const examples = [
    `// ${'TO'}DO later`,
    `// @ts-${'ig'}nore`,
    `https://registry.${'np'}mjs.org/x`,
    ` '/${'ho'}me/someone/x'`,
    `C:\\${'Use'}rs\\x`,
  ];
  expect(examples.map((text, i) => LEFT_OVERS[i][1].test(text))).toEqual(examples.map(() => true));
});

test('the lock file names no registry', () => {
  const packages = Object.values(JSON.parse(read('package-lock.json')).packages as Record<string, object>);
  expect(packages.length).toBeGreaterThan(50);
  expect(packages.filter((entry) => 'resolved' in entry)).toEqual([]);
});
