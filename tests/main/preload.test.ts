import { expect, test, vi } from 'vitest';
import type { Bridge } from '../../src/main/bridge';
import { CHANNELS } from '../../src/main/channels';

const electron = vi.hoisted(() => ({
  contextBridge: { exposeInMainWorld: vi.fn() },
  ipcRenderer: { invoke: vi.fn(async () => ({ ok: true, value: null })), on: vi.fn(), off: vi.fn() },
}));
vi.mock('electron', () => electron);
await import('../../src/main/preload');

const bridge = () => electron.contextBridge.exposeInMainWorld.mock.calls[0][1] as Bridge;

test('the window gets the bridge and nothing else', () => {
  expect(electron.contextBridge.exposeInMainWorld).toHaveBeenCalledOnce();
  expect(electron.contextBridge.exposeInMainWorld.mock.calls[0][0]).toBe('ohmstrata');
  expect(Object.keys(bridge()).sort()).toEqual([...CHANNELS, 'onMenuCommand'].sort());
});

test('a request goes out on its own channel', async () => {
  expect(await bridge().setTheme('dark')).toEqual({ ok: true, value: null });
  expect(electron.ipcRenderer.invoke).toHaveBeenLastCalledWith('setTheme', 'dark');
});

test('a menu command arrives without Electron’s event, until no longer listened to', () => {
  const heard = vi.fn();
  const stop = bridge().onMenuCommand(heard);
  const [channel, hear] = electron.ipcRenderer.on.mock.calls[0];
  hear({ sender: 'electron' }, 'save');
  expect(heard.mock.calls).toEqual([['save']]);
  stop();
  expect(electron.ipcRenderer.off).toHaveBeenCalledWith(channel, hear);
});
