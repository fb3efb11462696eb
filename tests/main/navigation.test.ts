import { EventEmitter } from 'node:events';
import type { App } from 'electron';
import { expect, test, vi } from 'vitest';
import { guardNavigation, mayNavigate } from '../../src/main/navigation';

test('the page may load itself again', () => {
  expect(mayNavigate('app://bundle/index.html')).toBe(true);
  expect(mayNavigate('app://bundle/index.html#readings')).toBe(true);
});

test.each([
  'https://example.com/',
  'app://bundle.elsewhere/index.html',
  'app://bundle/other.html',
  'app://bundle/index.html?x=1',
  'file:///index.html',
  'javascript:alert(1)',
  'data:text/html,x',
  'about:blank',
  '',
])('the page may not go to "%s"', (address) => {
  expect(mayNavigate(address)).toBe(false);
});

function guarded() {
  const app = new EventEmitter();
  const contents = Object.assign(new EventEmitter(), { setWindowOpenHandler: vi.fn() });
  guardNavigation(app as unknown as App);
  app.emit('web-contents-created', {}, contents);
  return contents;
}

test.each(['will-navigate', 'will-frame-navigate', 'will-redirect'])(
  '%s is stopped on every page',
  (name) => {
    const contents = guarded();
    const away = { url: 'https://example.com/', preventDefault: vi.fn() };
    const home = { url: 'app://bundle/index.html', preventDefault: vi.fn() };
    contents.emit(name, away);
    contents.emit(name, home);
    expect(away.preventDefault).toHaveBeenCalledOnce();
    expect(home.preventDefault).not.toHaveBeenCalled();
  },
);

test('no page opens a window or embeds another', () => {
  const contents = guarded();
  const attach = { preventDefault: vi.fn() };
  contents.emit('will-attach-webview', attach);
  expect(attach.preventDefault).toHaveBeenCalledOnce();
  const open = contents.setWindowOpenHandler.mock.calls[0][0];
  expect(open({ url: 'app://bundle/index.html' })).toEqual({ action: 'deny' });
});
