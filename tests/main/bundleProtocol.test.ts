import { mkdirSync, symlinkSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect } from 'vitest';
import { answer, fileFor, isInside } from '../../src/main/bundleProtocol';
import { POLICY_HEADER } from '../../src/main/contentSecurityPolicy';
import { test } from './folder';

const get = (url: string) => ({ method: 'GET', url });

test('a folder holds what lies below it, and neither itself nor its neighbours', () => {
  expect(isInside('/a/root', '/a/root/x')).toBe(true);
  expect(isInside('/a/root', '/a/root/..x')).toBe(true);
  expect(isInside('/a/root', '/a/root')).toBe(false);
  expect(isInside('/a/root', '/a/root-evil/x')).toBe(false);
  expect(isInside('/a/root', '/a/x')).toBe(false);
  expect(isInside('/a/root', '/')).toBe(false);
});

test.each([
  ['app://bundle/index.html', '/a/root/index.html'],
  ['app://bundle/assets/a%20b.js', '/a/root/assets/a b.js'],
  ['app://bundle/assets/x.js?query#part', '/a/root/assets/x.js'],
  // The parser itself takes dots out before the folder is joined.
  ['app://bundle/../../index.html', '/a/root/index.html'],
])('%s stands for %s', (address, file) => {
  expect(fileFor(address, '/a/root')).toBe(file);
});

test.each([
  'app://bundle/%2e%2e%2fsecret',
  'app://bundle/..%2f..%2fsecret',
  'app://bundle/..%2froot-evil/x',
  'app://bundle/..%5csecret',
  'app://bundle/a%00.html',
  'app://bundle/%',
  'app://bundle/',
  'app://bundle.elsewhere/index.html',
  'https://bundle/index.html',
  'not an address',
])('%s stands for nothing', (address) => {
  expect(fileFor(address, '/a/root')).toBeNull();
});

describe('answers', () => {
  test('a file comes with its type and the policy', async ({ folder }) => {
    writeFileSync(join(folder, 'index.html'), '<p>');
    const response = await answer(get('app://bundle/index.html'), folder);
    expect(response.status).toBe(200);
    expect(await response.text()).toBe('<p>');
    expect(response.headers.get('content-type')).toBe('text/html; charset=utf-8');
    expect(response.headers.get('content-security-policy')).toBe(POLICY_HEADER);
    expect(response.headers.get('x-content-type-options')).toBe('nosniff');
  });

  test('scripts come as scripts, and an unknown ending as bytes', async ({ folder }) => {
    writeFileSync(join(folder, 'a.js'), '');
    writeFileSync(join(folder, 'a.exe'), '');
    const type = async (name: string) =>
      (await answer(get(`app://bundle/${name}`), folder)).headers.get('content-type');
    expect(await type('a.js')).toBe('text/javascript; charset=utf-8');
    expect(await type('a.exe')).toBe('application/octet-stream');
  });

  test('what does not exist is not found', async ({ folder }) => {
    expect((await answer(get('app://bundle/none.html'), folder)).status).toBe(404);
  });

  test('only GET is answered', async ({ folder }) => {
    writeFileSync(join(folder, 'index.html'), '');
    for (const method of ['POST', 'HEAD', 'PUT'])
      expect((await answer({ method, url: 'app://bundle/index.html' }, folder)).status).toBe(405);
  });

  test('a way out of the folder and a link out of it are refused', async ({ folder }) => {
    const root = join(folder, 'root');
    mkdirSync(root);
    mkdirSync(join(folder, 'root-evil'));
    writeFileSync(join(folder, 'root-evil', 'x'), 'secret');
    symlinkSync(join(folder, 'root-evil', 'x'), join(root, 'link'));
    expect((await answer(get('app://bundle/..%2froot-evil/x'), root)).status).toBe(400);
    expect((await answer(get('app://bundle/link'), root)).status).toBe(400);
  });
});
