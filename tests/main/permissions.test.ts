import type { Session } from 'electron';
import { expect, test, vi } from 'vitest';
import { guardPermissions, isGranted } from '../../src/main/permissions';

const PAGE = 'app://bundle/index.html';

test('writing to the clipboard is granted to our own page', () => {
  expect(isGranted('clipboard-sanitized-write', PAGE)).toBe(true);
});

test.each([
  'clipboard-read',
  'media',
  'geolocation',
  'notifications',
  'midi',
  'midiSysex',
  'pointerLock',
  'fullscreen',
  'openExternal',
  'hid',
  'serial',
  'usb',
  'fileSystem',
  'unknown',
  'a name not yet invented',
  'toString',
  '__proto__',
])('%s is denied', (permission) => {
  expect(isGranted(permission, PAGE)).toBe(false);
});

test('nothing is granted to any other page', () => {
  for (const page of ['https://example.com/', 'app://bundle.elsewhere/', 'file:///x', ''])
    expect(isGranted('clipboard-sanitized-write', page)).toBe(false);
});

test('requests, checks and devices all go by the same table', () => {
  const session = {
    setPermissionRequestHandler: vi.fn(),
    setPermissionCheckHandler: vi.fn(),
    setDevicePermissionHandler: vi.fn(),
  };
  guardPermissions(session as unknown as Session);
  const request = session.setPermissionRequestHandler.mock.calls[0][0];
  const check = session.setPermissionCheckHandler.mock.calls[0][0];
  const device = session.setDevicePermissionHandler.mock.calls[0][0];
  const requested = (permission: string, requestingUrl: string) => {
    const reply = vi.fn();
    request(null, permission, reply, { requestingUrl });
    return reply.mock.calls;
  };
  expect(requested('clipboard-sanitized-write', PAGE)).toEqual([[true]]);
  expect(requested('media', PAGE)).toEqual([[false]]);
  expect(requested('clipboard-sanitized-write', 'https://example.com')).toEqual([[false]]);
  expect(check(null, 'clipboard-sanitized-write', 'app://bundle/')).toBe(true);
  expect(check(null, 'clipboard-sanitized-write', 'https://example.com/')).toBe(false);
  expect(check(null, 'geolocation', 'app://bundle/')).toBe(false);
  expect(device({ deviceType: 'usb', origin: 'app://bundle' })).toBe(false);
});
