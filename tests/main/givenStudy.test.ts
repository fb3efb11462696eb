import { expect, test } from 'vitest';
import { givenStudy } from '../../src/main/givenStudy';

test('run by Electron, the word after the program’s folder is the study', () => {
  expect(givenStudy(['electron', '--no-sandbox', '/app', 's.json'], true, '/here')).toBe('/here/s.json');
  expect(givenStudy(['electron', '/app', '--user-data-dir=/x', '/there/s.json'], true, '/here')).toBe(
    '/there/s.json',
  );
});

test('run as a program of its own, the first word is the study', () => {
  expect(givenStudy(['/opt/ohmstrata', 's.json'], false, '/here')).toBe('/here/s.json');
});

test('without a word there is no study', () => {
  expect(givenStudy(['electron', '--no-sandbox', '/app'], true, '/here')).toBeNull();
  expect(givenStudy(['/opt/ohmstrata', '--lang=de'], false, '/here')).toBeNull();
});
