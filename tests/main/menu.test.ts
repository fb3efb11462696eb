import type { MenuItemConstructorOptions } from 'electron';
import { expect, test, vi } from 'vitest';
import { menuTemplate } from '../../src/main/menu';

const flat = (items: MenuItemConstructorOptions[]): MenuItemConstructorOptions[] =>
  items.flatMap((item) => [item, ...(Array.isArray(item.submenu) ? flat(item.submenu) : [])]);
const NOTHING = { undo: null, redo: null };

test('every command is in the menu once, and sends itself', () => {
  const send = vi.fn();
  const commands = flat(menuTemplate(send, NOTHING, false)).filter((item) => item.id);
  for (const item of commands) (item.click as () => void)();
  const expected = [
    ...['about', 'commands', 'exportColumns', 'exportPng', 'exportReadings', 'exportSvg', 'importTable'],
    ...['newStudy', 'open', 'redo', 'save', 'saveAs', 'undo'],
  ];
  expect(send.mock.calls.map(([command]) => command).sort()).toEqual(expected);
  expect(commands.map((item) => item.id).sort()).toEqual(expected);
});

test.each([true, false])('no key is given twice (mac: %s)', (isMac) => {
  const keys = flat(menuTemplate(vi.fn(), NOTHING, isMac)).flatMap((item) => item.accelerator ?? []);
  expect(keys.length).toBeGreaterThan(9);
  expect(new Set(keys).size).toBe(keys.length);
});

test('undo and redo name what they would do, and are off when there is nothing', () => {
  const items = flat(menuTemplate(vi.fn(), { undo: 'change of dose', redo: null }, false));
  expect(items.find((item) => item.id === 'undo')).toMatchObject({
    label: '&Undo change of dose',
    enabled: true,
  });
  expect(items.find((item) => item.id === 'redo')).toMatchObject({ label: '&Redo', enabled: false });
});

test('the menu offers neither reload nor developer tools', () => {
  const roles = flat(menuTemplate(vi.fn(), NOTHING, false)).flatMap((item) => item.role ?? []);
  expect(roles).not.toContain('reload');
  expect(roles).not.toContain('toggleDevTools');
});
